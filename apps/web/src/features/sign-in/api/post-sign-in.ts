import { useMutation, useQueryClient } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { meKey } from '../../../shared/api/query-keys.js';
import type { Me, SignInRequest } from '../../../shared/api/types.js';
import { reckonedNow } from '../../../shared/clock/web-clock.js';

export function usePostSignIn() {
  const client = useQueryClient();
  return useMutation({
    // Without a signal it fails at once, and the form says so.
    networkMode: 'always',
    mutationFn: (credentials: SignInRequest) => answered(api.POST('/sign-in', { body: credentials })),
    onSuccess: ({ person, darkrooms }) => {
      client.setQueryData<Me>(meKey, { person, darkrooms, now: reckonedNow() });
    },
  });
}
