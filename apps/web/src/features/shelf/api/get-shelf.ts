import { queryOptions, useQuery } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const shelfQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'shelf'),
    queryFn: () =>
      answered(api.GET('/darkrooms/{darkroomId}/shelf', { params: { path: { darkroomId: darkroom } } })),
  });

export const useShelf = () => useQuery(shelfQuery(useDarkroom().address));
