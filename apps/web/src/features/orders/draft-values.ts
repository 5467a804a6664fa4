import type { OrderView } from '../../shared/api/types.js';
import { showMoney } from '../../shared/formats/amounts.js';

/** What may be typed into a draft, by the line's id. */
export interface DraftValues {
  counts: Record<string, string>;
  note: string;
}

type Line = OrderView['lines'][number];

const whole = /^\d{1,3}$/;
export const isCount = (text: string | undefined): boolean => whole.test(text?.trim() ?? '');

export const valuesOf = (order: OrderView): DraftValues => ({
  counts: Object.fromEntries(order.lines.map(({ id, count }) => [id, String(count)])),
  note: order.note ?? '',
});

/** The lines of the order as it is, and those that somebody took out while they were edited here. */
export function editedLines(order: OrderView, base: OrderView): Line[] {
  const gone = base.lines.filter(({ id }) => !order.lines.some((line) => line.id === id));
  return [...order.lines, ...gone];
}

/** What the counts as they are typed come to, or what to mend first. */
export function totalWords(lines: readonly Line[], counts: DraftValues['counts'], currency: string): string {
  if (!lines.every(({ id }) => isCount(counts[id]))) return 'The total follows whole packs, 0 to 999.';
  const total = lines.reduce<number | null>((sum, line) => {
    const count = Number(counts[line.id]);
    if (sum === null || count === 0) return sum;
    return line.priceMinor === null ? null : sum + line.priceMinor * count;
  }, 0);
  return `Total ${showMoney(total, currency)}`;
}

/** 'Saved now: 5.' beside a count that somebody else has changed; nothing where nobody did. */
export function savedCount(id: string, order: OrderView, base: OrderView): string | undefined {
  const before = base.lines.find((line) => line.id === id)?.count ?? 0;
  const now = order.lines.find((line) => line.id === id)?.count ?? 0;
  return before === now ? undefined : `Saved now: ${now}`;
}
