import * as schema from '@wetside/db';
import { darkrooms } from '@wetside/db';
import { asc } from 'drizzle-orm';
import { drizzle } from 'drizzle-orm/postgres-js';
import postgres from 'postgres';
import type { Tx } from '../../platform/database/database.js';
import { HouseRepository } from '../../platform/house/house.repository.js';
import { checkBottles } from './bottle-checks.js';
import { checkCounters } from './counter-checks.js';
import { checkLots, checkOrderLines } from './stock-checks.js';

/** What was counted again, and a sentence for each difference. */
export interface Reconciled {
  bottles: number;
  lots: number;
  orderLines: number;
  differences: string[];
}

/**
 * Reckons every running figure of every darkroom again out of what happened, with the same fold, and compares.
 * It reads one snapshot and changes nothing, so it may run beside a server.
 * @param adminUrl a login that row security does not bind
 * @param now the moment at which the bottles' next looks are judged
 */
export async function reconcile(adminUrl: string, now: Date): Promise<Reconciled> {
  const client = postgres(adminUrl, { max: 1, onnotice: () => undefined });
  try {
    return await drizzle(client, { schema }).transaction((tx) => reconcileAll(tx, now), {
      isolationLevel: 'repeatable read',
      accessMode: 'read only',
    });
  } finally {
    await client.end();
  }
}

async function reconcileAll(tx: Tx, now: Date): Promise<Reconciled> {
  const all: Reconciled = { bottles: 0, lots: 0, orderLines: 0, differences: [] };
  const rooms = await tx.select({ id: darkrooms.id }).from(darkrooms).orderBy(asc(darkrooms.shortName));
  const houses = new HouseRepository();
  for (const { id } of rooms) {
    const house = await houses.read(tx, id);
    const found = {
      bottles: await checkBottles(tx, house, now),
      lots: await checkLots(tx, house),
      orderLines: await checkOrderLines(tx, house),
      counters: await checkCounters(tx, house),
    };
    all.bottles += found.bottles.checked;
    all.lots += found.lots.checked;
    all.orderLines += found.orderLines.checked;
    for (const { differences } of Object.values(found)) all.differences.push(...differences);
  }
  return all;
}

/** The last line that a person reads. */
export function sumUp({ bottles, lots, orderLines, differences }: Reconciled): string {
  const counted = [
    amount(bottles, 'bottle', 'bottles'),
    amount(lots, 'lot', 'lots'),
    amount(orderLines, 'order line', 'order lines'),
  ].join(', ');
  if (differences.length === 0) return `${counted}: all as folded.`;
  return `${counted}: ${amount(differences.length, 'difference', 'differences')}.`;
}

const amount = (count: number, one: string, many: string): string =>
  `${count.toLocaleString('en-GB')} ${count === 1 ? one : many}`;
