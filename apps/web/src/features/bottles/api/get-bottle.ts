import { queryOptions, useQuery } from '@tanstack/react-query';
import { get, inDarkroom } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import type { BottlePageData } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const bottleQuery = (darkroom: string, code: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'bottle', code),
    queryFn: () => get<BottlePageData>(inDarkroom(darkroom, `/bottles/${encodeURIComponent(code)}`)),
  });

export const useBottle = (code: string) => useQuery(bottleQuery(useDarkroom().address, code));
