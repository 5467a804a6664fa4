import { useAction } from '../../../shared/actions/use-action.js';
import { answered, api } from '../../../shared/api/client.js';
import type { OrderAnswer, OrderDraftContent } from '../../../shared/api/types.js';

/** Begins an order at a supplier. A technician's. */
export const usePutOrderDraft = () =>
  useAction<OrderDraftContent, OrderAnswer>({
    put: (path, body) =>
      answered(api.PUT('/darkrooms/{darkroomId}/order-drafts/{actionId}', { params: { path }, body })),
    touches: ['orders', 'shelf', 'needs-you', 'log'],
  });
