import { queryOptions, useQuery } from '@tanstack/react-query';
import { get, inDarkroom } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import type { NeedsYouRow } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const needsYouQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'needs-you'),
    queryFn: () => get<{ open: NeedsYouRow[] }>(inDarkroom(darkroom, '/needs-you')),
  });

/** Asked only where the role may see it. */
export const useNeedsYou = (enabled = true) => useQuery({ ...needsYouQuery(useDarkroom().address), enabled });
