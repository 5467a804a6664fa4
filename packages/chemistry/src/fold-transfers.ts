import { containerState } from './container.js';
import type { ChemistryDocument } from './document.js';
import type { Material } from './film.js';
import { compare, fromText, scaleDown } from './fraction.js';
import { enterState, settle } from './keeping.js';
import type { BottleFact, BottleTotals, PerMaterialE4, TransferIn } from './ledger.js';
import { capacityStanding, materialEntries, equivalentE4, ratedE4 } from './rated.js';

function sum(a: PerMaterialE4, b: PerMaterialE4): PerMaterialE4 {
  const total = { ...a };
  for (const [material, amount] of materialEntries(b)) total[material] = (total[material] ?? 0) + amount;
  return total;
}

function difference(a: PerMaterialE4, b: PerMaterialE4): PerMaterialE4 {
  const rest = { ...a };
  for (const [material, amount] of materialEntries(b)) {
    if (rest[material] !== undefined) rest[material] = Math.max(0, rest[material] - amount);
  }
  return rest;
}

/** The solution takes its share of the rating along; what it had used leaves only as far as the fact says. */
export function pourOut(
  document: ChemistryDocument,
  totals: BottleTotals,
  fact: BottleFact & { kind: 'transfer-out' },
): BottleTotals {
  const before = totals.volumeUl;
  const volumeUl = Math.max(0, before - fact.volumeUl);
  const rest: BottleTotals = {
    ...totals,
    volumeUl,
    ratedVolumeUl: before > 0 ? scaleDown(totals.ratedVolumeUl, volumeUl, before) : 0,
    usedE4: difference(totals.usedE4, fact.usedE4),
    ceilingE4: difference(totals.ceilingE4, fact.ceilingE4 ?? {}),
  };
  const { container } = totals;
  if (totals.containerState !== 'full' || containerState(container, volumeUl) !== 'part-full') return rest;
  return enterState(document, rest, { container, state: 'part-full', on: fact.happenedOn });
}

/** What the poured-in solution has left at most: its ceiling, or its tally. */
function incomingLeft(document: ChemistryDocument, fact: TransferIn, material: Material): number {
  const ceiling = fact.ceilingE4?.[material];
  if (ceiling !== undefined) return ceiling;
  const volumeUl = fact.ratedVolumeUl ?? fact.volumeUl;
  const used = materialEntries(fact.usedE4).reduce(
    (all, [of, amountE4]) => all + equivalentE4(document, volumeUl, { material: of, amountE4 }, material),
    0,
  );
  return Math.max(0, (ratedE4(document, material, volumeUl) ?? 0) - used);
}

function joinedCeilings(document: ChemistryDocument, totals: BottleTotals, fact: TransferIn): PerMaterialE4 {
  const joined: PerMaterialE4 = {};
  const tested = new Set(
    [...materialEntries(totals.ceilingE4), ...materialEntries(fact.ceilingE4 ?? {})].map(([m]) => m),
  );
  for (const material of tested) {
    const own = totals.ceilingE4[material] ?? capacityStanding(document, totals, material)?.leftE4 ?? 0;
    joined[material] = own + incomingLeft(document, fact, material);
  }
  return joined;
}

const earlier = (a: string | null, b: string | null | undefined): string | null =>
  !b ? a : !a || b < a ? b : a;

/** Combining takes the oldest date, the greater share of life used and the sum of rolls; the state stays. */
export function pourIn(
  document: ChemistryDocument,
  totals: BottleTotals,
  fact: BottleFact & TransferIn,
): BottleTotals {
  const joined: BottleTotals = {
    ...totals,
    volumeUl: totals.volumeUl + fact.volumeUl,
    ratedVolumeUl: totals.ratedVolumeUl + (fact.ratedVolumeUl ?? fact.volumeUl),
    usedE4: sum(totals.usedE4, fact.usedE4),
    ceilingE4: joinedCeilings(document, totals, fact),
    mixedOn: earlier(totals.mixedOn, fact.mixedOn) ?? totals.mixedOn,
    about: totals.about || (fact.about ?? false),
  };
  const settled = settle(document, totals, fact.happenedOn);
  const older = (a: BottleTotals['lifeUsed'], b = a): boolean => compare(fromText(b), fromText(a)) > 0;
  const olderMix = older(settled.lifeUsed, fact.lifeUsed);
  const olderUse = older(settled.useLifeUsed, fact.useLifeUsed);
  const firstUsedOn = earlier(totals.firstUsedOn, fact.firstUsedOn);
  if (!olderMix && !olderUse) return { ...joined, firstUsedOn };
  return {
    ...joined,
    firstUsedOn,
    stateSince: settled.stateSince,
    endedOn: settled.endedOn,
    lifeUsed: olderMix && fact.lifeUsed ? fact.lifeUsed : settled.lifeUsed,
    useLifeUsed: olderUse && fact.useLifeUsed ? fact.useLifeUsed : settled.useLifeUsed,
  };
}
