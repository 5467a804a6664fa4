import type { QueryClient } from '@tanstack/react-query';
import { keptKey } from '../api/query-keys.js';
import type { BottleList, BottlePageData, BottleView } from '../api/types.js';

/** Puts the server's own bottles in the place of what was shown. */
export function settleBottles(client: QueryClient, darkroom: string, bottles: readonly BottleView[]): void {
  const byId = new Map(bottles.map((bottle) => [bottle.id, bottle]));
  client.setQueriesData<BottleList>(
    { queryKey: keptKey(darkroom, 'bottles') },
    (list) => list && { ...list, bottles: list.bottles.map((bottle) => byId.get(bottle.id) ?? bottle) },
  );
  client.setQueriesData<BottlePageData>({ queryKey: keptKey(darkroom, 'bottle') }, (page) => {
    const bottle = page && byId.get(page.bottle.id);
    return page && bottle ? { ...page, bottle } : page;
  });
}

/** The bottles as the cache holds them, for an undo to go back to. */
export function totalsBefore(
  client: QueryClient,
  darkroom: string,
  bottleIds: readonly string[],
): Record<string, BottleView['totals']> {
  const lists = client.getQueriesData<BottleList>({ queryKey: keptKey(darkroom, 'bottles') });
  const pages = client.getQueriesData<BottlePageData>({ queryKey: keptKey(darkroom, 'bottle') });
  const known = [
    ...lists.flatMap(([, list]) => list?.bottles ?? []),
    ...pages.flatMap(([, page]) => (page ? [page.bottle] : [])),
  ];
  const found = bottleIds.flatMap((id) => {
    const bottle = known.find((one) => one.id === id);
    return bottle ? [[id, bottle.totals] as const] : [];
  });
  return Object.fromEntries(found);
}
