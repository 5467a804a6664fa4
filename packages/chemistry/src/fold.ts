import { instantMs } from './dates.js';
import type { ChemistryDocument } from './document.js';
import { applyDetail } from './fold-details.js';
import { openBottle } from './fold-opening.js';
import { type BottleFact, type BottleTotals, LedgerOrderError } from './ledger.js';

type Place = { ms: number; seq: number; part: number };

const placeOf = (fact: BottleFact): Place => ({
  ms: instantMs(fact.happenedAt),
  seq: fact.seq,
  part: fact.part ?? 0,
});

const lastPlace = (totals: BottleTotals): Place => ({
  ms: instantMs(totals.lastHappenedAt),
  seq: totals.lastSeq,
  part: totals.lastPart,
});

const comparePlaces = (a: Place, b: Place): number => a.ms - b.ms || a.seq - b.seq || a.part - b.part;

function inOrder(a: BottleFact, b: BottleFact): number {
  const order = comparePlaces(placeOf(a), placeOf(b));
  if (order !== 0) return order;
  // Two facts of one action that nobody numbered: any order will do, so long as it is always the same.
  const [left, right] = [a.kind + JSON.stringify(a), b.kind + JSON.stringify(b)];
  return left < right ? -1 : left > right ? 1 : 0;
}

function stamp(totals: BottleTotals, fact: BottleFact): BottleTotals {
  if (comparePlaces(placeOf(fact), lastPlace(totals)) < 0) return totals;
  return {
    ...totals,
    lastActionId: fact.actionId,
    lastHappenedAt: fact.happenedAt,
    lastSeq: fact.seq,
    lastPart: fact.part ?? 0,
  };
}

/** Whether the fact comes after everything that the totals know, so that apply may take it. */
export function isNewest(totals: BottleTotals | null, fact: BottleFact): boolean {
  return totals === null || comparePlaces(placeOf(fact), lastPlace(totals)) > 0;
}

/**
 * The totals after one more fact. Pure. Throws LedgerOrderError when the fact is not the newest, is voided,
 * opens a bottle that is open, or finds none: the caller then folds the whole history.
 */
export function apply(
  document: ChemistryDocument,
  totals: BottleTotals | null,
  fact: BottleFact,
): BottleTotals {
  if (fact.voided) throw new LedgerOrderError('a voided fact moves nothing: fold the history');
  const opened = openBottle(document, fact);
  if (totals === null) {
    if (!opened) throw new LedgerOrderError('the bottle has not been opened by a mix');
    return opened;
  }
  if (!isNewest(totals, fact)) throw new LedgerOrderError('the fact is older than the newest one');
  if (opened) throw new LedgerOrderError('the bottle has been opened already');
  return stamp(applyDetail(document, totals, fact), fact);
}

/**
 * The totals of a whole history, in whatever order it comes; voided facts are skipped. Null when nothing
 * that still stands opens the bottle. A fact told for before the opening counts after it. Throws
 * LedgerOrderError when two facts that stand both open it.
 */
export function fold(document: ChemistryDocument, facts: readonly BottleFact[]): BottleTotals | null {
  let totals: BottleTotals | null = null;
  const rest: BottleFact[] = [];
  for (const fact of facts.filter((one) => !one.voided).sort(inOrder)) {
    const opened = openBottle(document, fact);
    if (!opened) rest.push(fact);
    else if (totals) throw new LedgerOrderError('two facts open the same bottle');
    else totals = opened;
  }
  if (!totals) return null;
  return rest.reduce((sum: BottleTotals, fact) => stamp(applyDetail(document, sum, fact), fact), totals);
}
