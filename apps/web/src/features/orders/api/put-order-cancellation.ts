import { useAction } from '../../../shared/actions/use-action.js';
import type { OrderAnswer } from '../../../shared/api/types.js';
import { settleOrder } from '../settle-order.js';

/** Cancels a draft, or what has not come of a sent order. A manager's. */
export const usePutOrderCancellation = () =>
  useAction<{ orderId: string; reason: string }, OrderAnswer>({
    plural: 'order-cancellations',
    settle: (client, darkroom, { order }) => settleOrder(client, darkroom, order),
    touches: ['order', 'orders', 'shelf', 'needs-you', 'log'],
  });
