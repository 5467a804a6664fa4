import { queryOptions, useQuery } from '@tanstack/react-query';
import { answered, api } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const chemistriesQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'chemistries'),
    queryFn: () =>
      answered(
        api.GET('/darkrooms/{darkroomId}/chemistries', { params: { path: { darkroomId: darkroom } } }),
      ),
  });

export const useChemistries = () => useQuery(chemistriesQuery(useDarkroom().address));
