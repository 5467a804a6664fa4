import { queryOptions, useQuery } from '@tanstack/react-query';
import { get, inDarkroom } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import type { OrderView } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const ordersQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'orders'),
    queryFn: () => get<{ orders: OrderView[] }>(inDarkroom(darkroom, '/orders')),
  });

export const useOrders = () => useQuery(ordersQuery(useDarkroom().address));
