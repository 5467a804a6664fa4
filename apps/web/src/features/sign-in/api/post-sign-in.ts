import { useMutation, useQueryClient } from '@tanstack/react-query';
import { request } from '../../../shared/api/client.js';
import { meKey } from '../../../shared/api/query-keys.js';
import type { Me, SignedIn } from '../../../shared/api/types.js';
import { reckonedNow } from '../../../shared/clock/web-clock.js';

export interface Credentials {
  email: string;
  passphrase: string;
}

export function usePostSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (credentials: Credentials) => request<SignedIn>('POST', '/sign-in', credentials),
    onSuccess: ({ person, darkrooms }) => {
      client.setQueryData<Me>(meKey, { person, darkrooms, now: reckonedNow() });
    },
  });
}
