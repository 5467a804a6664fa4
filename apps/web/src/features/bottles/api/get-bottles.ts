import { queryOptions, useQuery } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const bottlesQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'bottles', 'in-use'),
    queryFn: () =>
      answered(
        api.GET('/darkrooms/{darkroomId}/bottles', {
          params: { path: { darkroomId: darkroom }, query: { state: 'in-use' } },
        }),
      ),
  });

export const useBottles = () => useQuery(bottlesQuery(useDarkroom().address));
