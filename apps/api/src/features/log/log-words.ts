import { roleLetters, roles, type FilmClass } from '@wetside/chemistry';

const plural = (count: number, one: string, many = `${one}s`): string =>
  `${count} ${count === 1 ? one : many}`;

/** '2 rolls of 135', '6 sheets of 4×5', '3 sheets of 102 × 127 mm'. */
export function filmWords(film: {
  format: string;
  count: number;
  widthMm: number | null;
  heightMm: number | null;
}): string {
  const { format, count, widthMm, heightMm } = film;
  if (format === 'sheet') return `${plural(count, 'sheet')} of ${widthMm ?? '?'} × ${heightMm ?? '?'} mm`;
  if (format === '135-36') return `${plural(count, 'roll')} of 135`;
  if (format === '135-24') return `${plural(count, 'roll')} of 135, 24 frames`;
  if (format === '120' || format === '220') return `${plural(count, 'roll')} of ${format}`;
  return `${plural(count, 'sheet')} of ${format.replace('x', '×')}`;
}

const classWords: Record<FilmClass, string> = {
  conventional: 'conventional',
  'tabular-grain': 'tabular-grain',
  ortho: 'orthochromatic',
  lith: 'lith',
  chromogenic: 'chromogenic',
  'colour-negative': 'colour negative',
  'colour-reversal': 'colour reversal',
  'rem-jet': 'with rem-jet',
  infrared: 'infrared',
  'not-sure': 'class not sure',
};

export const classWord = (filmClass: FilmClass): string => classWords[filmClass];

/** '1 L', '600 mL', '3.8 L'. */
export function volumeWords(ul: number): string {
  return ul >= 1_000_000
    ? `${Number((ul / 1_000_000).toFixed(2))} L`
    : `${Number((ul / 1000).toFixed(1))} mL`;
}

const letters = roles.map((role) => roleLetters[role]);
const placeOf = (code: string): number => letters.indexOf(code.slice(0, 2));

/** Bottles as a film meets them: developer first, wetting agent last. */
export const inTheOrderOfALine = (a: string, b: string): number =>
  placeOf(a) - placeOf(b) || a.localeCompare(b);
