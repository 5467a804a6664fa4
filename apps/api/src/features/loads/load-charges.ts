import { chargeFor, type LoadFilm, type Material } from '@wetside/chemistry';
import { problem } from '../../platform/errors/problem.js';
import type { LockedBottle } from '../bottles/bottle-row.js';
import type { FilmDto } from './load.dto.js';

export interface BottleCharge {
  nominalE4: number;
  factorE4: number | null;
  countedE4: number;
  takenUl: number;
}

const filmOf = ({ format, widthMm, heightMm, count, filmClass }: FilmDto): LoadFilm => ({
  format,
  count,
  filmClass,
  widthMm: widthMm ?? null,
  heightMm: heightMm ?? null,
});

/** @throws Problem 'not-a-format' for a sheet without its size, or a size on a named format */
export function checkedFilm(film: readonly FilmDto[]): LoadFilm[] {
  for (const one of film) {
    const sized = one.widthMm !== undefined && one.heightMm !== undefined;
    const bare = one.widthMm === undefined && one.heightMm === undefined;
    if (one.format === 'sheet' ? !sized : !bare) throw problem('not-a-format');
  }
  return film.map(filmOf);
}

/** What the load takes of a bottle. A re-used bath loses film's carry-over and no more: its volume stands. */
export function chargeOf(bottle: LockedBottle, film: readonly LoadFilm[], material: Material): BottleCharge {
  return { ...chargeFor(bottle.document, film, material), takenUl: 0 };
}
