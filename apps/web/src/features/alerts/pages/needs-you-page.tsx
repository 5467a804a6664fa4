import { Box, chakra } from '@chakra-ui/react';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { ForRole } from '../../../shared/darkroom/for-role.js';
import { countOf } from '../../../shared/formats/amounts.js';
import { Fetched } from '../../../shared/ui/fetched.js';
import { PageHeading } from '../../../shared/ui/page-heading.js';
import { useNeedsYou } from '../api/get-needs-you.js';
import { EventRow } from '../components/event-row.js';
import { inUrgency } from '../event-order.js';

const saysOf = (count: number | undefined): string | null => {
  if (count === undefined || count === 0) return null;
  return `${countOf(count, 'thing needs', 'things need')} you.`;
};

function NeedsYou() {
  const { zone } = useDarkroom();
  const query = useNeedsYou();
  return (
    <>
      <PageHeading title="Needs you" says={saysOf(query.data?.open.length)} />
      <Fetched query={query} what="what needs you" zone={zone}>
        {({ open }) =>
          open.length === 0 ? (
            <Box>Nothing needs you.</Box>
          ) : (
            <chakra.ul listStyleType="none" aria-label="Needs you">
              {inUrgency(open).map((row) => (
                <EventRow key={row.eventId} row={row} />
              ))}
            </chakra.ul>
          )
        }
      </Fetched>
    </>
  );
}

export function NeedsYouPage() {
  return (
    <ForRole least="technician" what="This list">
      <NeedsYou />
    </ForRole>
  );
}
