import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { NetworkError, ProblemError } from '../shared/api/problem.js';
import { meKey } from '../shared/api/query-keys.js';

const isSignedOut = (error: Error): boolean => error instanceof ProblemError && error.status === 401;

/** One cache for the page. An ended session takes the person away, and the gate asks to sign in again. */
export function createQueryClient(): QueryClient {
  const onError = (error: Error): void => {
    if (isSignedOut(error)) client.setQueryData(meKey, null);
  };
  const client: QueryClient = new QueryClient({
    queryCache: new QueryCache({ onError }),
    mutationCache: new MutationCache({ onError }),
    defaultOptions: {
      queries: {
        staleTime: 20_000,
        // Others work at the same baths: what is shown is asked for again each minute and when the page is looked at.
        refetchInterval: 60_000,
        refetchOnWindowFocus: 'always',
        retry: (failures, error) => error instanceof NetworkError && failures < 2,
        retryDelay: (failures) => Math.min(500 * 2 ** failures, 4_000),
      },
    },
  });
  return client;
}
