import type { OrderView } from '../../../shared/api/types.js';
import { ReasonSheet } from '../../../shared/ui/reason-sheet.js';
import { usePutOrderCancellation } from '../api/put-order-cancellation.js';

interface Props {
  order: OrderView;
  open: boolean;
  onClose: () => void;
}

/** Asked once: a cancelled order is not taken back, and the supplier is told. */
export function CancelSheet({ order, open, onClose }: Props) {
  const cancel = usePutOrderCancellation();
  const sent = order.state === 'sent';
  return (
    <ReasonSheet
      open={open}
      onClose={onClose}
      title={sent ? `Cancel what has not come of ${order.numberText}` : `Cancel draft ${order.numberText}`}
      label="Why"
      missing="Say why: it stays in the log."
      suggestions={[]}
      button={sent ? `Cancel the rest and tell ${order.supplier.name}` : 'Cancel the draft'}
      onConfirm={(actionId, reason) =>
        cancel.sendFromSheet(
          actionId,
          { orderId: order.id, reason },
          { words: `Order ${order.numberText} is cancelled.`, canUndo: false },
        )
      }
    />
  );
}
