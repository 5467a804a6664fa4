import { actions, darkrooms } from '@wetside/db';
import { eq, sql } from 'drizzle-orm';
import postgres from 'postgres';
import { v7 } from 'uuid';
import { Database } from '../platform/database/database.js';
import { LedgerHouse } from '../testing/ledger-house.js';
import { TestApp } from '../testing/test-app.js';
import { until } from '../testing/until.js';
import {
  Faulty,
  holding,
  jobsDone,
  letGo,
  LIMITS,
  POOL,
  SLACK,
  timed,
  type Timed,
} from './faulty.fixture.js';

let t: TestApp;
let house: LedgerHouse;
let faulty: Faulty;
let root: postgres.Sql;
let cookie: string;
let bottleId: string;
/** Loads that were answered, so that the end of it all can be counted. */
let answered = 0;

beforeAll(async () => {
  t = await TestApp.start({}, [], { background: false });
  house = await LedgerHouse.open(t, 'faults');
  ({ bottleId } = await house.mix(await t.signedIn(house.people.technician)));
  faulty = await Faulty.start(t);
  cookie = await faulty.cookieOf(house.people.member);
  root = postgres(t.db.superUrl, { onnotice: () => undefined });
});
afterAll(async () => {
  await root.end();
  await faulty.close();
  await t.close();
});
afterEach(async () => {
  letGo();
  await faulty.wire.mend();
  await until(async () => (await faulty.get('ready')).status === 200);
});

/** One load with an id of its own, to be sent as often as one likes. */
function aLoad() {
  const id = v7();
  const body = house.told(house.loadOf([bottleId]));
  return { id, send: () => faulty.put(house.url(`loads/${id}`), cookie, body) };
}

/** The same load again: recorded now, or found to have been. */
async function sentAgain({ id, send }: ReturnType<typeof aLoad>): Promise<void> {
  // A busy machine may refuse it once more; whoever was refused sends again.
  await until(async () => [200, 201].includes((await send()).status));
  expect((await send()).status).toBe(200);
  const rows = await t.database.inDarkroom({ darkroomId: house.id }, (tx) =>
    tx.select({ id: actions.id }).from(actions).where(eq(actions.id, id)),
  );
  expect(rows).toHaveLength(1);
  answered += 1;
}

function expectRefusal(answer: Timed, code: string, limitMs: number): void {
  expect(answer.body).toMatchObject({ status: 503, code });
  expect(answer.body.detail).toMatch(/Send it again|send it again/);
  expect([answer.status, answer.retryAfter]).toEqual([503, '2']);
  expect(answer.ms).toBeLessThan(limitMs + SLACK);
}

const sessions = (where = '') =>
  root.unsafe<{ pid: number }[]>(
    `select pid from pg_stat_activity where datname = '${t.db.name}' and application_name = 'wetside-api'
      and pid <> pg_backend_pid() ${where}`,
  );
const terminate = (where = '') =>
  root.unsafe(
    `select pg_terminate_backend(pid) from pg_stat_activity where datname = '${t.db.name}'
      and application_name = 'wetside-api' ${where}`,
  );

/** Somebody holds the bottle's row for as long as the work takes. */
async function whileHeld(work: () => Promise<void>): Promise<void> {
  await root.begin(async (sql) => {
    await sql`select 1 from bottle_totals where bottle_id = ${bottleId} for update`;
    await work();
  });
}

it('the limits go out with the connection and cost no statement', async () => {
  const names = ['lock_timeout', 'statement_timeout', 'idle_in_transaction_session_timeout'];
  const rows = await faulty.app
    .get(Database)
    .asIdentity((tx) =>
      tx.execute<{ setting: string }>(
        sql`select setting from pg_settings where name = any(string_to_array(${names.join()}, ',')) order by name`,
      ),
    );
  const { idle, lock, statement } = LIMITS;
  expect(rows.map(({ setting }) => Number(setting))).toEqual([idle, lock, statement]);
});

it('a row that somebody holds is waited for as long as the limit says, and the load counts once afterwards', async () => {
  const load = aLoad();
  await whileHeld(async () => {
    const answer = await timed(load.send());
    expectRefusal(answer, 'held-up', LIMITS.lock);
    expect(answer.ms).toBeGreaterThan(LIMITS.lock - 50);
  });
  await sentAgain(load);
});

it('a statement that takes too long is given up, and its connection serves the next', async () => {
  expectRefusal(await timed(faulty.get('faults/sleep/30')), 'too-slow', LIMITS.statement);
  await sentAgain(aLoad());
});

it('a transaction that stands idle is ended by the database; the server goes on', async () => {
  const idle = timed(faulty.get('faults/hold'));
  await until(() => holding() === 1);
  expectRefusal(await idle, 'interrupted', LIMITS.idle);
  // What comes late to a connection that is gone reaches nobody.
  letGo();
  await Promise.all(Array.from({ length: POOL }, () => sentAgain(aLoad())));
});

it('a connection that is cut off in the middle of a load is told of, and the load counts once afterwards', async () => {
  const load = aLoad();
  let answer: Promise<Timed> = Promise.reject(new Error('not sent'));
  answer.catch(() => undefined);
  await whileHeld(async () => {
    answer = timed(load.send());
    await until(async () => (await sessions(`and wait_event_type = 'Lock'`)).length === 1);
    await terminate(`and wait_event_type = 'Lock'`);
    expectRefusal(await answer, 'interrupted', LIMITS.lock);
  });
  await sentAgain(load);
});

it('all connections cut off again and again under loads: each load counts once', async () => {
  const loads = Array.from({ length: 9 }, aLoad);
  for (let round = 0; round < 3; round += 1) {
    const answers = loads.slice(round * 3, round * 3 + 3).map(({ send }) => timed(send()));
    await terminate();
    for (const { status } of await Promise.all(answers)) expect([200, 201, 503]).toContain(status);
  }
  for (const load of loads) await sentAgain(load);
});

it('with every connection taken, a request waits in line so long, then is told so', async () => {
  const holders = Array.from({ length: POOL }, () => timed(faulty.get('faults/hold')));
  await until(() => holding() === POOL);
  const load = aLoad();
  const [refused, ready, health] = await Promise.all([
    timed(load.send()),
    timed(faulty.get('ready')),
    timed(faulty.get('health')),
  ]);
  expectRefusal(refused, 'busy', LIMITS.wait);
  expect([ready.status, ready.retryAfter, health.status]).toEqual([503, '2', 200]);
  letGo();
  expect((await Promise.all(holders)).map(({ status }) => status)).toEqual(Array(POOL).fill(200));
  await sentAgain(load);
});

it('with the database away, every request is told at once, and all goes on by itself when it is back', async () => {
  const load = aLoad();
  await faulty.wire.cut();
  await timed(load.send());
  for (let i = 0; i < 6; i += 1) expectRefusal(await timed(load.send()), 'unavailable', 0);
  expect((await timed(faulty.get('ready'))).status).toBe(503);
  expect((await timed(faulty.get('health'))).status).toBe(200);
  await faulty.wire.mend();
  const back = await timed(load.send());
  expect(back.status).toBe(201);
  await sentAgain(load);
});

it('queue and sweep go on by themselves when the database is back', async () => {
  await faulty.enqueue();
  await until(() => jobsDone() > 0);
  await faulty.wire.cut();
  expect((await faulty.get('ready')).status).toBe(503);
  await faulty.wire.mend();
  const nextCheck = () =>
    t.database.asIdentity((tx) =>
      tx.select({ at: darkrooms.nextCheckAt }).from(darkrooms).where(eq(darkrooms.id, house.id)),
    );
  await root`update identity.darkrooms set next_check_at = ${new Date(0)} where id = ${house.id}`;
  await until(async () => (await nextCheck())[0]?.at?.getTime() !== 0);
  const before = jobsDone();
  await until(async () => (await faulty.get('ready')).status === 200);
  await faulty.enqueue();
  await until(() => jobsDone() > before);
});

it('with the database silent, requests are given up in time, old connections and new', async () => {
  const load = aLoad();
  faulty.wire.silence();
  const answers = await Promise.all(Array.from({ length: POOL }, () => timed(load.send())));
  for (const answer of answers) {
    expect(answer.status).toBe(503);
    expect(answer.ms).toBeLessThan(LIMITS.transaction + SLACK);
  }
  expectRefusal(await timed(load.send()), 'unavailable', LIMITS.wait * 2);
  await faulty.wire.mend();
  await until(async () => (await faulty.get('ready')).status === 200);
  await sentAgain(load);
});

it('after all of it the bottle holds what was answered, once each', async () => {
  const totals = await house.totals();
  expect(totals.get(bottleId)).toMatchObject({ loads: answered, usedE4: { film: answered * 10_000 } });
});
