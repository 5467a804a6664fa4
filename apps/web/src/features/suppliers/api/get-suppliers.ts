import { queryOptions, useQuery } from '@tanstack/react-query';
import { get, inDarkroom } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import type { Supplier } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const suppliersQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'suppliers'),
    queryFn: () => get<{ suppliers: Supplier[] }>(inDarkroom(darkroom, '/suppliers')),
  });

export const useSuppliers = () => useQuery(suppliersQuery(useDarkroom().address));
