import { assess } from './assess.js';
import { defaultThresholds, type AssessContext } from './assess-types.js';
import { rapidFixer } from './catalogue/starter-catalogue.js';
import { addDays, addMonths, localDate, startOfDay } from './dates.js';
import { fold } from './fold.js';
import type { BottleFact } from './ledger.js';

const HOUR_MS = 3_600_000;
const ms = (instant: string): number => Date.parse(instant);
const hours = (date: string, zone: string): number =>
  (ms(startOfDay(addDays(date, 1), zone)) - ms(startOfDay(date, zone))) / HOUR_MS;

/**
 * Every instant is worked out by hand from the zone's offset and its rule in the IANA time zone database (published:
 * https://www.iana.org/time-zones, files europe, asia, australasia, northamerica, southamerica). Santiago needs its
 * rules from 2022f on, Beirut from 2013 on.
 */
const zones = [
  { zone: 'Pacific/Kiritimati', last: '2027-02-28', past: '2027-02-28T10:00:00.000Z', lasts: 24 },
  { zone: 'Pacific/Pago_Pago', last: '2027-02-28', past: '2027-03-01T11:00:00.000Z', lasts: 24 },
  { zone: 'Asia/Kathmandu', last: '2027-02-28', past: '2027-02-28T18:15:00.000Z', lasts: 24 },
  { zone: 'America/St_Johns', last: '2027-02-28', past: '2027-03-01T03:30:00.000Z', lasts: 24 },
  // Clocks go on at 02:00 and back at 03:00.
  { zone: 'Europe/Vienna', last: '2027-03-28', past: '2027-03-28T22:00:00.000Z', lasts: 23 },
  { zone: 'Europe/Vienna', last: '2027-10-31', past: '2027-10-31T23:00:00.000Z', lasts: 25 },
  // Clocks go on at midnight: the next day has none and begins at 01:00.
  { zone: 'Asia/Beirut', last: '2027-03-27', past: '2027-03-27T22:00:00.000Z', lasts: 24 },
  { zone: 'Asia/Beirut', last: '2027-03-28', past: '2027-03-28T21:00:00.000Z', lasts: 23 },
  { zone: 'America/Santiago', last: '2027-09-04', past: '2027-09-05T04:00:00.000Z', lasts: 24 },
  { zone: 'America/Santiago', last: '2027-09-05', past: '2027-09-06T03:00:00.000Z', lasts: 23 },
  // Clocks go back at midnight: the last hour of the day comes twice.
  { zone: 'America/Santiago', last: '2027-04-03', past: '2027-04-04T04:00:00.000Z', lasts: 25 },
  { zone: 'America/Havana', last: '2027-11-06', past: '2027-11-07T04:00:00.000Z', lasts: 24 },
  { zone: 'America/Havana', last: '2027-11-07', past: '2027-11-08T05:00:00.000Z', lasts: 25 },
];

describe.each(zones)('the date $last in $zone', ({ zone, last, past, lasts }) => {
  const secondBefore = new Date(ms(past) - 1_000).toISOString();

  it(`lasts ${lasts} hours and ends at ${past}`, () => {
    expect(startOfDay(addDays(last, 1), zone)).toBe(past);
    expect(hours(last, zone)).toBe(lasts);
    expect(localDate(secondBefore, zone)).toBe(last);
    expect(localDate(past, zone)).toBe(addDays(last, 1));
  });

  it('is good through the whole of it, and past at the first instant of the next', () => {
    const mixedOn = addDays(last, -59);
    const bottle: BottleFact = {
      kind: 'mix',
      actionId: 'a',
      seq: 1,
      happenedAt: startOfDay(mixedOn, zone),
      happenedOn: mixedOn,
      volumeUl: 1_000_000,
      container: { sizeUl: 1_000_000, kind: 'bottle' },
      material: 'film',
    };
    // The days that it keeps are given as days here: what months come to is asked below.
    const keeping = rapidFixer.keeping.map((figure) => ({
      ...figure,
      keeps: { count: 59, unit: 'days' as const },
    }));
    const document = { ...rapidFixer, keeping };
    const totals = fold(document, [bottle]);
    if (!totals) throw new Error('a mixed bottle has totals');
    const stands = (now: string) => {
      const context: AssessContext = {
        now,
        today: localDate(now, zone),
        zone,
        smallestTankUl: null,
        thresholds: defaultThresholds,
      };
      return assess(document, totals, context);
    };
    expect(stands(secondBefore)).toMatchObject({
      lastDay: last,
      daysLeft: 0,
      verdict: 'near-date',
      closed: false,
      nextLookAt: past,
    });
    expect(stands(past)).toMatchObject({
      lastDay: last,
      daysLeft: -1,
      verdict: 'past-date',
      closed: true,
      nextLookAt: null,
    });
    // And when it comes near its date: seven days before, at that date's first instant.
    const near = startOfDay(addDays(last, -7), zone);
    expect(stands(new Date(ms(near) - 1_000).toISOString())).toMatchObject({
      verdict: 'open',
      nextLookAt: near,
    });
    expect(stands(near)).toMatchObject({ verdict: 'near-date', nextLookAt: past });
  });
});

describe('so many months on', () => {
  it.each([
    ['2027-01-31', 1, '2027-02-28'],
    ['2028-01-31', 1, '2028-02-29'],
    ['2027-12-31', 2, '2028-02-29'],
    ['2028-02-29', 12, '2029-02-28'],
    ['2028-02-29', 48, '2032-02-29'],
    ['2027-08-31', 6, '2028-02-29'],
    ['2027-10-31', 1, '2027-11-30'],
    ['2027-03-31', 1, '2027-04-30'],
    ['2027-12-15', 1, '2028-01-15'],
    // A century that is no leap year, and one that is.
    ['2099-12-31', 2, '2100-02-28'],
    ['1999-12-31', 2, '2000-02-29'],
  ])('%s and %i is %s', (date, months, expected) => {
    expect(addMonths(date, months)).toBe(expected);
  });

  it('a leap day is a day of its own', () => {
    expect(addDays('2028-02-28', 1)).toBe('2028-02-29');
    expect(addDays('2028-02-29', 1)).toBe('2028-03-01');
    expect(hours('2028-02-29', 'Pacific/Kiritimati')).toBe(24);
    expect(startOfDay('2028-02-29', 'Pacific/Kiritimati')).toBe('2028-02-28T10:00:00.000Z');
  });
});
