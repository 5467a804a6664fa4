import type { AssessContext, Limit } from './assess-types.js';
import { showInstant, showLeft, spentSentence, volumeSentence } from './assess-words.js';
import { daysBetween, instantMs, showDate } from './dates.js';
import type { ChemistryDocument } from './document.js';
import type { Material } from './film.js';
import { floor, fraction, minus, one, times } from './fraction.js';
import { governingClock, lastDay, shareUsed } from './keeping.js';
import type { BottleTotals } from './ledger.js';
import { capacityFor, type CapacityStanding } from './rated.js';
import { showNeededVolume, showVolume } from './units.js';

const shareE4 = (part: number, whole: number): number =>
  whole > 0 ? floor(fraction(BigInt(part) * 10_000n, whole)) : 0;

/** The tally, and the last test where it leaves less. */
export function capacityLimits(
  document: ChemistryDocument,
  totals: BottleTotals,
  material: Material,
  standing: CapacityStanding,
): Limit[] {
  const figure = capacityFor(document, material, totals.ratedVolumeUl);
  const { ratedE4, tallyLeftE4, ceilingE4 } = standing;
  const base = { material, ratedE4, sourceKeys: figure ? [figure.source] : [] };
  const tally: Limit = {
    ...base,
    kind: 'capacity',
    leftE4: tallyLeftE4,
    closes: tallyLeftE4 === 0,
    shareLeftE4: shareE4(tallyLeftE4, ratedE4),
    text:
      tallyLeftE4 === 0
        ? spentSentence(standing, material)
        : `${showLeft(tallyLeftE4, material)} left of ${showLeft(ratedE4, material)}`,
  };
  if (ceilingE4 === null || ceilingE4 >= tallyLeftE4) return [tally];
  const test: Limit = {
    ...base,
    kind: 'test',
    leftE4: ceilingE4,
    closes: ceilingE4 === 0,
    shareLeftE4: shareE4(ceilingE4, ratedE4),
    text: `The last test leaves ${showLeft(ceilingE4, material)}`,
  };
  return [test, tally];
}

/** The date, when the keeping time is known. */
export function dateLimit(
  document: ChemistryDocument,
  totals: BottleTotals,
  ctx: AssessContext,
): Limit | null {
  const last = lastDay(document, totals);
  if (last === null) return null;
  const clock = governingClock(document, totals);
  const past = ctx.today > last;
  const left = clock ? minus(one, shareUsed(clock.reading, ctx.today)) : fraction(0);
  const day = showDate(last, ctx.today);
  return {
    kind: 'date',
    closes: past,
    shareLeftE4: past ? 0 : Math.max(0, floor(times(left, fraction(10_000)))),
    lastDay: last,
    daysLeft: daysBetween(ctx.today, last),
    text: past ? `Past its date since ${day}` : `Keeps to ${day}`,
    sourceKeys: clock ? [clock.reading.keeping.chosen.source] : [],
  };
}

/** Stock of a one-shot solution that one roll in the smallest tank takes, in µL; null = neither is known. */
function stockForOne(document: ChemistryDocument, tankUl: number | null): number | null {
  const least = document.oneShot?.leastStockPerRollUl ?? 0;
  const working = document.oneShot?.workingDilution;
  let inTank = tankUl ?? 0;
  if (working?.kind === 'plus') {
    const stock = working.parts.reduce((sum, part) => sum + part.parts, 0);
    inTank = Math.ceil((inTank * stock) / (stock + working.water));
  }
  return Math.max(least, inTank) || null;
}

/** One-shot: the rolls that the volume is good for, at one a tank. Null when that cannot be said. */
export function oneShotStanding(
  document: ChemistryDocument,
  totals: BottleTotals,
  tankUl: number | null,
): { leftE4: number; ratedE4: number; neededUl: number } | null {
  const neededUl = stockForOne(document, tankUl);
  if (neededUl === null) return null;
  const rolls = (ul: number): number => Math.floor(ul / neededUl) * 10_000;
  const ratedE4 = rolls(Math.max(totals.ratedVolumeUl, totals.volumeUl));
  return { leftE4: rolls(totals.volumeUl), ratedE4, neededUl };
}

/** The volume, when it is the limit of a one-shot stock or too little for the smallest tank. */
export function volumeLimit(
  document: ChemistryDocument,
  totals: BottleTotals,
  ctx: AssessContext,
): Limit | null {
  const oneShot = document.use === 'one-shot' ? oneShotStanding(document, totals, ctx.smallestTankUl) : null;
  const neededUl = oneShot?.neededUl ?? ctx.smallestTankUl ?? 1;
  const short = totals.volumeUl < neededUl;
  if (!short && !oneShot) return null;
  const limit: Limit = {
    kind: 'volume',
    closes: short,
    shareLeftE4: short ? 0 : oneShot && shareE4(oneShot.leftE4, oneShot.ratedE4),
    volumeUl: totals.volumeUl,
    neededUl,
    text: short
      ? volumeSentence(totals.volumeUl, neededUl)
      : `${showVolume(totals.volumeUl)} left, ${showNeededVolume(neededUl)} a roll`,
    sourceKeys: oneShot && document.oneShot ? [document.oneShot.source] : [],
  };
  return oneShot ? { ...limit, leftE4: oneShot.leftE4, ratedE4: oneShot.ratedE4 } : limit;
}

/** A person's hold, and the hour before which a fresh mix is not ready. */
export function gateLimits(document: ChemistryDocument, totals: BottleTotals, ctx: AssessContext): Limit[] {
  const limits: Limit[] = [];
  const { hold, readyAt } = totals;
  const gate = { closes: true, shareLeftE4: 0 };
  if (hold) {
    limits.push({ ...gate, kind: 'hold', text: `On hold: ${hold.reason}`, sourceKeys: [], at: hold.since });
  }
  if (readyAt !== null && instantMs(ctx.now) < instantMs(readyAt)) {
    const why = document.readyAfter ? `: ${document.readyAfter.why}` : '';
    const text = `Ready from ${showInstant(readyAt, ctx.zone, ctx.today)}${why}`;
    const sourceKeys = document.readyAfter ? [document.readyAfter.source] : [];
    limits.push({ ...gate, kind: 'ready', text, sourceKeys, at: readyAt });
  }
  return limits;
}
