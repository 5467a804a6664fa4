import { Button } from '@chakra-ui/react';
import { today } from '../../../shared/clock/web-clock.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { Fetched } from '../../../shared/ui/fetched.js';
import { PageHeading } from '../../../shared/ui/page-heading.js';
import { useLog } from '../api/get-log.js';
import { LogRows } from '../components/log-rows.js';

export function LogPage() {
  const { zone } = useDarkroom();
  const query = useLog();
  return (
    <>
      <PageHeading title="Log" says="What happened, newest first. Nothing is deleted." />
      <Fetched query={query} what="the log" zone={zone}>
        {({ pages }) => (
          <LogRows
            label="What happened"
            entries={pages.flatMap((page) => page.entries)}
            today={today(zone)}
          />
        )}
      </Fetched>
      {query.hasNextPage && (
        <Button
          variant="outline"
          minH="11"
          mt="4"
          loading={query.isFetchingNextPage}
          loadingText="Fetching earlier ones"
          onClick={() => void query.fetchNextPage()}
        >
          Earlier
        </Button>
      )}
    </>
  );
}
