import { Box, Button } from '@chakra-ui/react';
import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { ProblemError } from '../api/problem.js';
import { showTime } from '../formats/instants.js';
import { NotFoundPage } from './not-found-page.js';
import { Waiting } from './waiting.js';

interface Props<T> {
  query: UseQueryResult<T>;
  /** 'the sink' */
  what: string;
  /** The noun of the page for something that is not there: 'bottle'. */
  missing?: string;
  zone?: string;
  outline?: ReactNode;
  children: (data: T) => ReactNode;
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
const isMissing = (error: unknown): boolean => error instanceof ProblemError && error.status === 404;

function Failed({ words, retry }: { words: string; retry: () => void }) {
  return (
    <Box role="alert" py="3" mb="3" borderBottomWidth="1px" borderColor="rule">
      {words}{' '}
      <Button variant="outline" minH="11" ml="2" onClick={retry}>
        Try again
      </Button>
    </Box>
  );
}

/** Waiting, failed, not there, or the thing itself; what was fetched before stays on screen when a fetch fails. */
export function Fetched<T>({ query, what, missing, zone = 'UTC', outline, children }: Props<T>) {
  const retry = (): void => void query.refetch();
  if (query.data === undefined) {
    if (!query.isError) return <Waiting what={what}>{outline}</Waiting>;
    if (isMissing(query.error)) return <NotFoundPage missing={missing ?? 'page'} />;
    return <Failed words={`${capital(what)} could not be fetched.`} retry={retry} />;
  }
  const since = showTime(new Date(query.dataUpdatedAt).toISOString(), zone);
  return (
    <>
      {query.isError && (
        <Failed
          words={`${capital(what)} could not be fetched. What you see is from ${since}.`}
          retry={retry}
        />
      )}
      {children(query.data)}
    </>
  );
}
