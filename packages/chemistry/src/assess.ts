import { capacityLimits, dateLimit, gateLimits, oneShotStanding, volumeLimit } from './assess-limits.js';
import type { AssessContext, Assessment, Condition, Limit, LimitKind, Verdict } from './assess-types.js';
import { about, replenishedSentence, showLeft, showUsed, spentSentence } from './assess-words.js';
import { addDays, instantMs, showDate, startOfDay } from './dates.js';
import type { ChemistryDocument } from './document.js';
import type { Material } from './film.js';
import { scaleDown, scaleUp } from './fraction.js';
import { governingClock } from './keeping.js';
import type { BottleTotals } from './ledger.js';
import { capacityStanding, type CapacityStanding, materialEntries, usedAsE4 } from './rated.js';

type Standing = Pick<CapacityStanding, 'ratedE4' | 'usedE4' | 'tallyLeftE4' | 'leftE4' | 'overE4'>;

/** What is left of one material by the chemistry's way of use; null where no number of rolls can be said. */
function standingOf(
  document: ChemistryDocument,
  totals: BottleTotals,
  material: Material,
  ctx: AssessContext,
): Standing | null {
  if (document.use === 'replenished') return null;
  if (document.use === 're-used') return capacityStanding(document, totals, material);
  const stock = oneShotStanding(document, totals, ctx.smallestTankUl);
  if (!stock) return null;
  const usedE4 = Math.max(0, stock.ratedE4 - stock.leftE4);
  return { ...stock, usedE4, tallyLeftE4: stock.leftE4, overE4: 0 };
}

function mainMaterial(
  document: ChemistryDocument,
  totals: BottleTotals,
  asked: Material | undefined,
): Material | null {
  const [firstUsed] = materialEntries(totals.usedE4);
  return asked ?? totals.material ?? firstUsed?.[0] ?? document.materials[0]?.material ?? null;
}

const closingOrder: LimitKind[] = ['date', 'capacity', 'test', 'hold', 'volume', 'ready'];

/**
 * Tightest first. A share of capacity left against a share of life left says which ends first if use goes on
 * at the rate that the bottle has seen since it was mixed.
 */
function byTightness(a: Limit, b: Limit): number {
  if (a.closes !== b.closes) return a.closes ? -1 : 1;
  if (a.closes) return closingOrder.indexOf(a.kind) - closingOrder.indexOf(b.kind);
  return (a.shareLeftE4 ?? Infinity) - (b.shareLeftE4 ?? Infinity);
}

/** At or under this much left a bottle is low: 20 % or 3 rolls, but never above half of what it is rated. */
function lowFromE4(ratedE4: number, ctx: AssessContext): number {
  const { lowShareE4, lowRollsE4 } = ctx.thresholds;
  const share = scaleDown(ratedE4, lowShareE4, 10_000);
  return Math.min(Math.max(share, lowRollsE4), Math.floor(ratedE4 / 2));
}

/** So many days before the last one it is near; 0 = never, as for what keeps under four days. */
function nearDays(document: ChemistryDocument, totals: BottleTotals, ctx: AssessContext): number {
  const clock = governingClock(document, totals);
  if (!clock) return 0;
  const share = scaleDown(clock.reading.keepsDays, ctx.thresholds.nearShareE4, 10_000);
  return Math.min(ctx.thresholds.nearDaysMax, share);
}

function conditionsOf(
  totals: BottleTotals,
  ctx: AssessContext,
  facts: { standing: Standing | null; date: Limit | null; near: number },
): Condition[] {
  if (totals.discardedAt !== null) return [];
  const { standing, date, near } = facts;
  const daysLeft = date?.daysLeft ?? null;
  const left = standing?.leftE4 ?? null;
  const found: [Condition, boolean][] = [
    ['past-date', daysLeft !== null && daysLeft < 0],
    ['spent', left === 0],
    ['on-hold', totals.hold !== null],
    ['low', standing !== null && left !== null && left > 0 && left <= lowFromE4(standing.ratedE4, ctx)],
    ['near', near > 0 && daysLeft !== null && daysLeft >= 0 && daysLeft <= near],
  ];
  return found.filter(([, is]) => is).map(([condition]) => condition);
}

function verdictOf(
  totals: BottleTotals,
  conditions: Condition[],
  limits: Limit[],
  oneShot: boolean,
): Verdict {
  const closedBy = (kind: LimitKind): boolean => limits.some((limit) => limit.kind === kind && limit.closes);
  const is = (condition: Condition): boolean => conditions.includes(condition);
  if (totals.discardedAt !== null) return 'discarded';
  if (is('past-date')) return 'past-date';
  if (is('spent') && !oneShot) return 'spent';
  if (is('on-hold')) return 'on-hold';
  if (closedBy('volume')) return 'volume-short';
  if (closedBy('ready')) return 'not-ready';
  if (is('low')) return 'low';
  return is('near') ? 'near-date' : 'open';
}

interface Told {
  verdict: Verdict;
  material: Material | null;
  standing: Standing | null;
  limits: Limit[];
  owedUl: number | null;
}

function openSentence(
  document: ChemistryDocument,
  totals: BottleTotals,
  told: Told,
  ctx: AssessContext,
): string {
  const last = told.limits.find((limit) => limit.kind === 'date')?.lastDay;
  const to = last ? `, to ${showDate(last, ctx.today)}` : ', keeping time not known';
  const { material, standing, owedUl } = told;
  if (owedUl !== null) return replenishedSentence(owedUl, totals.replenishedUl, totals.ratedVolumeUl) + to;
  if (standing && material) return about(totals.about, `${showLeft(standing.leftE4, material)} left${to}`);
  const used = material
    ? `${showUsed(usedAsE4(document, totals, material), material)} so far`
    : 'Not used yet';
  const age = last ? `Age governs: ${showDate(last, ctx.today)}` : 'Keeping time not known';
  return `Capacity not known. ${used.charAt(0).toUpperCase()}${used.slice(1)}. ${age}`;
}

function sentenceOf(
  document: ChemistryDocument,
  totals: BottleTotals,
  told: Told,
  ctx: AssessContext,
): string {
  const text = (kind: LimitKind): string => told.limits.find((limit) => limit.kind === kind)?.text ?? '';
  const { material, standing } = told;
  const spent = standing && material && standing.leftE4 === 0 ? spentSentence(standing, material) : '';
  switch (told.verdict) {
    case 'discarded':
      return 'Discarded';
    case 'past-date':
      return spent && document.use === 're-used' ? `${text('date')}. ${spent}` : text('date');
    case 'spent':
      return spent;
    case 'on-hold':
      return text('hold');
    case 'volume-short':
      return text('volume');
    case 'not-ready':
      return text('ready');
    case 'low':
    case 'near-date':
    case 'open':
      return openSentence(document, totals, told, ctx);
  }
}

function nextLook(totals: BottleTotals, ctx: AssessContext, date: Limit | null, near: number): string | null {
  if (totals.discardedAt !== null) return null;
  const moments: string[] = totals.readyAt === null ? [] : [totals.readyAt];
  if (date?.lastDay) {
    moments.push(startOfDay(addDays(date.lastDay, 1), ctx.zone));
    if (near > 0) moments.push(startOfDay(addDays(date.lastDay, -near), ctx.zone));
  }
  const ahead = moments.filter((moment) => instantMs(moment) > instantMs(ctx.now));
  return ahead.sort((a, b) => instantMs(a) - instantMs(b))[0] ?? null;
}

function owed(document: ChemistryDocument, totals: BottleTotals, material: Material | null): number | null {
  if (document.use !== 'replenished' || !material) return null;
  const due = scaleUp(usedAsE4(document, totals, material), document.replenishment?.ulPerRoll ?? 0, 10_000);
  return Math.max(0, due - totals.replenishedUl);
}

function perMaterial(document: ChemistryDocument, totals: BottleTotals, ctx: AssessContext) {
  const result: Pick<Assessment, 'leftE4' | 'overE4' | 'ratedE4'> = { leftE4: {}, overE4: {}, ratedE4: {} };
  const known = [
    ...document.materials.map((use) => use.material),
    ...materialEntries(totals.usedE4).map(([m]) => m),
  ];
  for (const material of new Set(known)) {
    const standing = standingOf(document, totals, material, ctx);
    result.leftE4[material] = standing?.leftE4 ?? null;
    result.ratedE4[material] = standing?.ratedE4 ?? null;
    if (standing && standing.overE4 > 0) result.overE4[material] = standing.overE4;
  }
  return result;
}

/**
 * How a bottle stands: the one place that says so. Pure: the instant, the local date and the thresholds are
 * arguments. Throws RangeError for an instant, a date or a zone that is none.
 */
export function assess(document: ChemistryDocument, totals: BottleTotals, ctx: AssessContext): Assessment {
  const material = mainMaterial(document, totals, ctx.material);
  const standing = material ? standingOf(document, totals, material, ctx) : null;
  const tally = material && document.use === 're-used' ? capacityStanding(document, totals, material) : null;
  const date = dateLimit(document, totals, ctx);
  const limits = [
    ...(tally && material ? capacityLimits(document, totals, material, tally) : []),
    ...[date, volumeLimit(document, totals, ctx)].filter((limit) => limit !== null),
    ...gateLimits(document, totals, ctx),
  ].sort(byTightness);
  const near = nearDays(document, totals, ctx);
  const conditions = conditionsOf(totals, ctx, { standing, date, near });
  const verdict = verdictOf(totals, conditions, limits, document.use === 'one-shot');
  const owedUl = owed(document, totals, material);
  const [tightest] = limits;
  const telling = (limit: Limit): boolean =>
    limit.closes ||
    (limit.kind === 'date'
      ? conditions.includes('near')
      : conditions.includes('low') && limit.leftE4 !== undefined);
  return {
    verdict,
    closed: totals.discardedAt !== null || limits.some((limit) => limit.closes),
    conditions,
    limits,
    governs: tightest && (tightest.closes || tightest.shareLeftE4 !== null) ? tightest.kind : null,
    ...perMaterial(document, totals, ctx),
    material,
    lastDay: date?.lastDay ?? null,
    daysLeft: date?.daysLeft ?? null,
    owedUl,
    reasons: limits.filter(telling).map((limit) => limit.text),
    sentence: sentenceOf(document, totals, { verdict, material, standing, limits, owedUl }, ctx),
    nextLookAt: nextLook(totals, ctx, date, near),
  };
}
