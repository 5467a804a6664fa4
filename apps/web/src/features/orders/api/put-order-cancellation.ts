import { useAction } from '../../../shared/actions/use-action.js';
import { answered, api } from '../../../shared/api/client.js';
import type { OrderAnswer, OrderCancellationContent } from '../../../shared/api/types.js';
import { settleOrder } from '../settle-order.js';

/** Cancels a draft, or what has not come of a sent order. A manager's. */
export const usePutOrderCancellation = () =>
  useAction<OrderCancellationContent, OrderAnswer>({
    put: (path, body) =>
      answered(api.PUT('/darkrooms/{darkroomId}/order-cancellations/{actionId}', { params: { path }, body })),
    settle: (client, darkroom, { order }) => settleOrder(client, darkroom, order),
    touches: ['order', 'orders', 'shelf', 'needs-you', 'log'],
  });
