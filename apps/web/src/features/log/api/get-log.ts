import { infiniteQueryOptions, useInfiniteQuery } from '@tanstack/react-query';
import { get, inDarkroom } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import type { LogPage } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

const path = (cursor: string | null): string =>
  `/log${cursor ? `?cursor=${encodeURIComponent(cursor)}` : ''}`;

export const logQuery = (darkroom: string) =>
  infiniteQueryOptions({
    queryKey: keptKey(darkroom, 'log'),
    queryFn: ({ pageParam }) => get<LogPage>(inDarkroom(darkroom, path(pageParam))),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.nextCursor,
  });

export const useLog = () => useInfiniteQuery(logQuery(useDarkroom().address));
