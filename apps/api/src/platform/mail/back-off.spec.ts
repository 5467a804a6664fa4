import { MOST_ATTEMPTS, waitAfter } from './back-off.js';

const MINUTE = 60_000;

describe('the wait after a failed try', () => {
  it.each([
    [1, MINUTE / 2],
    [2, 2 * MINUTE],
    [3, 10 * MINUTE],
    [4, 60 * MINUTE],
    [5, 120 * MINUTE],
    [6, 240 * MINUTE],
    [11, 240 * MINUTE],
  ])('after try %i is %i ms', (attempts, ms) => {
    expect(waitAfter(attempts, 30)).toBe(ms);
  });

  it('ends with the last try', () => {
    expect(waitAfter(MOST_ATTEMPTS, 30)).toBeNull();
  });

  it('goes on for about a day', () => {
    const waits = Array.from({ length: MOST_ATTEMPTS - 1 }, (_, i) => waitAfter(i + 1, 30) ?? 0);
    const hours = waits.reduce((sum, ms) => sum + ms, 0) / (60 * MINUTE);
    expect(hours).toBeGreaterThan(24);
    expect(hours).toBeLessThan(30);
  });
});
