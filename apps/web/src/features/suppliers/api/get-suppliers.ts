import { queryOptions, useQuery } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const suppliersQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'suppliers'),
    queryFn: () =>
      answered(api.GET('/darkrooms/{darkroomId}/suppliers', { params: { path: { darkroomId: darkroom } } })),
  });

export const useSuppliers = () => useQuery(suppliersQuery(useDarkroom().address));
