import type { INestApplicationContext } from '@nestjs/common';
import { generateHistory } from '@wetside/chemistry/testing';
import { cloneDatabase, type TestDatabase } from '@wetside/db/testing/clone';
import postgres from 'postgres';
import { reconcile } from '../../cli/reconcile/reconcile.js';
import { addPlayer } from '../../cli/prove-histories/house.js';
import { addCounts, playHistory } from '../../cli/prove-histories/player.js';
import { openProgram } from '../../cli/prove-histories/program.js';

const seeds = Array.from({ length: 25 }, (_, index) => index + 1);
const histories = seeds.map((seed) => generateHistory(seed, 40, 'Europe/Prague', 'recorded'));

let db: TestDatabase;
let app: INestApplicationContext;
let personId: string;
let counts: Record<string, number> = {};
let end = new Date(0);

beforeAll(async () => {
  db = await cloneDatabase();
  app = await openProgram(db);
  personId = await addPlayer(app);
}, 60_000);

afterAll(async () => {
  await app?.close();
  await db?.drop();
});

describe('25 random histories through the services', () => {
  it.each(histories)(
    'seed $seed: the database holds what memory folds',
    async (history) => {
      const played = await playHistory(app, personId, history);
      counts = addCounts(counts, played.counts);
      if (played.end > end) end = played.end;
      expect(played.differences).toEqual([]);
    },
    60_000,
  );

  it('held every kind of action that the program records, and the ways in which it can go wrong', () => {
    expect(counts).toMatchObject({ histories: 25 });
    for (const kind of ['mix', 'load', 'hold', 'release', 'discard', 'void'])
      expect(counts[kind]).toBeGreaterThan(15);
    expect(counts['late load']).toBeGreaterThan(50);
    expect(counts['load told for before the mix']).toBeGreaterThan(10);
    expect(counts['mix out of a stock bottle']).toBeGreaterThan(10);
  });

  it('are found as folded by reconcile', async () => {
    const found = await reconcile(db.adminUrl, end);
    expect(found.differences).toEqual([]);
    expect(found.bottles).toBe(counts.bottles);
  });

  it('are found out by reconcile where one roll goes missing', async () => {
    const sql = postgres(db.adminUrl, { max: 1 });
    try {
      await sql`
        update bottle_totals set totals = jsonb_set(totals, '{loads}', to_jsonb((totals ->> 'loads')::int + 1))
        where bottle_id = (select bottle_id from bottle_totals where in_use order by bottle_id limit 1)`;
    } finally {
      await sql.end();
    }
    expect((await reconcile(db.adminUrl, end)).differences).toEqual([
      expect.stringMatching(/: loads is stored as /),
    ]);
  });
});
