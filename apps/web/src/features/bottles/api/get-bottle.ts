import { queryOptions, useQuery } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const bottleQuery = (darkroom: string, code: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'bottle', code),
    queryFn: () =>
      answered(
        api.GET('/darkrooms/{darkroomId}/bottles/{bottle}', {
          params: { path: { darkroomId: darkroom, bottle: code } },
        }),
      ),
  });

export const useBottle = (code: string) => useQuery(bottleQuery(useDarkroom().address, code));
