import { ceil, fraction, type Fraction, plus, times, zero } from './fraction.js';
import { ROLL_MM2_E2 } from './units.js';

export const namedFormats = ['135-36', '135-24', '120', '220', '4x5', '5x7', '8x10', '11x14'] as const;
export type NamedFormat = (typeof namedFormats)[number];
/** A sheet or print of any size, in millimetres (to a tenth). */
export interface SheetSize {
  widthMm: number;
  heightMm: number;
}
export type FilmFormat = NamedFormat | SheetSize;

export const filmClasses = [
  'conventional',
  'tabular-grain',
  'ortho',
  'lith',
  'chromogenic',
  'colour-negative',
  'colour-reversal',
  'rem-jet',
  'infrared',
  'not-sure',
] as const;
export type FilmClass = (typeof filmClasses)[number];

export const materials = ['film', 'rc-paper', 'fb-paper'] as const;
export type Material = (typeof materials)[number];

/** The word a sheet of another size is stored under, with its width and height beside it. */
export const sheetFormat = 'sheet';

/**
 * Ten-thousandths of a roll for one piece. 135-36, 120, 220, 4×5 and 8×10: Tyrrell, Analogue Photography FAQ,
 * 'Fixer capacity' (second-hand); 5×7 and 11×14 by ratio of area; 135-24 from memory.
 */
const tradeTableE4: Record<NamedFormat, number> = {
  '135-36': 10_000,
  '135-24': 6_900,
  '120': 10_000,
  '220': 20_000,
  '4x5': 2_500,
  '5x7': 4_375,
  '8x10': 10_000,
  '11x14': 19_250,
};

function tenthsOfMm(mm: number): bigint {
  const tenths = Math.round(mm * 10);
  if (!(tenths > 0) || Math.abs(tenths - mm * 10) > 1e-6) {
    throw new RangeError('a sheet is measured in millimetres above zero, to a tenth');
  }
  return BigInt(tenths);
}

/** Exact ten-thousandths of a roll. Throws RangeError for a size or a count that cannot be. */
export function exactRollsE4(format: FilmFormat, count: number): Fraction {
  if (!Number.isInteger(count) || count < 0) throw new RangeError('a count is a whole number');
  if (typeof format === 'string') return fraction(BigInt(tradeTableE4[format]) * BigInt(count));
  const areaE2 = tenthsOfMm(format.widthMm) * tenthsOfMm(format.heightMm);
  return times(fraction(areaE2 * 10_000n, ROLL_MM2_E2), fraction(count));
}

/** The area of so many pieces in ten-thousandths of a roll (or of an 8×10 print), rounded up once. */
export const rollsE4 = (format: FilmFormat, count: number): number => ceil(exactRollsE4(format, count));

/** The format that a stored text and size stand for. Throws RangeError for a name nobody knows. */
export function filmFormat(text: string, widthMm?: number | null, heightMm?: number | null): FilmFormat {
  const named = namedFormats.find((name) => name === text);
  if (named) return named;
  if (text === sheetFormat && widthMm && heightMm) return { widthMm, heightMm };
  throw new RangeError(`not a film format: ${text}`);
}

/** The exact sum of several kinds of film. */
export const sumRolls = (films: readonly { format: FilmFormat; count: number }[]): Fraction =>
  films.reduce((sum, film) => plus(sum, exactRollsE4(film.format, film.count)), zero);
