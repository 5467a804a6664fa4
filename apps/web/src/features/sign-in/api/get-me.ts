import { queryOptions, useQuery } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { ProblemError } from '../../../shared/api/problem.js';
import { meKey } from '../../../shared/api/query-keys.js';
import type { Me } from '../../../shared/api/types.js';

async function fetchMe(): Promise<Me | null> {
  try {
    return await answered(api.GET('/me'));
  } catch (error) {
    if (error instanceof ProblemError && error.status === 401) return null;
    throw error;
  }
}

/** Null when nobody is signed in. */
export const meQuery = queryOptions({ queryKey: meKey, queryFn: fetchMe, staleTime: 300_000 });

export const useMe = () => useQuery(meQuery);
