import type { BottleTotals } from '@wetside/chemistry';
import type { Tx } from '../database/database.js';
import type { ActionsRepository } from './actions.repository.js';

/**
 * These rows, each with the name of whoever put its bottle on hold. Looked up by the ids that stand in the totals: a
 * join on what is inside a document cannot use the actions' key below row security, and reads all that ever happened.
 */
export async function withHolders<R extends { totals: BottleTotals | null }>(
  actions: ActionsRepository,
  tx: Tx,
  darkroomId: string,
  rows: readonly R[],
): Promise<(R & { holdBy: string | null })[]> {
  const holdOf = ({ totals }: R): string | null => totals?.hold?.actionId ?? null;
  const ids = rows.map(holdOf).filter((id) => id !== null);
  const names = await actions.names(tx, darkroomId, ids);
  return rows.map((row) => ({ ...row, holdBy: names.get(holdOf(row) ?? '') ?? null }));
}
