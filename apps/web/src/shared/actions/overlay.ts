import {
  apply,
  type BottleFact,
  type BottleTotals,
  type ChemistryDocument,
  localDate,
} from '@wetside/chemistry';
import type { BottleView } from '../api/types.js';
import { reckonedNow } from '../clock/web-clock.js';
import type { BottleChange, PendingAction } from './pending.store.js';

/** The fact placed after everything that is known, even where this device's clock is behind. */
function place(change: BottleChange, actionId: string, totals: BottleTotals, zone: string): BottleFact {
  const now = reckonedNow();
  const happenedAt = Date.parse(now) > Date.parse(totals.lastHappenedAt) ? now : totals.lastHappenedAt;
  return {
    ...change.fact,
    actionId,
    seq: totals.lastSeq + 1,
    happenedAt,
    happenedOn: localDate(happenedAt, zone),
  };
}

/**
 * What is shown: the server's totals and the actions that the server does not yet name. Nothing is written
 * into the cache, so taking a pending action away is all that a refusal needs.
 */
export function overlay(
  bottle: BottleView,
  document: ChemistryDocument,
  pending: readonly PendingAction[],
  zone: string,
): BottleView {
  let totals = bottle.totals;
  for (const action of pending) {
    if (totals.lastActionId === action.actionId) continue;
    const before = action.restores?.before[bottle.id];
    if (before && totals.lastActionId === action.restores?.actionId) totals = before;
    for (const change of action.changes) {
      if (change.bottleId !== bottle.id) continue;
      totals = apply(document, totals, place(change, action.actionId, totals, zone));
    }
  }
  return totals === bottle.totals ? bottle : { ...bottle, totals };
}
