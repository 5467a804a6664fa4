import { useAction } from '../../../shared/actions/use-action.js';
import type { OrderAnswer } from '../../../shared/api/types.js';
import { settleOrder } from '../settle-order.js';

/** Sends the order by mail, as it stands at that revision. A manager's. */
export const usePutOrderSending = () =>
  useAction<{ orderId: string; revision: number }, OrderAnswer>({
    plural: 'order-sendings',
    settle: (client, darkroom, { order }) => settleOrder(client, darkroom, order),
    touches: ['order', 'orders', 'shelf', 'needs-you', 'log'],
  });
