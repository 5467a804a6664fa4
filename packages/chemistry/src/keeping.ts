import type { Container, ContainerState } from './container.js';
import { addDays, addMonths, daysBetween, type LocalDate } from './dates.js';
import type { ChemistryDocument, Duration, KeepingFigure } from './document.js';
import { floor, type Fraction, fraction, fromText, minus, one, plus, times, toText } from './fraction.js';
import type { BottleTotals } from './ledger.js';

export type KeepingClock = 'mixing' | 'first-use';

/** The figure that counts in a state, and the others that the document holds beside it. */
export interface Keeping {
  chosen: KeepingFigure;
  others: KeepingFigure[];
  /** The document has no figure for the state itself: that of a state that keeps longer stands in, as an upper bound. */
  standsIn: boolean;
}

/** Each state after the ones that keep at least as long. */
const keepsLonger: Record<ContainerState, ContainerState[]> = {
  full: [],
  'floating-lid': ['full'],
  'part-full': ['floating-lid', 'full'],
  'open-tray': ['part-full', 'floating-lid', 'full'],
};

/** The same date so many months on (clamped to the month's end), or so many days or weeks on. */
export function addDuration(date: LocalDate, keeps: Duration): LocalDate {
  if (keeps.unit === 'months') return addMonths(date, keeps.count);
  return addDays(date, keeps.unit === 'weeks' ? keeps.count * 7 : keeps.count);
}

function fits(figure: KeepingFigure, container: Container): boolean {
  const { minSizeUl = 0, maxSizeUl = Infinity, materials } = figure.container ?? {};
  if (container.sizeUl < minSizeUl || container.sizeUl > maxSizeUl) return false;
  // A container of unknown make might be any of them; the shortest figure is chosen later.
  return !materials || !container.material || materials.includes(container.material);
}

/**
 * The keeping figure by the rule of choice: the sheet in hand, else the shortest that the document holds.
 * Null when the keeping time is not known. `since` settles which of 30 days and a month is shorter.
 */
export function keepingFor(
  document: ChemistryDocument,
  state: ContainerState,
  container: Container,
  clock: KeepingClock = 'mixing',
  since: LocalDate = '2001-01-01',
): Keeping | null {
  for (const tried of [state, ...keepsLonger[state]]) {
    const held = document.keeping.filter(
      (figure) => figure.state === tried && figure.from === clock && fits(figure, container),
    );
    const days = (figure: KeepingFigure): number => daysBetween(since, addDuration(since, figure.keeps));
    const byChoice = [...held].sort(
      (a, b) => Number(b.sheetInHand ?? false) - Number(a.sheetInHand ?? false) || days(a) - days(b),
    );
    const [chosen, ...others] = byChoice;
    if (chosen) return { chosen, others, standsIn: tried !== state };
  }
  return null;
}

/** A clock at its present state: since when, how many days that state gives, and the share used before. */
export interface ClockReading {
  keeping: Keeping;
  since: LocalDate;
  keepsDays: number;
  usedBefore: Fraction;
}

/** Null when the clock does not run: no figure, or not used yet. */
export function readClock(
  document: ChemistryDocument,
  totals: BottleTotals,
  clock: KeepingClock,
): ClockReading | null {
  const { firstUsedOn, stateSince } = totals;
  if (clock === 'first-use' && firstUsedOn === null) return null;
  const since =
    clock === 'first-use' && firstUsedOn !== null && firstUsedOn > stateSince ? firstUsedOn : stateSince;
  const keeping = keepingFor(document, totals.containerState, totals.container, clock, since);
  if (!keeping) return null;
  const keepsDays = daysBetween(since, addDuration(since, keeping.chosen.keeps));
  const usedBefore = fromText(clock === 'mixing' ? totals.lifeUsed : totals.useLifeUsed);
  return { keeping, since, keepsDays, usedBefore };
}

/** The exact share of its life that a clock has used by that day. */
export function shareUsed(reading: ClockReading, day: LocalDate): Fraction {
  const days = Math.max(0, daysBetween(reading.since, day));
  if (reading.keepsDays === 0) return days > 0 ? plus(reading.usedBefore, one) : reading.usedBefore;
  return plus(reading.usedBefore, fraction(days, reading.keepsDays));
}

const lastDayOf = (reading: ClockReading): LocalDate =>
  addDays(reading.since, floor(times(minus(one, reading.usedBefore), fraction(reading.keepsDays))));

/** The clock that ends first, and its last day. */
export function governingClock(
  document: ChemistryDocument,
  totals: BottleTotals,
): { reading: ClockReading; lastDay: LocalDate } | null {
  const running = (['mixing', 'first-use'] as const)
    .map((clock) => readClock(document, totals, clock))
    .filter((reading) => reading !== null)
    .map((reading) => ({ reading, lastDay: lastDayOf(reading) }));
  return running.sort((a, b) => (a.lastDay < b.lastDay ? -1 : 1))[0] ?? null;
}

/** The last local date through the whole of which the bottle keeps. Null when the keeping time is not known. */
export function lastDay(document: ChemistryDocument, totals: BottleTotals): LocalDate | null {
  return totals.endedOn ?? governingClock(document, totals)?.lastDay ?? null;
}

/** Closes the present state on that day: both clocks carry the life used so far, and a life that is over stays over. */
export function settle(document: ChemistryDocument, totals: BottleTotals, day: LocalDate): BottleTotals {
  const [mixing, use] = [readClock(document, totals, 'mixing'), readClock(document, totals, 'first-use')];
  const last = lastDay(document, totals);
  return {
    ...totals,
    lifeUsed: mixing ? toText(shareUsed(mixing, day)) : totals.lifeUsed,
    useLifeUsed: use ? toText(shareUsed(use, day)) : totals.useLifeUsed,
    stateSince: day > totals.stateSince ? day : totals.stateSince,
    endedOn: last !== null && day > last ? last : totals.endedOn,
  };
}

/** The bottle in another state or container from that day. Where no figure changes, neither does the date. */
export function enterState(
  document: ChemistryDocument,
  totals: BottleTotals,
  next: { container: Container; state: ContainerState; on: LocalDate },
): BottleTotals {
  const changed = { container: next.container, containerState: next.state };
  const same = (['mixing', 'first-use'] as const).every((clock) => {
    const before = keepingFor(document, totals.containerState, totals.container, clock, totals.stateSince);
    const after = keepingFor(document, next.state, next.container, clock, totals.stateSince);
    return before?.chosen === after?.chosen;
  });
  if (same) return { ...totals, ...changed };
  return { ...settle(document, totals, next.on), ...changed };
}
