import type { ShelfPack, SoldBy } from '../../shared/api/types.js';

export interface Due {
  pack: ShelfPack;
  soldBy: SoldBy;
  count: number;
}

/** Where a pack is ordered: the first supplier that has it, else the one that will have it soonest. */
export function supplierFor(pack: ShelfPack, today: string): SoldBy | undefined {
  const soon = [...pack.soldBy].sort((a, b) => (a.outUntil ?? '').localeCompare(b.outUntil ?? ''));
  return soon.find(({ outUntil }) => outUntil === null || outUntil <= today) ?? soon[0];
}

/** What is due, by supplier. */
export function dueBySupplier(packs: readonly ShelfPack[], today: string): Map<string, Due[]> {
  const groups = new Map<string, Due[]>();
  for (const pack of packs) {
    const soldBy = supplierFor(pack, today);
    if (!pack.advice.due || !soldBy) continue;
    const due = { pack, soldBy, count: pack.advice.quantity };
    groups.set(soldBy.supplierId, [...(groups.get(soldBy.supplierId) ?? []), due]);
  }
  return groups;
}
