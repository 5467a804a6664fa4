import { generateHistory } from '@wetside/chemistry/testing';
import { cloneDatabase, type TestDatabase } from '@wetside/db/testing/clone';
import { addPlayer } from './prove-histories/house.js';
import { addCounts, playHistory, type Played } from './prove-histories/player.js';
import { openProgram } from './prove-histories/program.js';
import { reconcile } from './reconcile/reconcile.js';

const STEPS = 40;
const ZONES = ['Europe/Prague', 'America/St_Johns', 'Pacific/Auckland', 'UTC'];
/** Programs side by side, each with a clock of its own, on one database. */
const PROGRAMS = 2;

/** Plays the next seed until none is left. */
async function playSome(db: TestDatabase, personId: string, next: () => number | null): Promise<Played> {
  const app = await openProgram(db);
  let all: Played = { counts: {}, differences: [], end: new Date(0) };
  try {
    for (let seed = next(); seed !== null; seed = next()) {
      const history = generateHistory(seed, STEPS, ZONES[seed % ZONES.length], 'recorded');
      all = together(all, await playHistory(app, personId, history));
      if (seed % 50 === 0) process.stderr.write(`  ${seed} histories\n`);
    }
  } finally {
    await app.close();
  }
  return all;
}

const together = (a: Played, b: Played): Played => ({
  counts: addCounts(a.counts, b.counts),
  differences: [...a.differences, ...b.differences],
  end: a.end > b.end ? a.end : b.end,
});

async function newPlayer(db: TestDatabase): Promise<string> {
  const app = await openProgram(db);
  try {
    return await addPlayer(app);
  } finally {
    await app.close();
  }
}

/** Plays so many seeded histories into a database of their own and prints what came of it as JSON. */
async function main(): Promise<void> {
  const wanted = Number(process.argv[2] ?? 1000);
  if (!Number.isInteger(wanted) || wanted < 1)
    throw new Error('Say how many histories: a whole number from 1.');
  const db = await cloneDatabase();
  try {
    const personId = await newPlayer(db);
    let last = 0;
    const next = (): number | null => (last < wanted ? (last += 1) : null);
    const programs = Array.from({ length: Math.min(PROGRAMS, wanted) }, () => playSome(db, personId, next));
    const played = (await Promise.all(programs)).reduce(together);
    const reconciled = await reconcile(db.adminUrl, played.end);
    process.stdout.write(`${JSON.stringify({ steps: STEPS, ...played, reconciled })}\n`);
    if (played.differences.length + reconciled.differences.length > 0) process.exitCode = 1;
  } finally {
    await db.drop();
  }
}

main().catch((error: unknown) => {
  for (let at = error; at instanceof Error; at = at.cause)
    process.stderr.write(`${at.stack ?? at.message}\n`);
  process.exitCode = 1;
});
