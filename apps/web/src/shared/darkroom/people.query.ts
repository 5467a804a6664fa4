import { queryOptions } from '@tanstack/react-query';
import { get, inDarkroom } from '../api/client.js';
import { keptKey } from '../api/query-keys.js';
import type { DarkroomMember } from '../api/types.js';

export const peopleQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'people'),
    queryFn: () => get<{ people: DarkroomMember[] }>(inDarkroom(darkroom, '/people')),
    staleTime: 300_000,
  });
