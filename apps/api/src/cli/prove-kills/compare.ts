import type { Sent } from './ticker.js';

/** What the database holds: how often each load is there and through how many bottles, and each bottle's totals. */
export interface Stored {
  loads: readonly { id: string; times: number; bottles: number }[];
  totals: readonly { bottleId: string; loads: number; usedE4: number }[];
}

const ROLL_E4 = 10_000;

/**
 * A sentence for everything that is not as the people who sent it were told: an answered load is there once, one that
 * was not answered once or not at all, none that nobody sent, and every bottle holds what is there.
 */
export function compare(sent: readonly Sent[], stored: Stored): string[] {
  const found = new Map(stored.loads.map((load) => [load.id, load]));
  const known = new Set(sent.map(({ id }) => id));
  return [
    ...sent.flatMap((load) => aboutLoad(load, found.get(load.id))),
    ...stored.loads.filter(({ id }) => !known.has(id)).map(({ id }) => `Load ${id} was sent by nobody.`),
    ...aboutTotals(
      sent.filter(({ id }) => found.has(id)),
      stored,
    ),
  ];
}

function aboutLoad(sent: Sent, found: Stored['loads'][number] | undefined): string[] {
  if (!found) return sent.answered ? [`Load ${sent.id} was answered and is not there.`] : [];
  return [
    ...(found.times === 1 ? [] : [`Load ${sent.id} is there ${found.times} times.`]),
    ...(found.bottles === sent.bottleIds.length
      ? []
      : [`Load ${sent.id} went through ${sent.bottleIds.length} bottles and is there for ${found.bottles}.`]),
  ];
}

function aboutTotals(there: readonly Sent[], { totals }: Stored): string[] {
  const loads = new Map<string, number>();
  for (const { bottleIds } of there) for (const id of bottleIds) loads.set(id, (loads.get(id) ?? 0) + 1);
  return totals.flatMap(({ bottleId, ...total }) => {
    const count = loads.get(bottleId) ?? 0;
    if (total.loads === count && total.usedE4 === count * ROLL_E4) return [];
    return [
      `Bottle ${bottleId} counts ${total.loads} loads, ${total.usedE4} E4 of film; ${count} are there.`,
    ];
  });
}
