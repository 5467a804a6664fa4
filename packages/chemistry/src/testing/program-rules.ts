import { assess } from '../assess.js';
import { defaultThresholds } from '../assess-types.js';
import { starterCatalogue } from '../catalogue/starter-catalogue.js';
import { localDate } from '../dates.js';
import type { ChemistryDocument } from '../document.js';
import { fold } from '../fold.js';
import type { BottleFact, BottleTotals } from '../ledger.js';
import { measureOut } from '../mixing.js';

/** The document of the starter catalogue with that key. Throws Error for a key that is none. */
export function starterDocument(key: string): ChemistryDocument {
  const entry = starterCatalogue.find((each) => each.key === key);
  if (!entry) throw new Error(`the starter catalogue has no ${key}`);
  return entry.document;
}

/** A bottle as a server knows it at that moment. */
export interface Known {
  document: ChemistryDocument;
  facts: readonly BottleFact[];
  nowMs: number;
  zone: string;
}

/** What a server lets befall a bottle that stands so: nothing is discarded twice, nothing released that is free. */
export function mayBefall(known: Known): ('hold' | 'release' | 'discard')[] {
  const totals = fold(known.document, known.facts);
  if (!totals || totals.discardedAt) return [];
  return totals.hold ? ['release', 'release', 'hold', 'discard'] : ['hold', 'hold', 'hold', 'discard'];
}

function isClosed({ document, nowMs, zone }: Known, totals: BottleTotals): boolean {
  const now = new Date(nowMs).toISOString();
  const stands = assess(document, totals, {
    now,
    today: localDate(now, zone),
    zone,
    smallestTankUl: null,
    thresholds: defaultThresholds,
  });
  return stands.closed && stands.verdict !== 'volume-short';
}

/** The microlitres of stock that a mix of that volume takes; null where the stock bottle is closed or holds less. */
export function drawFrom(stock: Known, mixed: ChemistryDocument, volumeUl: number): number | null {
  const totals = fold(stock.document, stock.facts);
  const takenUl = measureOut(mixed.dilution, volumeUl).parts.reduce(
    (sum, part) => sum + (part.volumeUl ?? 0),
    0,
  );
  return !totals || isClosed(stock, totals) || totals.volumeUl < takenUl ? null : takenUl;
}
