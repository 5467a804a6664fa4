import { queryOptions, useQuery } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const needsYouQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'needs-you'),
    queryFn: () =>
      answered(api.GET('/darkrooms/{darkroomId}/needs-you', { params: { path: { darkroomId: darkroom } } })),
  });

/** Asked only where the role may see it. */
export const useNeedsYou = (enabled = true) => useQuery({ ...needsYouQuery(useDarkroom().address), enabled });
