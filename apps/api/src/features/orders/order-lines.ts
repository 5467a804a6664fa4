/** How far one line of an order has come, in packs. */
export interface LineCounts {
  count: number;
  received: number;
  cancelled: number;
}

/** Packs that may still come; never below zero, for a supplier may send more than was asked. */
export const openOf = ({ count, received, cancelled }: LineCounts): number =>
  Math.max(0, count - received - cancelled);

/** Whether nothing of the order is still to come. */
export const isDone = (lines: readonly LineCounts[]): boolean => lines.every((line) => openOf(line) === 0);

/** What the order comes to, in minor units; null where the price of a line is not known. */
export function totalMinor(lines: readonly { count: number; priceMinor: number | null }[]): number | null {
  let total = 0;
  for (const { count, priceMinor } of lines) {
    if (count === 0) continue;
    if (priceMinor === null) return null;
    total += count * priceMinor;
  }
  return total;
}

/** 0007: how an order's number is written. */
export const numberText = (number: number): string => String(number).padStart(4, '0');
