/** An order that was sent, and when it came in whole; null while it has not. Dates 'YYYY-MM-DD'. */
export interface PastOrder {
  sentOn: string;
  arrivedOn: string | null;
}

export interface LeadTime {
  days: number;
  /** No order has come in yet, so the days are ours. */
  guess: boolean;
  reason: string;
}

/** With no past orders a supplier is given a week. Our guess, no source. */
export const guessedLeadDays = 7;
/** Old orders say little about a supplier today. Ours, no source. */
const ordersLookedAt = 10;

const DAY_MS = 86_400_000;

function daysTaken(order: PastOrder): number {
  const days =
    (Date.parse(`${order.arrivedOn}T00:00:00Z`) - Date.parse(`${order.sentOn}T00:00:00Z`)) / DAY_MS;
  if (!Number.isInteger(days) || days < 0)
    throw new RangeError('an order arrives on a date, not before it was sent');
  return days;
}

/**
 * Days from sending to arrival: the median of the last ten orders that came in, the later of two middles, so
 * that one lost parcel does not speak for all. Throws RangeError for dates that cannot be.
 */
export function leadTime(pastOrders: readonly PastOrder[]): LeadTime {
  const taken = pastOrders
    .filter((order) => order.arrivedOn !== null)
    .sort((a, b) => (a.sentOn < b.sentOn ? 1 : a.sentOn > b.sentOn ? -1 : 0))
    .slice(0, ordersLookedAt)
    .map(daysTaken)
    .sort((a, b) => a - b);
  const median = taken[Math.floor(taken.length / 2)];
  if (median === undefined) {
    return {
      days: guessedLeadDays,
      guess: true,
      reason: `${guessedLeadDays} days, a guess: no order has come in yet`,
    };
  }
  const orders = taken.length === 1 ? 'the last order' : `the last ${taken.length} orders`;
  return { days: median, guess: false, reason: `about ${median} days, from ${orders}` };
}
