import { problem } from '../../platform/errors/problem.js';
import { BEFORE_MIX_MS } from '../../platform/ledger/happened.js';
import type { Recording } from '../../platform/ledger/recording.js';
import type { LockedBottle } from './bottle-row.js';

/**
 * What is told for up to a day before a bottle's mix (a slow phone at a fresh bottle) stands at the mix's time.
 * @returns whether it was moved
 * @throws Problem 'before-the-mix' for anything earlier
 */
export function keepAfterMix(recording: Recording, locked: readonly LockedBottle[]): boolean {
  const youngest = locked.reduce((a, b) => (b.madeAt > a.madeAt ? b : a));
  const early = youngest.madeAt.getTime() - recording.happenedAt.getTime();
  if (early > BEFORE_MIX_MS) throw problem('before-the-mix', youngest.code);
  if (early > 0) recording.moveTo(youngest.madeAt);
  return early > 0;
}
