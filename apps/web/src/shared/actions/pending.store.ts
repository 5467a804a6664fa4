import type { BottleFact, BottleTotals } from '@wetside/chemistry';
import { createStore } from '../store.js';

/** A fact without its place in the ledger: the server gives that. */
type WithoutPlace<F> = F extends BottleFact
  ? Omit<F, 'actionId' | 'seq' | 'happenedAt' | 'happenedOn'>
  : never;
export interface BottleChange {
  bottleId: string;
  fact: WithoutPlace<BottleFact>;
}

/** An action that the server has not answered for yet. */
export interface PendingAction {
  actionId: string;
  darkroom: string;
  changes: readonly BottleChange[];
  /** For an undo: the totals as they stood before the undone action, by bottle. */
  restores?: { actionId: string; before: Readonly<Record<string, BottleTotals>> };
}

export const pendingActions = createStore<readonly PendingAction[]>([]);

export function addPending(action: PendingAction): void {
  pendingActions.set((all) => [...all.filter((one) => one.actionId !== action.actionId), action]);
}

export function removePending(actionId: string): void {
  pendingActions.set((all) => all.filter((one) => one.actionId !== actionId));
}
