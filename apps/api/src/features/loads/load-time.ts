import { loadFlags, type LoadFlag } from '@wetside/db';
import type { Recording } from '../../platform/ledger/recording.js';
import type { LockedBottle } from '../bottles/bottle-row.js';
import { keepAfterMix } from '../bottles/mix-time.js';

/**
 * A load that was moved to its mix's time is unsure; so is one told for the future, which stands at now.
 * @param reported the person said that it had gone through already
 * @returns the flags of the load as a whole
 * @throws Problem 'before-the-mix'
 */
export function placeInTime(
  recording: Recording,
  locked: readonly LockedBottle[],
  reported: boolean,
): LoadFlag[] {
  const unsure = keepAfterMix(recording, locked) || recording.when.clamped;
  const raised: Record<LoadFlag, boolean> = { time_unsure: unsure, late: recording.when.late, reported };
  return loadFlags.filter((flag) => raised[flag]);
}
