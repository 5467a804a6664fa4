import { filmFormat, rollsE4, type FilmClass } from '@wetside/chemistry';
import type { FilmLine, FormatName } from '../api/types.js';
import { countOf, rollsUsed } from './amounts.js';

export const formatWords: Record<FormatName, string> = {
  '135-36': '135',
  '120': '120',
  '4x5': '4×5',
  '135-24': '135-24',
  '220': '220',
  '5x7': '5×7',
  '8x10': '8×10',
  '11x14': '11×14',
  sheet: 'Other sheet',
};

export const classWords: Record<FilmClass, string> = {
  conventional: 'Conventional',
  'tabular-grain': 'Tabular',
  ortho: 'Ortho',
  lith: 'Lith',
  chromogenic: 'Chromogenic black-and-white',
  'colour-negative': 'Colour negative',
  'colour-reversal': 'Colour reversal',
  'rem-jet': 'With rem-jet',
  infrared: 'Infrared',
  'not-sure': 'Not sure',
};

const rollFormats: readonly FormatName[] = ['135-36', '135-24', '120', '220'];
const isRoll = (format: FormatName): boolean => rollFormats.includes(format);

/** 'roll' or 'sheet', as many as there are. */
export const pieces = (format: FormatName, count: number): string =>
  countOf(count, isRoll(format) ? 'roll' : 'sheet');

/** '2 rolls of 135', '6 sheets of 4×5', '3 sheets of 100 × 150 mm'. */
export function filmPhrase(film: FilmLine): string {
  const size =
    film.format === 'sheet'
      ? `${film.widthMm ?? '?'} × ${film.heightMm ?? '?'} mm`
      : formatWords[film.format];
  return `${pieces(film.format, film.count)} of ${size}`;
}

/** A sheet of another size counts only once both its sides are known. */
export const isMeasured = (film: FilmLine): boolean => isSized(film) && film.count >= 1;

/** Whether its area is known: a sheet of another size has both its sides. */
export const isSized = (film: FilmLine): boolean =>
  film.format !== 'sheet' || Boolean(film.widthMm && film.heightMm);

/** '6 sheets = 1.5 rolls', or nothing where the pieces are rolls of the plain size. */
export function equivalence(film: FilmLine): string | null {
  if (film.format === '135-36' || film.format === '120') return null;
  if (!isMeasured(film)) return null;
  const used = rollsE4(filmFormat(film.format, film.widthMm, film.heightMm), film.count);
  return `${pieces(film.format, film.count)} = ${rollsUsed(used)}`;
}
