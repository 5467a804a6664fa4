import { chargeFor, roundLeftDown, roundUsedUp } from '@wetside/chemistry';
import type { FilmLine } from '../../shared/api/types.js';
import { countOf, listOf, rollsLeft } from '../../shared/formats/amounts.js';
import { isMeasured, pieces } from '../../shared/formats/film-words.js';
import { isEssential } from '../bottles/line-order.js';
import { stateWord } from '../../shared/ui/state-mark.js';
import type { Standing } from '../bottles/standing.js';

export interface Choice {
  /** The baths that the sheet was opened for. */
  baths: readonly Standing[];
  leftOut: ReadonlySet<string>;
  /** Closed bottles that the film has been through already. */
  reported: ReadonlySet<string>;
  film: FilmLine;
}

interface Over {
  code: string;
  words: string;
  overE4: number;
}

/** What a confirm would do, in words, before it is done. */
export interface LoadPlan {
  through: Standing[];
  /** Closed and not in the load. */
  closed: Standing[];
  /** Closed, and without it the film is lost: nothing is put through until it is left out knowingly. */
  blocking: Standing[];
  over: Over[];
  /** 'Leaves 11 rolls in FX-01.' */
  leaves: string | null;
  /** Null: there is nothing to put the load through. */
  button: string | null;
  isReport: boolean;
}

const usable = ({ assessment }: Standing): boolean => !assessment.closed;

function leftAfter({ assessment, document }: Standing, film: FilmLine) {
  const leftE4 = assessment.leftE4.film;
  if (!isMeasured(film)) return null;
  const { countedE4 } = chargeFor(document, [film], 'film');
  return typeof leftE4 === 'number' ? { leftE4, countedE4, afterE4: leftE4 - countedE4 } : null;
}

function overOf(standing: Standing, film: FilmLine): Over[] {
  const after = leftAfter(standing, film);
  if (!after || after.afterE4 >= 0) return [];
  const { code } = standing.bottle;
  const words = `${code} has ${rollsLeft(after.leftE4)} left, this is ${roundUsedUp(after.countedE4)}: ${roundUsedUp(-after.afterE4)} over`;
  return [{ code, words, overE4: -after.afterE4 }];
}

function leavesWords(through: readonly Standing[], film: FilmLine): string | null {
  const known = through.flatMap((standing) => {
    const after = leftAfter(standing, film);
    return after && after.afterE4 >= 0 ? [{ code: standing.bottle.code, afterE4: after.afterE4 }] : [];
  });
  const [tightest] = known.sort((a, b) => a.afterE4 - b.afterE4);
  return tightest ? `Leaves ${rollsLeft(tightest.afterE4)} in ${tightest.code}.` : null;
}

function buttonWords(plan: Pick<LoadPlan, 'through' | 'over' | 'isReport'>, film: FilmLine): string {
  const { through, over, isReport } = plan;
  const [only] = through;
  const scope = through.length === 1 && only ? only.bottle.code : countOf(through.length, 'bottle');
  if (isReport) return `Report ${pieces(film.format, film.count)} through ${scope}`;
  if (over.length === 0) return `Put ${pieces(film.format, film.count)} through ${scope}`;
  const worst = Math.max(...over.map((one) => one.overE4));
  return `Put ${film.count} through, ${roundUsedUp(worst)} over`;
}

/** The same role stands there in another bottle that can be used. */
const covered = (closed: Standing, through: readonly Standing[]): boolean =>
  through.some(({ bottle }) => bottle.role === closed.bottle.role);

export function planLoad({ baths, leftOut, reported, film }: Choice): LoadPlan {
  const out = ({ bottle }: Standing): boolean => leftOut.has(bottle.id);
  const through = baths.filter((bath) => !out(bath) && (usable(bath) || reported.has(bath.bottle.id)));
  const closed = baths.filter((bath) => !usable(bath) && !reported.has(bath.bottle.id));
  const blocking = closed.filter(
    (bath) => isEssential(bath.bottle.role) && !out(bath) && !covered(bath, through),
  );
  const isReport = through.some((bath) => reported.has(bath.bottle.id));
  const over = through.filter(usable).flatMap((bath) => overOf(bath, film));
  const leaves = leavesWords(through.filter(usable), film);
  const ready = through.length > 0 && blocking.length === 0 && isMeasured(film);
  const button = ready ? buttonWords({ through, over, isReport }, film) : null;
  return { through, closed, blocking, over, leaves, button, isReport };
}

/** 'FX-01 cannot be used: Past its date since 28 Feb.' */
export const closedWords = ({ bottle, sentence }: Standing): string => `${bottle.code}: ${sentence}.`;

/** 'FX-01 and SB-02': the codes of some bottles. */
export const codesOf = (standings: readonly Standing[]): string =>
  listOf(standings.map(({ bottle }) => bottle.code));

/** '13 rolls more. FX-01 gives out first.', or 'Not today. FX-01 is past its date.' */
export function verdictWords(baths: readonly Standing[]): string | null {
  const open = baths.filter(usable);
  const stops = baths.find((bath) => !usable(bath) && isEssential(bath.bottle.role) && !covered(bath, open));
  if (stops) return `Not today. ${stops.bottle.code} is ${stateWord(stops.assessment.verdict)}.`;
  const needed = open.filter((bath) => !bath.document.cheapToRenew);
  const known = (needed.length > 0 ? needed : open).flatMap(({ assessment, bottle }) =>
    typeof assessment.leftE4.film === 'number' ? [{ code: bottle.code, leftE4: assessment.leftE4.film }] : [],
  );
  const [least] = known.sort((a, b) => a.leftE4 - b.leftE4);
  if (!least) return null;
  return `${countOf(roundLeftDown(least.leftE4), 'roll')} more. ${least.code} gives out first.`;
}
