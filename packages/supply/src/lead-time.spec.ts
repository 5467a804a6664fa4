import { leadTime } from './lead-time.js';

const took = (sentOn: string, arrivedOn: string | null) => ({ sentOn, arrivedOn });

describe('lead time', () => {
  it('is a week, called a guess, before any order has come in', () => {
    const guess = { days: 7, guess: true, reason: '7 days, a guess: no order has come in yet' };
    expect(leadTime([])).toEqual(guess);
    expect(leadTime([took('2026-03-01', null)])).toEqual(guess);
  });

  it('is the median of what came in, across a change of clocks', () => {
    const orders = [
      took('2026-01-01', '2026-02-20'),
      took('2026-03-01', '2026-03-10'),
      took('2026-03-25', '2026-04-01'),
      took('2026-05-01', null),
    ];
    expect(leadTime(orders)).toEqual({
      days: 9,
      guess: false,
      reason: 'about 9 days, from the last 3 orders',
    });
    expect(leadTime(orders.slice(1)).days).toBe(9);
  });

  it('looks at the last ten only', () => {
    const slow = Array.from({ length: 20 }, () => took('2025-01-01', '2025-03-01'));
    const quick = Array.from({ length: 10 }, (_, day) => took(`2026-01-1${day}`, `2026-01-2${day}`));
    expect(leadTime([...slow, ...quick]).days).toBe(10);
  });

  it('refuses an order that arrives before it was sent', () => {
    expect(() => leadTime([took('2026-03-02', '2026-03-01')])).toThrow(RangeError);
  });
});
