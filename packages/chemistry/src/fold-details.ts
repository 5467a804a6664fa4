import { containerState } from './container.js';
import type { LocalDate } from './dates.js';
import type { ChemistryDocument } from './document.js';
import type { Material } from './film.js';
import { scaleDown } from './fraction.js';
import { pourIn, pourOut } from './fold-transfers.js';
import { enterState } from './keeping.js';
import type { BottleFact, BottleTotals, PerMaterialE4 } from './ledger.js';
import { materialEntries, equivalentE4, ratedE4 } from './rated.js';

/** Volume that leaves can turn a full bottle part full; nothing but a change of container turns it back. */
export function lose(
  document: ChemistryDocument,
  totals: BottleTotals,
  lostUl: number,
  on: LocalDate,
): BottleTotals {
  const volumeUl = Math.max(0, totals.volumeUl - lostUl);
  const left = { ...totals, volumeUl };
  const { container } = totals;
  if (totals.containerState !== 'full' || containerState(container, volumeUl) !== 'part-full') return left;
  return enterState(document, left, { container, state: 'part-full', on });
}

/** A use lowers what tests leave of every material, each by what that use is worth in it. */
function lowerCeilings(
  document: ChemistryDocument,
  totals: BottleTotals,
  amount: { material: Material; amountE4: number },
): PerMaterialE4 {
  const lowered: PerMaterialE4 = {};
  for (const [material, ceiling] of materialEntries(totals.ceilingE4)) {
    const worth = equivalentE4(document, totals.ratedVolumeUl, amount, material);
    lowered[material] = Math.max(0, ceiling - worth);
  }
  return lowered;
}

function use(
  document: ChemistryDocument,
  totals: BottleTotals,
  amount: { material: Material; amountE4: number },
): BottleTotals {
  const { material, amountE4 } = amount;
  return {
    ...totals,
    usedE4: { ...totals.usedE4, [material]: (totals.usedE4[material] ?? 0) + amountE4 },
    ceilingE4: lowerCeilings(document, totals, amount),
  };
}

function load(
  document: ChemistryDocument,
  totals: BottleTotals,
  fact: BottleFact & { kind: 'load' },
): BottleTotals {
  const { firstUsedOn } = totals;
  const first = firstUsedOn === null || fact.happenedOn < firstUsedOn ? fact.happenedOn : firstUsedOn;
  const begun: BottleTotals = { ...totals, firstUsedOn: first, loads: totals.loads + 1 };
  const used = fact.charges.reduce(
    (sum, { material, countedE4 }) => use(document, sum, { material, amountE4: countedE4 }),
    begun,
  );
  const takenUl = fact.charges.reduce((sum, charge) => sum + charge.takenUl, 0);
  return takenUl > 0 ? lose(document, used, takenUl, fact.happenedOn) : used;
}

function read(
  document: ChemistryDocument,
  totals: BottleTotals,
  fact: BottleFact & { kind: 'reading' },
): BottleTotals {
  const ceilingE4 = { ...totals.ceilingE4 };
  for (const [material, shareE4] of materialEntries(fact.shareE4)) {
    const rated = ratedE4(document, material, totals.ratedVolumeUl);
    if (rated === null) continue;
    const tested = scaleDown(rated, Math.min(10_000, Math.max(0, shareE4)), 10_000);
    ceilingE4[material] = Math.min(ceilingE4[material] ?? tested, tested);
  }
  return { ...totals, ceilingE4 };
}

function adjust(
  document: ChemistryDocument,
  totals: BottleTotals,
  fact: BottleFact & { kind: 'adjustment' },
): BottleTotals {
  const { material } = fact;
  const amountE4 = Math.abs(fact.deltaE4);
  if (fact.kindOf === 'uncounted-use') return use(document, totals, { material, amountE4 });
  const usedE4 = { ...totals.usedE4, [material]: Math.max(0, (totals.usedE4[material] ?? 0) - amountE4) };
  const ceiling = totals.ceilingE4[material];
  const ceilingE4 = ceiling === undefined ? {} : { [material]: ceiling + amountE4 };
  return { ...totals, usedE4, ceilingE4: { ...totals.ceilingE4, ...ceilingE4 } };
}

/** The totals after a fact that opens no bottle; the order is the caller's affair. */
export function applyDetail(
  document: ChemistryDocument,
  totals: BottleTotals,
  fact: BottleFact,
): BottleTotals {
  switch (fact.kind) {
    case 'mix':
    case 'standing':
      return totals;
    case 'load':
      return load(document, totals, fact);
    case 'hold':
      return { ...totals, hold: { actionId: fact.actionId, since: fact.happenedAt, reason: fact.reason } };
    case 'release':
      return { ...totals, hold: null };
    case 'discard':
      return { ...totals, discardedAt: totals.discardedAt ?? fact.happenedAt };
    case 'draw':
      return pourOut(document, totals, { ...fact, kind: 'transfer-out', volumeUl: fact.takenUl, usedE4: {} });
    case 'top-up': {
      const replenishedUl = totals.replenishedUl + (fact.replenisher ? fact.addedUl : 0);
      return { ...totals, volumeUl: totals.volumeUl + fact.addedUl, replenishedUl };
    }
    case 'container-change': {
      const state = containerState(fact.container, totals.volumeUl);
      return enterState(document, totals, { container: fact.container, state, on: fact.happenedOn });
    }
    case 'reading':
      return read(document, totals, fact);
    case 'adjustment':
      return adjust(document, totals, fact);
    case 'transfer-in':
      return pourIn(document, totals, fact);
    case 'transfer-out':
      return pourOut(document, totals, fact);
  }
}
