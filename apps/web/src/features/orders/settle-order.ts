import type { QueryClient } from '@tanstack/react-query';
import { keptKey } from '../../shared/api/query-keys.js';
import type { OrderPageData, OrderView } from '../../shared/api/types.js';

/** Puts the server's own order in the place of what was shown; its mail text is fetched anew. */
export function settleOrder(client: QueryClient, darkroom: string, order: OrderView): void {
  client.setQueryData<OrderPageData>(
    keptKey(darkroom, 'order', order.id),
    (page) => page && { ...page, order },
  );
}
