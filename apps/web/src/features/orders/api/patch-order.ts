import { useMutation, useQueryClient } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import type { ChangeOrder } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { settleOrder } from '../settle-order.js';

/** Edits a draft; refused when somebody else changed it meanwhile. */
export function usePatchOrder(orderId: string) {
  const client = useQueryClient();
  const { address } = useDarkroom();
  return useMutation({
    // Without a signal it fails at once, and the form says so.
    networkMode: 'always',
    mutationFn: (change: ChangeOrder) =>
      answered(
        api.PATCH('/darkrooms/{darkroomId}/orders/{orderId}', {
          params: { path: { darkroomId: address, orderId } },
          body: change,
        }),
      ),
    onSuccess: ({ order }) => {
      settleOrder(client, address, order);
    },
    onSettled: async () => {
      await client.invalidateQueries({ queryKey: keptKey(address, 'order', orderId) });
      void client.invalidateQueries({ queryKey: keptKey(address, 'orders') });
    },
  });
}
