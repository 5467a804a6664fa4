import type { QueryClient } from '@tanstack/react-query';
import type { BottleTotals } from '@wetside/chemistry';
import type { BottleChange } from './pending.store.js';
import { totalsBefore } from './settle-bottles.js';

const remembered = new Map<string, Record<string, BottleTotals>>();

/** Keeps how the bottles stood before an action of this page, so that its undo can be shown at once. */
export function rememberBefore(
  client: QueryClient,
  darkroom: string,
  actionId: string,
  changes: readonly BottleChange[],
): void {
  if (changes.length === 0 || remembered.has(actionId)) return;
  remembered.set(
    actionId,
    totalsBefore(
      client,
      darkroom,
      changes.map((change) => change.bottleId),
    ),
  );
}

export const beforeOf = (actionId: string): Record<string, BottleTotals> => remembered.get(actionId) ?? {};
