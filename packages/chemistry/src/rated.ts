import type { CapacityFigure, ChemistryDocument } from './document.js';
import type { Material } from './film.js';
import { scaleDown, scaleUp } from './fraction.js';
import type { BottleTotals, PerMaterialE4 } from './ledger.js';
import { UL_PER_L } from './units.js';

/** Rated rolls of one figure for such a volume, 1/10,000 of a roll, rounded down. */
function ratedBy(figure: CapacityFigure, volumeUl: number): number {
  if (figure.per === 'litre') return scaleDown(volumeUl, figure.rollsE4, UL_PER_L);
  if (figure.bottleUl === undefined) return figure.rollsE4;
  return scaleDown(Math.min(volumeUl, figure.bottleUl), figure.rollsE4, figure.bottleUl);
}

/** The capacity figure that counts: of the sheet in hand if there is one, else the smallest. Null = not known. */
export function capacityFor(
  document: ChemistryDocument,
  material: Material,
  volumeUl: number,
): CapacityFigure | null {
  const held = document.materials.find((use) => use.material === material)?.capacity ?? [];
  const own = held.filter((figure) => figure.sheetInHand);
  const candidates = own.length > 0 ? own : held;
  return [...candidates].sort((a, b) => ratedBy(a, volumeUl) - ratedBy(b, volumeUl))[0] ?? null;
}

/** Rated capacity of such a volume in 1/10,000 of a roll (or print); null = not known. */
export function ratedE4(document: ChemistryDocument, material: Material, volumeUl: number): number | null {
  const figure = capacityFor(document, material, volumeUl);
  return figure ? ratedBy(figure, volumeUl) : null;
}

/**
 * An amount of one material as the amount of another that wears the bath as much, rounded up. Where either
 * capacity is not known, area counts for area.
 */
export function equivalentE4(
  document: ChemistryDocument,
  volumeUl: number,
  amount: { material: Material; amountE4: number },
  as: Material,
): number {
  if (amount.material === as) return amount.amountE4;
  const from = ratedE4(document, amount.material, volumeUl);
  const to = ratedE4(document, as, volumeUl);
  return from && to ? scaleUp(amount.amountE4, to, from) : amount.amountE4;
}

export const materialEntries = (amounts: PerMaterialE4): [Material, number][] =>
  Object.entries(amounts) as [Material, number][];

/** All the use a bottle has seen, told as one material. */
export const usedAsE4 = (document: ChemistryDocument, totals: BottleTotals, as: Material): number =>
  materialEntries(totals.usedE4).reduce(
    (sum, [material, amountE4]) =>
      sum + equivalentE4(document, totals.ratedVolumeUl, { material, amountE4 }, as),
    0,
  );

/** What is left of a material by tally and by test. All in 1/10,000; leftE4 and overE4 are never negative. */
export interface CapacityStanding {
  ratedE4: number;
  usedE4: number;
  tallyLeftE4: number;
  ceilingE4: number | null;
  leftE4: number;
  overE4: number;
}

/** Null when the capacity is not known. A ceiling without a known capacity judges nothing. */
export function capacityStanding(
  document: ChemistryDocument,
  totals: BottleTotals,
  material: Material,
): CapacityStanding | null {
  const rated = ratedE4(document, material, totals.ratedVolumeUl);
  if (rated === null) return null;
  const usedE4 = usedAsE4(document, totals, material);
  const tallyLeftE4 = Math.max(0, rated - usedE4);
  const ceilingE4 = totals.ceilingE4[material] ?? null;
  return {
    ratedE4: rated,
    usedE4,
    tallyLeftE4,
    ceilingE4,
    leftE4: ceilingE4 === null ? tallyLeftE4 : Math.max(0, Math.min(tallyLeftE4, ceilingE4)),
    overE4: Math.max(0, usedE4 - rated),
  };
}
