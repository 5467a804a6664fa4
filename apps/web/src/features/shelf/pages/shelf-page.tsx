import { Box, chakra } from '@chakra-ui/react';
import type { Shelf } from '../../../shared/api/types.js';
import { useDarkroom, useMay } from '../../../shared/darkroom/darkroom-context.js';
import { countOf } from '../../../shared/formats/amounts.js';
import { paths } from '../../../shared/routes/paths.js';
import { Fetched } from '../../../shared/ui/fetched.js';
import { ButtonLink } from '../../../shared/ui/links.js';
import { PageHeading } from '../../../shared/ui/page-heading.js';
import { useShelf } from '../api/get-shelf.js';
import { ShelfRow } from '../components/shelf-row.js';
import { ForRole } from '../../../shared/darkroom/for-role.js';

function saysOf(shelf: Shelf | undefined): string | null {
  if (!shelf) return null;
  const due = shelf.packs.filter((pack) => pack.advice.due).length;
  return due === 0 ? 'Nothing has to be ordered.' : `${countOf(due, 'pack')} to order.`;
}

function ShelfList() {
  const { address, zone } = useDarkroom();
  const mayReceive = useMay('technician');
  const query = useShelf();
  const short = (shelf: Shelf) =>
    [...shelf.packs].sort(
      (a, b) => Number(b.advice.due) - Number(a.advice.due) || a.name.localeCompare(b.name),
    );
  return (
    <>
      <PageHeading title="Shelf" says={saysOf(query.data)}>
        {mayReceive && <ButtonLink to={paths.receive(address)}>Receive by hand</ButtonLink>}
      </PageHeading>
      <Fetched query={query} what="the shelf" zone={zone}>
        {(shelf) =>
          shelf.packs.length === 0 ? (
            <Box>The shelf has not been counted.</Box>
          ) : (
            <chakra.ul listStyleType="none" aria-label="On the shelf">
              {short(shelf).map((pack) => (
                <ShelfRow key={pack.id} pack={pack} today={shelf.today} />
              ))}
            </chakra.ul>
          )
        }
      </Fetched>
    </>
  );
}

export function ShelfPage() {
  return (
    <ForRole least="technician" what="The shelf">
      <ShelfList />
    </ForRole>
  );
}
