import { addMonths, type LocalDate } from '@wetside/chemistry';
import type { FieldProblem } from '../../platform/errors/problem.js';
import { openOf, type LineCounts } from '../orders/order-lines.js';

export interface ReceivedLine {
  packId: string;
  orderLineId?: string;
  lotId: string;
  lotNumber: string;
  expiresOn: string | null;
  count: number;
}

interface KnownLot {
  packId: string;
  lotNumber: string;
  expiresOn: string | null;
}

/** What the house knows that a receipt may name, by id. */
export interface Known {
  packs: ReadonlyMap<string, unknown>;
  lots: ReadonlyMap<string, KnownLot>;
  orderLines: ReadonlyMap<string, LineCounts & { packId: string }>;
}

/** What is wrong with the lines of a receipt, field by field. */
export function receiptComplaints(lines: readonly ReceivedLine[], known: Known): FieldProblem[] {
  return lines.flatMap((line, at) => {
    const complain = (field: string, message: string) => [{ field: `content.lines.${at}.${field}`, message }];
    if (!known.packs.has(line.packId)) return complain('packId', 'There is no such pack here.');
    // A new lot may stand on several lines; the first of them says what it is.
    const lot = known.lots.get(line.lotId) ?? lines.slice(0, at).find((one) => one.lotId === line.lotId);
    if (lot && lot.packId !== line.packId) return complain('lotId', 'That lot is of another pack.');
    if (lot && lot.lotNumber !== line.lotNumber)
      return complain('lotNumber', `That lot is ${lot.lotNumber}.`);
    if (lot && line.expiresOn !== null && lot.expiresOn !== line.expiresOn) {
      return complain('expiresOn', 'That lot has another date here. Enter this one as a lot of its own.');
    }
    if (line.orderLineId === undefined) return [];
    if (known.orderLines.get(line.orderLineId)?.packId !== line.packId) {
      return complain('orderLineId', 'That line of the order is for another pack.');
    }
    return [];
  });
}

/** Places of the lines that bring more than is open on their line of the order. */
export function overDelivered(
  lines: readonly ReceivedLine[],
  orderLines: ReadonlyMap<string, LineCounts>,
): number[] {
  const open = new Map([...orderLines].map(([id, line]) => [id, openOf(line)]));
  return lines.flatMap(({ orderLineId, count }, at) => {
    if (orderLineId === undefined) return [];
    const left = (open.get(orderLineId) ?? 0) - count;
    open.set(orderLineId, left);
    return left < 0 ? [at] : [];
  });
}

/** Adds up a figure of the lines by a key; lines without the key are left out. */
export function sumBy<T extends { count: number }>(
  lines: readonly T[],
  keyOf: (line: T) => string | null | undefined,
): Map<string, number> {
  const sums = new Map<string, number>();
  for (const line of lines) {
    const key = keyOf(line);
    if (key !== null && key !== undefined) sums.set(key, (sums.get(key) ?? 0) + line.count);
  }
  return sums;
}

/** The date printed on it, else a guess from the day that it came and the months that such a pack keeps, if those are known. */
export function expiryOf(
  printed: LocalDate | null,
  cameOn: LocalDate,
  keepsUnopenedMonths: number | null,
): { expiresOn: LocalDate | null; expiryIsGuess: boolean } {
  if (printed !== null) return { expiresOn: printed, expiryIsGuess: false };
  if (keepsUnopenedMonths === null) return { expiresOn: null, expiryIsGuess: false };
  return { expiresOn: addMonths(cameOn, keepsUnopenedMonths), expiryIsGuess: true };
}
