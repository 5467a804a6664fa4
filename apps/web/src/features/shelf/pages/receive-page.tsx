import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { ForRole } from '../../../shared/darkroom/for-role.js';
import { Fetched } from '../../../shared/ui/fetched.js';
import { PageHeading } from '../../../shared/ui/page-heading.js';
import { useShelf } from '../api/get-shelf.js';
import { ReceiveForm } from '../components/receive-form.js';

function Receive() {
  const { zone } = useDarkroom();
  const query = useShelf();
  return (
    <>
      <PageHeading title="Receive by hand" says="What came without an order." />
      <Fetched query={query} what="the shelf" zone={zone}>
        {({ packs }) => <ReceiveForm packs={packs} />}
      </Fetched>
    </>
  );
}

export function ReceivePage() {
  return (
    <ForRole least="technician" what="Receiving">
      <Receive />
    </ForRole>
  );
}
