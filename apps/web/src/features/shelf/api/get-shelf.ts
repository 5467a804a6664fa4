import { queryOptions, useQuery } from '@tanstack/react-query';
import { get, inDarkroom } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import type { Shelf } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const shelfQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'shelf'),
    queryFn: () => get<Shelf>(inDarkroom(darkroom, '/shelf')),
  });

export const useShelf = () => useQuery(shelfQuery(useDarkroom().address));
