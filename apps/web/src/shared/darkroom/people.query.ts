import { queryOptions } from '@tanstack/react-query';
import { answered, api } from '../api/client.js';
import { keptKey } from '../api/query-keys.js';

export const peopleQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'people'),
    queryFn: () =>
      answered(api.GET('/darkrooms/{darkroomId}/people', { params: { path: { darkroomId: darkroom } } })),
    staleTime: 300_000,
  });
