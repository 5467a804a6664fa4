import { useAction } from '../../../shared/actions/use-action.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import { answered, api } from '../../../shared/api/client.js';
import type { ReceiptAnswer, ReceiptContent } from '../../../shared/api/types.js';

/** Puts what came onto the shelf, from an order or by hand. A technician's. */
export const usePutReceipt = () =>
  useAction<ReceiptContent, ReceiptAnswer>({
    put: (path, body) =>
      answered(api.PUT('/darkrooms/{darkroomId}/receipts/{actionId}', { params: { path }, body })),
    settle: (client, darkroom, { shelf }) => client.setQueryData(keptKey(darkroom, 'shelf'), shelf),
    touches: ['shelf', 'orders', 'order', 'needs-you', 'log', 'chemistries'],
  });
