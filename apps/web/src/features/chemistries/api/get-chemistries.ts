import { queryOptions, useQuery } from '@tanstack/react-query';
import { get, inDarkroom } from '../../../shared/api/client.js';
import { keptKey } from '../../../shared/api/query-keys.js';
import type { ChemistryView } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';

export const chemistriesQuery = (darkroom: string) =>
  queryOptions({
    queryKey: keptKey(darkroom, 'chemistries'),
    queryFn: () => get<{ chemistries: ChemistryView[] }>(inDarkroom(darkroom, '/chemistries')),
  });

export const useChemistries = () => useQuery(chemistriesQuery(useDarkroom().address));
