import { addMonths, isLocalDate, localDate, showDate, startOfDay } from './dates.js';

describe('local dates', () => {
  it.each([
    ['2026-03-01', 'Europe/Prague', '2026-02-28T23:00:00.000Z'],
    ['2026-03-29', 'Europe/Prague', '2026-03-28T23:00:00.000Z'],
    ['2026-03-30', 'Europe/Prague', '2026-03-29T22:00:00.000Z'],
    ['2026-01-01', 'Pacific/Kiritimati', '2025-12-31T10:00:00.000Z'],
    ['2026-01-01', 'Pacific/Pago_Pago', '2026-01-01T11:00:00.000Z'],
    // Clocks went from 00:00 to 01:00: that day had no midnight.
    ['2018-11-04', 'America/Sao_Paulo', '2018-11-04T03:00:00.000Z'],
    // The zone crossed the date line: 30 December 2011 never was there.
    ['2011-12-30', 'Pacific/Apia', '2011-12-30T10:00:00.000Z'],
  ])('%s in %s begins at %s', (date, zone, expected) => {
    expect(startOfDay(date, zone)).toBe(expected);
  });

  it('are those of the zone', () => {
    expect(localDate('2026-03-01T23:30:00Z', 'Europe/Prague')).toBe('2026-03-02');
    expect(localDate('2026-03-01T23:30:00Z', 'America/New_York')).toBe('2026-03-01');
    expect(() => localDate('yesterday', 'UTC')).toThrow(RangeError);
  });

  it('are dates of the calendar', () => {
    expect(['2026-02-28', '2026-02-29', '2026-2-1', 'x'].map(isLocalDate)).toEqual([
      true,
      false,
      false,
      false,
    ]);
    expect(addMonths('2026-12-31', 2)).toBe('2027-02-28');
    expect(() => addMonths('2026-02-30', 1)).toThrow(RangeError);
  });

  it('are shown with their year only when that is far', () => {
    expect(showDate('2027-02-01', '2026-12-01')).toBe('1 Feb');
    expect(showDate('2028-12-01', '2026-12-01')).toBe('1 Dec 2028');
  });
});
