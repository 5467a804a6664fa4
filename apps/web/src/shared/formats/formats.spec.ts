import { describe, expect, it } from 'vitest';
import type { FilmLine } from '../api/types.js';
import { listOf, rollsLeft, rollsUsed, showMoney, ulFromMl } from './amounts.js';
import { equivalence, filmPhrase } from './film-words.js';
import { fromWallClock, showInstant, toWallClock } from './instants.js';

const film = (line: Partial<FilmLine>): FilmLine => ({
  format: '135-36',
  count: 2,
  filmClass: 'conventional',
  ...line,
});

describe('amounts', () => {
  it('rounds what is left down and what is used up', () => {
    expect(rollsLeft(119_999)).toBe('11.9 rolls');
    expect(rollsLeft(10_000)).toBe('1 roll');
    expect(rollsUsed(4_375)).toBe('0.5 rolls');
  });

  it('shows money in its currency’s own digits', () => {
    expect(showMoney(8_400, 'EUR')).toBe('EUR 84.00');
    expect(showMoney(8_400, 'JPY')).toBe('JPY 8400');
    expect(showMoney(null, 'EUR')).toBe('no price known');
  });

  it('takes whole millilitres only', () => {
    expect(ulFromMl('600')).toBe(600_000);
    expect(['', '0', '1.5', '-3', 'a litre'].map(ulFromMl)).toEqual([null, null, null, null, null]);
  });

  it('lists words as a person would', () => {
    expect(listOf(['FX-01', 'SB-02', 'WT-03'])).toBe('FX-01, SB-02 and WT-03');
    expect(listOf(['Tomas', 'Ada'], 'or')).toBe('Tomas or Ada');
  });
});

describe('film', () => {
  it('speaks of rolls and of sheets', () => {
    expect(filmPhrase(film({}))).toBe('2 rolls of 135');
    expect(filmPhrase(film({ format: '4x5', count: 1 }))).toBe('1 sheet of 4×5');
    expect(filmPhrase(film({ format: 'sheet', widthMm: 100, heightMm: 150 }))).toBe(
      '2 sheets of 100 × 150 mm',
    );
  });

  it('says what sheets come to in rolls', () => {
    // Tyrrell, Analogue Photography FAQ, 'Fixer capacity' (second-hand): four 4×5 sheets are one roll.
    expect(equivalence(film({ format: '4x5', count: 6 }))).toBe('6 sheets = 1.5 rolls');
    expect(equivalence(film({}))).toBeNull();
    expect(equivalence(film({ format: 'sheet' }))).toBeNull();
  });
});

describe('instants', () => {
  const zone = 'Europe/Amsterdam';

  it('tells the time on the darkroom’s wall', () => {
    expect(showInstant('2026-12-01T09:42:00Z', zone, '2026-12-01')).toBe('today 10:42');
    expect(showInstant('2026-11-30T09:42:00Z', zone, '2026-12-01')).toBe('yesterday 10:42');
    expect(showInstant('2026-11-27T23:30:00Z', zone, '2026-12-01')).toBe('28 Nov 00:30');
  });

  it('goes to the wall and back, in summer, in winter and west of Greenwich', () => {
    for (const instant of ['2026-12-01T09:42:00.000Z', '2026-07-01T21:05:00.000Z']) {
      for (const place of [zone, 'America/St_Johns', 'Pacific/Kiritimati']) {
        expect(fromWallClock(toWallClock(instant, place), place)).toBe(instant);
      }
    }
  });

  it('takes the darkroom’s zone, not the device’s, on the day the clocks change', () => {
    // 25 October 2026: summer time ends at 01:00 UTC in the European Union (Directive 2000/84/EC, published).
    expect(fromWallClock('2026-10-25T01:30', zone)).toBe('2026-10-24T23:30:00.000Z');
    expect(fromWallClock('2026-10-25T12:00', zone)).toBe('2026-10-25T11:00:00.000Z');
    expect(fromWallClock('', zone)).toBeNull();
  });
});
