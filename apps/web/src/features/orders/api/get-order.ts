import { queryOptions, useQuery } from '@tanstack/react-query';
import { get, inDarkroom } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import type { OrderPageData } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const orderQuery = (darkroom: string, id: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'order', id),
    queryFn: () => get<OrderPageData>(inDarkroom(darkroom, `/orders/${encodeURIComponent(id)}`)),
  });

export const useOrder = (id: string) => useQuery(orderQuery(useDarkroom().address, id));
