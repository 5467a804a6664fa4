/** After so many tries a mail is given up, about a day after the first. */
export const MOST_ATTEMPTS = 12;

/** Times the first wait: 30 s, 2 min, 10 min, 1 h, 2 h, then every 4 h. */
const STEPS = [1, 4, 20, 120, 240, 480];

/**
 * Milliseconds to wait after that many failed tries, the first wait being `backoffS`; null: give up.
 */
export function waitAfter(attempts: number, backoffS: number): number | null {
  if (attempts >= MOST_ATTEMPTS) return null;
  const step = STEPS[Math.min(attempts, STEPS.length) - 1] ?? 1;
  return step * backoffS * 1_000;
}
