import { bottles, counters, orders } from '@wetside/db';
import { asc, eq, sql } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';
import type { House } from '../../platform/house/house.repository.js';
import type { Found } from './found.js';

/** Every counter against the highest number that was given out: bottle codes by their two letters, orders by 'order'. */
export async function checkCounters(tx: Tx, { darkroomId, shortName }: House): Promise<Found> {
  const stored = await tx
    .select()
    .from(counters)
    .where(eq(counters.darkroomId, darkroomId))
    .orderBy(asc(counters.name));
  const letters = sql<string>`split_part(${bottles.code}, '-', 1)`;
  const codes = await tx
    .select({
      name: letters,
      highest: sql<number>`max(split_part(${bottles.code}, '-', 2)::integer)`.mapWith(Number),
    })
    .from(bottles)
    .where(eq(bottles.darkroomId, darkroomId))
    .groupBy(sql`1`);
  const [ordered] = await tx
    .select({ highest: sql<number>`coalesce(max(${orders.number}), 0)`.mapWith(Number) })
    .from(orders)
    .where(eq(orders.darkroomId, darkroomId));
  const highest = new Map(codes.map((row) => [row.name, row.highest]));
  if (ordered && ordered.highest > 0) highest.set('order', ordered.highest);
  const last = new Map(stored.map((row) => [row.name, row.last]));
  const names = [...new Set([...last.keys(), ...highest.keys()])].sort();
  const differences = names.flatMap((name) => {
    const [held, given] = [last.get(name) ?? 0, highest.get(name) ?? 0];
    return held === given
      ? []
      : [`${shortName}, counter ${name}: it stands at ${held}, and ${given} was given out.`];
  });
  return { checked: names.length, differences };
}
