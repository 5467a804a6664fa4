import { infiniteQueryOptions, useInfiniteQuery } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const logQuery = (darkroom: string) =>
  infiniteQueryOptions({
    queryKey: keptKey(darkroom, 'log'),
    queryFn: ({ pageParam }) =>
      answered(
        api.GET('/darkrooms/{darkroomId}/log', {
          params: { path: { darkroomId: darkroom }, query: pageParam ? { cursor: pageParam } : {} },
        }),
      ),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.nextCursor,
  });

export const useLog = () => useInfiniteQuery(logQuery(useDarkroom().address));
