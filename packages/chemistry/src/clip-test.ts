import { scaleDown } from './fraction.js';

/**
 * The share of the rated capacity that a clip test leaves at most, in 1/10,000: 2 − clearing ÷ fresh, between
 * 0 and 1, rounded down. Times in seconds. Twice the fresh time is spent: Tyrrell, Analogue Photography FAQ, and
 * NAVEDTRA 14209 (second-hand). Throws RangeError without a fresh time above zero.
 */
export function clipShareE4(clearingSeconds: number, freshSeconds: number): number {
  if (!(freshSeconds > 0) || clearingSeconds < 0) throw new RangeError('a clip test needs a fresh time');
  return Math.min(10_000, Math.max(0, scaleDown(2 * freshSeconds - clearingSeconds, 10_000, freshSeconds)));
}
