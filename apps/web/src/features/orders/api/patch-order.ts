import { useMutation, useQueryClient } from '@tanstack/react-query';
import { inDarkroom, request } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import type { OrderView } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { settleOrder } from '../settle-order.js';

export interface DraftEdit {
  revision: number;
  note?: string | null;
  lines: { id: string; supplierPackId: string; count: number }[];
}

/** Edits a draft; refused when somebody else changed it meanwhile. */
export function usePatchOrder(orderId: string) {
  const client = useQueryClient();
  const { address } = useDarkroom();
  return useMutation({
    mutationFn: (edit: DraftEdit) =>
      request<{ order: OrderView }>('PATCH', inDarkroom(address, `/orders/${orderId}`), edit),
    onSuccess: ({ order }) => {
      settleOrder(client, address, order);
    },
    onSettled: async () => {
      await client.invalidateQueries({ queryKey: keptKey(address, 'order', orderId) });
      void client.invalidateQueries({ queryKey: keptKey(address, 'orders') });
    },
  });
}
