import { type FilmClass, filmClasses } from '@wetside/chemistry';
import { deviceMs } from '../../shared/clock/web-clock.js';
import type { FilmLine, FormatName } from '../../shared/api/types.js';
import { formatWords } from '../../shared/formats/film-words.js';
import { MOST } from './most-rolls.js';

/** The count of a sitting is not the count of the next one. */
const COUNT_KEPT_MS = 12 * 3_600_000;

const plain: FilmLine = { format: '135-36', filmClass: 'conventional', count: 1 };
const keyOf = (membershipId: string): string => `wetside.load.${membershipId}`;

const isFormat = (value: unknown): value is FormatName => typeof value === 'string' && value in formatWords;
const isClass = (value: unknown): value is FilmClass => filmClasses.some((one) => one === value);
const isCount = (value: unknown): value is number =>
  typeof value === 'number' && Number.isInteger(value) && value >= 1 && value <= MOST;

const isSide = (value: unknown): value is number =>
  typeof value === 'number' && Number.isInteger(value) && value > 0;

/** Whether the count was told within the last 12 hours, by this device's clock. */
const isFresh = (atMs: unknown): boolean =>
  typeof atMs === 'number' && deviceMs() - atMs >= 0 && deviceMs() - atMs < COUNT_KEPT_MS;

/**
 * The last load of this person in this darkroom (a membership is both), on this device: its format and class always,
 * with the sides of a sheet of another size, its count for 12 hours.
 */
export function rememberedChoice(membershipId: string): FilmLine {
  try {
    const held = JSON.parse(localStorage.getItem(keyOf(membershipId)) ?? '{}') as Record<string, unknown>;
    return {
      format: isFormat(held.format) ? held.format : plain.format,
      filmClass: isClass(held.filmClass) ? held.filmClass : plain.filmClass,
      count: isCount(held.count) && isFresh(held.atMs) ? held.count : plain.count,
      ...(held.format === 'sheet' &&
        isSide(held.widthMm) &&
        isSide(held.heightMm) && { widthMm: held.widthMm, heightMm: held.heightMm }),
    };
  } catch {
    return plain;
  }
}

export function rememberChoice(membershipId: string, film: FilmLine): void {
  try {
    localStorage.setItem(keyOf(membershipId), JSON.stringify({ ...film, atMs: deviceMs() }));
  } catch {
    // A device that stores nothing starts from the plain choice next time.
  }
}
