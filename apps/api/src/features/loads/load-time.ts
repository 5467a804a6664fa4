import type { Recording } from '../../platform/ledger/recording.js';
import type { LockedBottle } from '../bottles/bottle-row.js';
import { keepAfterMix } from '../bottles/mix-time.js';

/**
 * A load that was moved to its mix's time is unsure; so is one told for the future, which stands at now.
 * @returns the flags of the load as a whole
 * @throws Problem 'before-the-mix'
 */
export function placeInTime(
  recording: Recording,
  locked: readonly LockedBottle[],
): ('time_unsure' | 'late')[] {
  const unsure = keepAfterMix(recording, locked) || recording.when.clamped;
  return [...(unsure ? (['time_unsure'] as const) : []), ...(recording.when.late ? (['late'] as const) : [])];
}
