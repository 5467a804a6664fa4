import { execFile } from 'node:child_process';
import { join } from 'node:path';
import postgres from 'postgres';
import { builtProgram } from '../../testing/built-server.js';
import { LedgerHouse } from '../../testing/ledger-house.js';
import { StockHouse } from '../../testing/stock-house.js';
import { TestApp } from '../../testing/test-app.js';
import { reconcile, sumUp } from './reconcile.js';

let t: TestApp;
let sql: postgres.Sql;

beforeAll(async () => {
  t = await TestApp.start({ SWEEP_S: '3600' });
  const house = await LedgerHouse.open(t, 'riverside');
  const technician = await t.signedIn(house.people.technician);
  const { bottleId } = await house.mix(technician);
  await house.put(technician, 'loads', house.loadOf([bottleId], 3)).expect(201);
  const shelf = await StockHouse.open(t, 'hillside');
  const { lotId } = await shelf.receive(shelf.concentrate, 3);
  await shelf.mix({ kind: 'lot', lotId }, 1_000_000).expect(201);
  await shelf.draft();
  sql = postgres(t.db.adminUrl, { max: 1, onnotice: () => undefined });
}, 60_000);

afterAll(async () => {
  await sql?.end();
  await t?.close();
});

const differences = async (): Promise<string[]> =>
  (await reconcile(t.db.adminUrl, t.clock.now())).differences;

/** What reconcile says with one stored figure made false; the figure is put right again. */
async function after(falsify: () => Promise<unknown>, mend: () => Promise<unknown>): Promise<string[]> {
  await falsify();
  try {
    return await differences();
  } finally {
    await mend();
  }
}

describe('reconcile', () => {
  it('finds all as folded over every darkroom', async () => {
    const found = await reconcile(t.db.adminUrl, t.clock.now());
    expect(sumUp(found)).toBe('2 bottles, 1 lot, 2 order lines: all as folded.');
  });

  it('says which running figure of a bottle is not what happened', async () => {
    const [row] = await sql`
      select t.darkroom_id, t.bottle_id, t.totals, t.next_look_at from bottle_totals t
      join bottles b using (darkroom_id) where b.id = t.bottle_id and (t.totals ->> 'loads')::int = 1`;
    const mend = () => sql`
      update bottle_totals set totals = ${sql.json(row?.totals as postgres.JSONValue)}, in_use = true,
        volume_ul = 1000000, next_look_at = ${row?.next_look_at as Date} where bottle_id = ${row?.bottle_id as string}`;
    const set = (change: postgres.PendingQuery<postgres.Row[]>) => () =>
      sql`update bottle_totals set ${change} where bottle_id = ${row?.bottle_id as string}`;
    expect(await after(set(sql`totals = jsonb_set(totals, '{usedE4,film}', '20000')`), mend)).toEqual([
      'riverside, FX-01: usedE4 is stored as {"film":20000} and folded as {"film":30000}.',
    ]);
    expect(await after(set(sql`in_use = false`), mend)).toEqual([
      'riverside, FX-01: in use is stored as false and folded as true.',
    ]);
    expect(await after(set(sql`volume_ul = 1`), mend)).toEqual([
      'riverside, FX-01: the volume column is stored as 1 and folded as 1000000.',
    ]);
    expect(await after(set(sql`next_look_at = '2099-01-01'`), mend)).toEqual([
      expect.stringMatching(
        /^riverside, FX-01: the next look is stored as "2099-01-01T00:00:00.000Z" and folded as /,
      ),
    ]);
    expect(await after(set(sql`next_look_at = '2020-01-01'`), mend)).toEqual([]);
    expect(await differences()).toEqual([]);
  });

  it('says which lot, opened pack, order line or counter is not the sum of what happened', async () => {
    expect(
      await after(
        () => sql`update lots set unopened = unopened + 1`,
        () => sql`update lots set unopened = unopened - 1`,
      ),
    ).toEqual(['hillside, lot 0611: unopened packs are stored as 3, and what happened adds up to 2.']);
    expect(
      await after(
        () => sql`update opened_packs set left_ul = left_ul - 1`,
        () => sql`update opened_packs set left_ul = left_ul + 1`,
      ),
    ).toEqual([
      expect.stringMatching(
        /^hillside, opened pack of \S+, lot 0611: µL left are stored as 799999, .* 800000\.$/,
      ),
    ]);
    expect(
      await after(
        () => sql`update order_lines set received = 1 where position = 1`,
        () => sql`update order_lines set received = 0`,
      ),
    ).toEqual(['hillside, order 1, line 1: packs received are stored as 1, and what happened adds up to 0.']);
    expect(
      await after(
        () => sql`update counters set last = 7 where name = 'FX'`,
        () => sql`update counters set last = 1 where name = 'FX'`,
      ),
    ).toEqual([
      'hillside, counter FX: it stands at 7, and 1 was given out.',
      'riverside, counter FX: it stands at 7, and 1 was given out.',
    ]);
    expect(await differences()).toEqual([]);
  });

  it('as a command ends with 0 or with 1', async () => {
    expect(await command()).toEqual({ code: 0, said: '2 bottles, 1 lot, 2 order lines: all as folded.\n' });
    await sql`update lots set unopened = unopened + 1`;
    const { code, said } = await command();
    expect(code).toBe(1);
    expect(said.split('\n')).toEqual([
      expect.stringMatching(/^hillside, lot 0611/),
      '2 bottles, 1 lot, 2 order lines: 1 difference.',
      '',
    ]);
  });
});

/** The built command, as `npm run reconcile` runs it. */
function command(): Promise<{ code: number; said: string }> {
  const program = join(builtProgram(), 'cli/reconcile.js');
  const env = { PATH: process.env.PATH, DATABASE_ADMIN_URL: t.db.adminUrl };
  return new Promise((resolve) => {
    const child = execFile(process.execPath, [program], { env }, (_error, said) =>
      resolve({ code: child.exitCode ?? -1, said }),
    );
  });
}
