import { reorderAdvice } from '@wetside/supply';
import type { SoldPack } from '../suppliers/suppliers.repository.js';
import type { LotRow, MakesRow, OpenedPackRow, PackPartRow, PackRow } from './shelf.repository.js';
import type { AdviceView, LotView, PackView } from './shelf.view.js';

/** The shelf's rows as they were read, each list in the order in which it is shown. */
export interface ShelfRows {
  packs: readonly PackRow[];
  parts: readonly PackPartRow[];
  makes: readonly MakesRow[];
  lots: readonly LotRow[];
  opened: readonly OpenedPackRow[];
  sold: readonly SoldPack[];
  /** Packs on order by the pack's id. */
  onOrder: ReadonlyMap<string, number>;
}

/** The packs with all that belongs to them; one that the house gave up is shown while there is any of it. */
export function assembleShelf(rows: ShelfRows): PackView[] {
  return rows.packs
    .map((pack) => ({ pack, view: packView(pack, rows) }))
    .filter(({ pack, view }) => pack.archivedAt === null || view.lots.length > 0 || view.onOrder > 0)
    .map(({ view }) => view);
}

function packView(pack: PackRow, rows: ShelfRows): PackView {
  const parts = rows.parts.filter((part) => part.packId === pack.id);
  const lots = rows.lots
    .filter((lot) => lot.packId === pack.id)
    .map((lot) => lotView(lot, parts, rows.opened));
  const unopened = lots.reduce((sum, lot) => sum + lot.unopened, 0);
  const onOrder = rows.onOrder.get(pack.id) ?? 0;
  const expiries = lots.flatMap(({ expiresOn }) => (expiresOn === null ? [] : [expiresOn])).sort();
  return {
    id: pack.id,
    name: pack.name,
    form: pack.form,
    reorderPoint: pack.reorderPoint,
    reorderUpTo: pack.reorderUpTo,
    unopened,
    onOrder,
    advice: advice(pack, unopened, onOrder),
    firstExpiry: expiries[0] ?? null,
    parts: parts.map(({ id, name, sizeUl, sizeMg }) => ({ id, name, sizeUl, sizeMg })),
    makes: rows.makes.flatMap(({ packId, volumeUl, ...made }) =>
      packId === pack.id && volumeUl !== null ? [{ ...made, volumeUl }] : [],
    ),
    lots,
    soldBy: rows.sold.flatMap(
      ({ packId, supplierPackId, supplierId, supplierTitle, priceMinor, currency, outUntil }) =>
        packId === pack.id
          ? [{ supplierPackId, supplierId, supplierName: supplierTitle, priceMinor, currency, outUntil }]
          : [],
    ),
  };
}

function lotView(lot: LotRow, parts: readonly PackPartRow[], opened: readonly OpenedPackRow[]): LotView {
  const { id, lotNumber, expiresOn, expiryIsGuess, unopened } = lot;
  const own = opened
    .filter((pack) => pack.lotId === id)
    .map(({ id: openedId, packPartId, openedOn, leftUl, leftMg }) => ({
      id: openedId,
      partId: packPartId,
      partName: parts.find((part) => part.id === packPartId)?.name ?? '',
      openedOn,
      leftUl,
      leftMg,
    }));
  return { id, lotNumber, expiresOn, expiryIsGuess, unopened, opened: own };
}

function advice(
  { reorderPoint, reorderUpTo, archivedAt }: PackRow,
  unopened: number,
  onOrder: number,
): AdviceView {
  if (reorderPoint === null || archivedAt !== null) {
    return { due: false, quantity: 0, reason: 'The house does not keep a reorder point for it.' };
  }
  const upTo = reorderUpTo ?? reorderPoint + 1;
  return reorderAdvice({ unopened, onOrder, reorderPoint, upTo });
}
