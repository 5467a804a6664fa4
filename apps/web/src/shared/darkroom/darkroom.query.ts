import { queryOptions } from '@tanstack/react-query';
import { answered, api } from '../api/client.js';
import { keptKey } from '../api/query-keys.js';

export const darkroomQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'settings'),
    queryFn: () =>
      answered(api.GET('/darkrooms/{darkroomId}', { params: { path: { darkroomId: darkroom } } })),
    staleTime: 300_000,
  });
