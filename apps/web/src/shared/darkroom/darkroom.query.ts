import { queryOptions } from '@tanstack/react-query';
import { get, inDarkroom } from '../api/client.js';
import { keptKey } from '../api/query-keys.js';
import type { Darkroom } from '../api/types.js';

export const darkroomQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'settings'),
    queryFn: () => get<Darkroom>(inDarkroom(darkroom, '')),
    staleTime: 300_000,
  });
