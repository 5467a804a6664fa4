import { queryOptions, useQuery } from '@tanstack/react-query';
import { get, inDarkroom } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import type { BottleList } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const bottlesQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'bottles', 'in-use'),
    queryFn: () => get<BottleList>(inDarkroom(darkroom, '/bottles?state=in-use')),
  });

export const useBottles = () => useQuery(bottlesQuery(useDarkroom().address));
