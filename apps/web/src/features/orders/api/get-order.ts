import { queryOptions, useQuery } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const orderQuery = (darkroom: string, id: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'order', id),
    queryFn: () =>
      answered(
        api.GET('/darkrooms/{darkroomId}/orders/{orderId}', {
          params: { path: { darkroomId: darkroom, orderId: id } },
        }),
      ),
  });

export const useOrder = (id: string) => useQuery(orderQuery(useDarkroom().address, id));
