import { roundUsedUp } from '@wetside/chemistry';
import type { FilmLine } from '../../shared/api/types.js';
import { countOf, listOf, rollsLeft } from '../../shared/formats/amounts.js';
import { isMeasured, pieces } from '../../shared/formats/film-words.js';
import { isEssential } from '../bottles/line-order.js';
import type { Standing } from '../bottles/standing.js';
import type { BathPicks } from './bath-picks.js';
import { isOpen, leftAfter, oneOfEachRole, passedOver } from './one-a-role.js';

export interface Choice {
  /** The baths that the sheet was opened for. */
  baths: readonly Standing[];
  picks: BathPicks;
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
  /** Closed and in the load all the same: the film has been through them already. */
  reported: Standing[];
  /** Closed, and without it the film is lost: nothing is put through until it is left out knowingly. */
  blocking: Standing[];
  over: Over[];
  /** 'FX-01 has 1 roll left: this load goes through FX-02.' */
  instead: string[];
  /** 'Leaves 11 rolls in FX-01.' */
  leaves: string | null;
  /** Null: there is nothing to put the load through. */
  button: string | null;
  isReport: boolean;
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

/** Said when a load passes over the bottle whose turn it is: what is recorded must be what is poured. */
function insteadWords(through: readonly Standing[], baths: readonly Standing[], film: FilmLine): string[] {
  const open = baths.filter(isOpen);
  return through.flatMap((bath) => {
    const before = passedOver(bath, open, film);
    const left = before && leftAfter(before, film);
    if (!before || !left) return [];
    return `${before.bottle.code} has ${rollsLeft(left.leftE4)} left: this load goes through ${bath.bottle.code}.`;
  });
}

export function planLoad({ baths, picks, film }: Choice): LoadPlan {
  const { chosen, leftOut, reported } = picks;
  const out = ({ bottle }: Standing): boolean => leftOut.has(bottle.id);
  const able = baths.filter((bath) => isOpen(bath) || reported.has(bath.bottle.id));
  const inTurn = oneOfEachRole(able, film, chosen);
  const through = baths.filter((bath) => inTurn.includes(bath) && !out(bath));
  const closed = baths.filter((bath) => !isOpen(bath) && !through.includes(bath));
  const blocking = closed.filter(
    (bath) => isEssential(bath.bottle.role) && !out(bath) && !covered(bath, through),
  );
  const isReport = through.some((bath) => reported.has(bath.bottle.id));
  const shut = through.filter((bath) => !isOpen(bath));
  const over = through.filter(isOpen).flatMap((bath) => overOf(bath, film));
  const leaves = leavesWords(through.filter(isOpen), film);
  const instead = insteadWords(through.filter(isOpen), baths, film);
  const ready = through.length > 0 && blocking.length === 0 && isMeasured(film);
  const button = ready ? buttonWords({ through, over, isReport }, film) : null;
  return { through, closed, reported: shut, blocking, over, instead, leaves, button, isReport };
}

/** 'FX-01: Past its date since 28 Feb.' */
export const closedWords = ({ bottle, sentence }: Standing): string => `${bottle.code}: ${sentence}.`;

/** 'SB-02 is left out. Spent: 12 of 12 rolls used.' */
export const leftOutWords = ({ bottle, sentence }: Standing): string =>
  `${bottle.code} is left out. ${sentence}.`;

/** 'FX-01 and SB-02': the codes of some bottles. */
export const codesOf = (standings: readonly Standing[]): string =>
  listOf(standings.map(({ bottle }) => bottle.code));
