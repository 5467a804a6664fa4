import { queryOptions, useQuery } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const ordersQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'orders'),
    queryFn: () =>
      answered(api.GET('/darkrooms/{darkroomId}/orders', { params: { path: { darkroomId: darkroom } } })),
  });

export const useOrders = () => useQuery(ordersQuery(useDarkroom().address));
