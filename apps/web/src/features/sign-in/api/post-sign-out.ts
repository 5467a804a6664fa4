import { useMutation, useQueryClient } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { clearStrip } from '../../../shared/actions/strip.store.js';
import { meKey } from '../../../shared/api/query-keys.js';

/** Signs out here, and forgets everything that was fetched. */
export function usePostSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => answered(api.POST('/sign-out')),
    onSuccess: () => {
      clearStrip();
      client.clear();
      client.setQueryData(meKey, null);
    },
  });
}
