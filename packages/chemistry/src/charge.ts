import { instantMs, type LocalDate } from './dates.js';
import type { ChemistryDocument } from './document.js';
import { exactRollsE4, filmFormat, type FilmClass, type FilmFormat, type Material } from './film.js';
import { ceil, fraction, plus, times, zero } from './fraction.js';
import { lastDay } from './keeping.js';
import type { BottleTotals } from './ledger.js';
import { capacityStanding } from './rated.js';
import { E4 } from './units.js';

/** So many pieces of one format and class, as they are told or stored. */
export interface LoadFilm {
  format: FilmFormat | 'sheet';
  count: number;
  filmClass: FilmClass;
  widthMm?: number | null;
  heightMm?: number | null;
}

/** What a load takes from a bottle, in 1/10,000 of a roll. factorE4 is null when the classes differ in theirs. */
export interface Charge {
  nominalE4: number;
  factorE4: number | null;
  countedE4: number;
}

export type StepFlag =
  | 'over_capacity'
  | 'past_date'
  | 'on_hold'
  | 'after_discard'
  | 'wrong_material'
  | 'volume_short'
  | 'incompatible';

/** How fast a class tires this bath, 10,000 = once. A film nobody is sure of counts as the worst. */
export function filmFactorE4(document: ChemistryDocument, filmClass: FilmClass): number {
  const held = document.filmFactors;
  if (filmClass === 'not-sure') return Math.max(E4, ...held.map((factor) => factor.factorE4));
  const matching = held.filter((factor) => factor.filmClass === filmClass);
  const own = matching.filter((factor) => factor.sheetInHand);
  const candidates = own.length > 0 ? own : matching;
  return candidates.length === 0 ? E4 : Math.max(...candidates.map((factor) => factor.factorE4));
}

/** The charge of a load to a bottle: the exact area by its factors, rounded up once. */
export function chargeFor(
  document: ChemistryDocument,
  films: readonly LoadFilm[],
  material: Material,
): Charge {
  const rows = films.map((film) => {
    const format = film.format === 'sheet' ? filmFormat('sheet', film.widthMm, film.heightMm) : film.format;
    return {
      area: exactRollsE4(format, film.count),
      factorE4: material === 'film' ? filmFactorE4(document, film.filmClass) : E4,
    };
  });
  const nominal = rows.reduce((sum, row) => plus(sum, row.area), zero);
  const counted = rows.reduce((sum, row) => plus(sum, times(row.area, fraction(row.factorE4, E4))), zero);
  const factors = new Set(rows.map((row) => row.factorE4));
  const [only = E4] = factors;
  return { nominalE4: ceil(nominal), factorE4: factors.size > 1 ? null : only, countedE4: ceil(counted) };
}

const isPaper = (material: Material): boolean => material !== 'film';

/** Whether a bottle labelled and rated so may take that material: film and paper never share a bottle. */
export function takesMaterial(
  document: ChemistryDocument,
  totals: BottleTotals,
  material: Material,
): boolean {
  if (totals.material !== null && isPaper(totals.material) !== isPaper(material)) return false;
  return document.materials.some((use) => isPaper(use.material) === isPaper(material));
}

/** What was wrong with the bottle as it stood before the load. A load that happened is stored all the same. */
export function flagsFor(
  document: ChemistryDocument,
  totalsBefore: BottleTotals | null,
  charge: { countedE4: number; takenUl?: number },
  ctx: { happenedAt: string; happenedOn: LocalDate; material: Material },
): StepFlag[] {
  if (!totalsBefore) return [];
  const standing = document.use === 're-used' ? capacityStanding(document, totalsBefore, ctx.material) : null;
  const last = lastDay(document, totalsBefore);
  const { discardedAt } = totalsBefore;
  const flags: [StepFlag, boolean][] = [
    ['over_capacity', standing !== null && charge.countedE4 > standing.leftE4],
    ['past_date', last !== null && ctx.happenedOn > last],
    ['on_hold', totalsBefore.hold !== null],
    ['after_discard', discardedAt !== null && instantMs(discardedAt) <= instantMs(ctx.happenedAt)],
    ['wrong_material', !takesMaterial(document, totalsBefore, ctx.material)],
    ['volume_short', (charge.takenUl ?? 0) > totalsBefore.volumeUl],
  ];
  return flags.filter(([, raised]) => raised).map(([flag]) => flag);
}
