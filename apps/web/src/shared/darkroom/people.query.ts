import { queryOptions } from '@tanstack/react-query';
import { get, inDarkroom } from '../api/client.js';
import { keptKey } from '../api/query-keys.js';
import type { DarkroomMember } from '../api/types.js';

type Answer = DarkroomMember[] | { people: DarkroomMember[] };

/** The list comes bare or under its name: both are read. */
async function fetchPeople(darkroom: string): Promise<DarkroomMember[]> {
  const answer = await get<Answer>(inDarkroom(darkroom, '/people'));
  return Array.isArray(answer) ? answer : answer.people;
}

export const peopleQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'people'),
    queryFn: () => fetchPeople(darkroom),
    staleTime: 300_000,
  });
