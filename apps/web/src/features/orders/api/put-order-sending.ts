import { useAction } from '../../../shared/actions/use-action.js';
import { answered, api } from '../../../shared/api/client.js';
import type { OrderAnswer, OrderSendingContent } from '../../../shared/api/types.js';
import { settleOrder } from '../settle-order.js';

/** Sends the order by mail, as it stands at that revision. A manager's. */
export const usePutOrderSending = () =>
  useAction<OrderSendingContent, OrderAnswer>({
    put: (path, body) =>
      answered(api.PUT('/darkrooms/{darkroomId}/order-sendings/{actionId}', { params: { path }, body })),
    settle: (client, darkroom, { order }) => settleOrder(client, darkroom, order),
    touches: ['order', 'orders', 'shelf', 'needs-you', 'log'],
  });
