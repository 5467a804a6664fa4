import { useAction } from '../../../shared/actions/use-action.js';
import type { OrderAnswer } from '../../../shared/api/types.js';

export interface DraftContent {
  orderId: string;
  supplierId: string;
  lines: { id: string; supplierPackId: string; count: number }[];
}

/** Begins an order at a supplier. A technician's. */
export const usePutOrderDraft = () =>
  useAction<DraftContent, OrderAnswer>({
    plural: 'order-drafts',
    touches: ['orders', 'shelf', 'needs-you', 'log'],
  });
