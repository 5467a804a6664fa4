import { type FilmClass, filmClasses } from '@wetside/chemistry';
import type { FormatName } from '../../shared/api/types.js';
import { formatWords } from '../../shared/formats/film-words.js';

export interface RememberedChoice {
  format: FormatName;
  filmClass: FilmClass;
}

const plain: RememberedChoice = { format: '135-36', filmClass: 'conventional' };
const keyOf = (membershipId: string): string => `wetside.load.${membershipId}`;

const isFormat = (value: unknown): value is FormatName => typeof value === 'string' && value in formatWords;
const isClass = (value: unknown): value is FilmClass => filmClasses.some((one) => one === value);

/** Format and class of the last load of this person in this darkroom (a membership is both), on this device. */
export function rememberedChoice(membershipId: string): RememberedChoice {
  try {
    const held = JSON.parse(localStorage.getItem(keyOf(membershipId)) ?? '{}') as Record<string, unknown>;
    return {
      format: isFormat(held.format) ? held.format : plain.format,
      filmClass: isClass(held.filmClass) ? held.filmClass : plain.filmClass,
    };
  } catch {
    return plain;
  }
}

export function rememberChoice(membershipId: string, choice: RememberedChoice): void {
  try {
    localStorage.setItem(keyOf(membershipId), JSON.stringify(choice));
  } catch {
    // A device that stores nothing starts from the plain choice next time.
  }
}
