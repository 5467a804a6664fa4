import { problem } from '../../platform/errors/problem.js';
import { BEFORE_MIX_MS } from '../../platform/ledger/happened.js';
import type { Recording } from '../../platform/ledger/recording.js';
import type { LockedBottle } from '../bottles/bottle-row.js';

/**
 * A load told for up to a day before the mix (a slow phone at a fresh bottle) stands at the mix's time and is unsure;
 * so is one told for the future, which stands at now.
 * @returns the flags of the load as a whole
 * @throws Problem 'before-the-mix'
 */
export function placeInTime(
  recording: Recording,
  locked: readonly LockedBottle[],
): ('time_unsure' | 'late')[] {
  const told = recording.happenedAt.getTime();
  const youngest = locked.reduce((a, b) => (b.madeAt > a.madeAt ? b : a));
  const early = youngest.madeAt.getTime() - told;
  if (early > BEFORE_MIX_MS) throw problem('before-the-mix', youngest.code);
  if (early > 0) recording.moveTo(youngest.madeAt);
  const unsure = early > 0 || recording.when.clamped;
  return [...(unsure ? (['time_unsure'] as const) : []), ...(recording.when.late ? (['late'] as const) : [])];
}
