import { happened, type Told } from './happened.js';

const now = new Date('2026-03-10T12:00:00.000Z');
const MINUTE = 60_000;
const DAY = 1_440 * MINUTE;
const at = (ms: number): Date => new Date(now.getTime() + ms);

/** Told for so many milliseconds from now, by a device whose clock is so many ahead. */
const told = (fromNow: number, deviceAhead = 0, kind: Told['kind'] = 'load') =>
  happened({ kind, happenedAt: at(fromNow), deviceNow: at(deviceAhead) }, now);

describe('the time at which something happened', () => {
  it.each([
    [2 * MINUTE, 0],
    [-2 * MINUTE, 0],
    [2 * MINUTE + 1, -(2 * MINUTE + 1)],
    [-(2 * MINUTE + 1), 2 * MINUTE + 1],
  ])('by a clock %d ms ahead is moved by %d ms', (ahead, moved) => {
    expect(told(-60 * MINUTE, ahead)?.at).toEqual(at(-60 * MINUTE + moved));
  });

  it('may be 5 minutes ahead to the millisecond', () => {
    expect(told(5 * MINUTE)).toMatchObject({ at: at(5 * MINUTE), clamped: false });
    expect(told(5 * MINUTE, 0, 'hold')).toMatchObject({ at: at(5 * MINUTE) });
    expect(told(5 * MINUTE + 1)).toMatchObject({ at: now, clamped: true });
    expect(told(5 * MINUTE + 1, 0, 'hold')).toBeNull();
  });

  it('is judged after the clock was put right', () => {
    expect(told(20 * MINUTE, 20 * MINUTE, 'hold')).toMatchObject({ at: now, clamped: false, late: false });
    expect(told(0, -20 * MINUTE, 'hold')).toBeNull();
  });

  it('is late after an hour, and long ago after 30 days', () => {
    expect(told(-60 * MINUTE)).toMatchObject({ late: false, longAgo: false });
    expect(told(-60 * MINUTE - 1)).toMatchObject({ late: true, longAgo: false });
    expect(told(-30 * DAY)).toMatchObject({ longAgo: false });
    expect(told(-30 * DAY - 1)).toMatchObject({ longAgo: true });
  });
});
