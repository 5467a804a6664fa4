import { isDeepStrictEqual } from 'node:util';
import type { INestApplicationContext } from '@nestjs/common';
import { fold, type BottleTotals } from '@wetside/chemistry';
import { documentOf, factsOf, type History, type HistoryStep } from '@wetside/chemistry/testing';
import { bottleTotals } from '@wetside/db';
import { eq } from 'drizzle-orm';
import { Clock } from '../../platform/clock/clock.js';
import { Database } from '../../platform/database/database.js';
import { tell } from './acts.js';
import { openHistoryHouse, type HistoryHouse } from './house.js';

/** What was played, by kind, and a sentence for each bottle whose stored totals are not the fold in memory. */
export interface Played {
  counts: Record<string, number>;
  differences: string[];
  /** The time by the program's clock when it was over. */
  end: Date;
}

/** Plays one history through the program's services at its own times, then folds it in memory and compares. */
export async function playHistory(
  app: INestApplicationContext,
  personId: string,
  history: History,
): Promise<Played> {
  const clock = app.get(Clock);
  const shortName = `seed-${history.seed}`;
  let now = startOf(history);
  setTo(clock, now);
  const house = await openHistoryHouse(app, { personId, shortName, zone: history.zone });
  const places = new Map<string, number>();
  for (const step of history.steps) {
    now = Math.max(now, Date.parse(timeOf(step)));
    setTo(clock, now);
    try {
      places.set(step.actionId, await tell(app, house, history, step, clock.nowIso()));
    } catch (error) {
      throw new Error(`${shortName}: ${JSON.stringify(step)} was refused`, { cause: error });
    }
  }
  return {
    counts: countsOf(history),
    differences: await compare(app, house, history, places),
    end: clock.now(),
  };
}

function setTo(clock: Clock, ms: number): void {
  clock.advance(ms - clock.now().getTime());
}

const timeOf = (step: HistoryStep): string =>
  step.kind === 'void' ? step.happenedAt : (step.facts[0]?.fact.happenedAt ?? '');

const startOf = (history: History): number =>
  Math.min(...history.steps.map((step) => Date.parse(timeOf(step)))) - 3_600_000;

async function compare(
  app: INestApplicationContext,
  { darkroomId, shortName }: HistoryHouse,
  history: History,
  places: ReadonlyMap<string, number>,
): Promise<string[]> {
  const rows = await app
    .get(Database)
    .inDarkroom({ darkroomId }, (tx) =>
      tx.select().from(bottleTotals).where(eq(bottleTotals.darkroomId, darkroomId)),
    );
  const stored = new Map(rows.map((row) => [row.bottleId, row]));
  if (stored.size !== history.bottles.length) {
    return [`${shortName}: ${stored.size} bottles are stored, ${history.bottles.length} were mixed.`];
  }
  return history.bottles.flatMap(({ id }) => {
    // The order within one instant is the server's own: its places go in before the fold.
    const facts = factsOf(history.steps, id).map((fact) => ({
      ...fact,
      seq: places.get(fact.actionId) ?? 0,
    }));
    const folded = fold(documentOf(history, id), facts);
    const row = stored.get(id);
    const same =
      isDeepStrictEqual(row?.totals, plain(folded)) &&
      row?.inUse === (folded !== null && folded.discardedAt === null) &&
      row.volumeUl === (folded?.volumeUl ?? 0);
    return same
      ? []
      : [`${shortName}, bottle ${id}: stored ${JSON.stringify(row)}, folded ${JSON.stringify(folded)}.`];
  });
}

const plain = (totals: BottleTotals | null): unknown => JSON.parse(JSON.stringify(totals));

function countsOf(history: History): Record<string, number> {
  const counts: Record<string, number> = {};
  const add = (kind: string, many = 1) => (counts[kind] = (counts[kind] ?? 0) + many);
  add('histories');
  add('bottles', history.bottles.length);
  for (const step of history.steps) {
    add('actions');
    add(step.kind === 'void' ? 'void' : step.what);
    if (step.kind === 'void') continue;
    if (step.late) add(`late ${step.what}`);
    if (step.toldAt) add('load told for before the mix');
    if (step.facts.some(({ fact }) => fact.kind === 'draw')) add('mix out of a stock bottle');
  }
  return counts;
}

/** Both together. */
export function addCounts(
  into: Record<string, number>,
  more: Record<string, number>,
): Record<string, number> {
  const all = { ...into };
  for (const [kind, many] of Object.entries(more)) all[kind] = (all[kind] ?? 0) + many;
  return all;
}
