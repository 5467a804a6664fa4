import { actions, loads } from '@wetside/db';
import { eq } from 'drizzle-orm';
import postgres from 'postgres';
import request from 'supertest';
import { v7 } from 'uuid';
import { reconcile } from '../../cli/reconcile/reconcile.js';
import { BuiltServer, builtProgram, Mutant } from '../../testing/built-server.js';
import { HOUR, LedgerHouse } from '../../testing/ledger-house.js';
import { ORIGIN, PASSPHRASE, TestApp } from '../../testing/test-app.js';

const LOADS = 40;
/** Bottles in crossing orders: whoever locked in the order told would meet another coming. */
const ORDERS = [
  [0, 1, 2],
  [2, 0],
  [1, 3, 0],
  [3, 2, 1, 0],
  [0, 3],
  [2, 1],
  [3, 0, 2],
  [1, 0],
];
const LIMIT_MS = 180_000;

interface Told {
  id: string;
  body: object;
  bottleIds: string[];
  rolls: number;
}

/** 40 loads: rolls of 1 to 3, a third of them told for a time before others. */
function tell(house: LedgerHouse, bottleIds: string[]): Told[] {
  const now = house.t.clock.now().getTime();
  return Array.from({ length: LOADS }, (_, index) => {
    const through = (ORDERS[index % ORDERS.length] ?? []).map((at) => bottleIds[at] ?? '');
    const rolls = 1 + (index % 3);
    const happenedAt = new Date(index % 3 === 0 ? now - index * 1_000 : now);
    return {
      id: v7(),
      body: house.told(house.loadOf(through, rolls), { happenedAt }),
      bottleIds: through,
      rolls,
    };
  });
}

async function cookieOf(t: TestApp, email: string): Promise<string> {
  const { headers } = await t
    .browser()
    .post('/api/sign-in')
    .send({ email, passphrase: PASSPHRASE })
    .expect(200);
  const set = headers['set-cookie'] as unknown as string[];
  return set.map((line) => line.split(';')[0] ?? '').join('; ');
}

/** Each load to both servers, all begun before any is awaited. @returns the two statuses by load */
async function sendAll(
  servers: BuiltServer[],
  house: LedgerHouse,
  cookie: string,
  told: Told[],
): Promise<Map<string, number[]>> {
  const sent = told.flatMap(({ id, body }) =>
    servers.map(async ({ url }) => {
      const answer = await request(url)
        .put(house.url(`loads/${id}`))
        .set('cookie', cookie)
        .set('origin', ORIGIN)
        .send(body);
      return { id, status: answer.status };
    }),
  );
  const statuses = new Map<string, number[]>(told.map(({ id }) => [id, []]));
  for (const { id, status } of await Promise.all(sent)) statuses.get(id)?.push(status);
  return statuses;
}

/** Everything that would be wrong after those loads, in sentences; nothing when each was counted once. */
async function complaints(
  t: TestApp,
  house: LedgerHouse,
  told: Told[],
  statuses: Map<string, number[]>,
): Promise<string[]> {
  const found = [...statuses].flatMap(([id, both]) =>
    [...both].sort().join() === '200,201' ? [] : [`load ${id} was answered ${both.join(' and ')}`],
  );
  const counted = await t.database.inDarkroom({ darkroomId: house.id }, async (tx) => ({
    actions: (await tx.select().from(actions).where(eq(actions.kind, 'load'))).length,
    loads: (await tx.select().from(loads)).length,
  }));
  if (counted.actions !== LOADS || counted.loads !== LOADS) {
    found.push(`${LOADS} loads are kept as ${counted.actions} actions and ${counted.loads} loads`);
  }
  for (const [bottleId, totals] of await house.totals()) {
    const through = told.filter(({ bottleIds }) => bottleIds.includes(bottleId));
    const rolls = through.reduce((sum, load) => sum + load.rolls, 0);
    const used = (totals?.usedE4.film ?? 0) / 10_000;
    if (used !== rolls) found.push(`a bottle counts ${used} rolls after ${rolls}`);
    if (totals?.loads !== through.length)
      found.push(`a bottle counts ${totals?.loads} loads after ${through.length}`);
  }
  const { differences } = await reconcile(t.db.adminUrl, t.clock.now());
  return [...found, ...differences.map((text) => `reconcile: ${text}`)];
}

/** The whole check on a database of its own: two processes of that program, after that change to the database. */
async function check(folder: string, change?: (sql: postgres.Sql) => Promise<unknown>): Promise<string[]> {
  const t = await TestApp.start({ SWEEP_S: '3600' });
  const servers: BuiltServer[] = [];
  try {
    const house = await LedgerHouse.open(t, 'crossing');
    const technician = await t.signedIn(house.people.technician);
    const bottleIds: string[] = [];
    for (let count = 0; count < 4; count += 1) {
      const happenedAt = new Date(t.clock.now().getTime() - HOUR);
      bottleIds.push((await house.mix(technician, { happenedAt })).bottleId);
    }
    if (change) await asSuper(t, change);
    const cookie = await cookieOf(t, house.people.member.email);
    servers.push(...(await Promise.all([1, 2].map(() => BuiltServer.start(folder, t.db)))));
    const told = tell(house, bottleIds);
    return await complaints(t, house, told, await sendAll(servers, house, cookie, told));
  } finally {
    await Promise.all(servers.map((server) => server.stop()));
    await t.close();
  }
}

async function asSuper(t: TestApp, change: (sql: postgres.Sql) => Promise<unknown>): Promise<void> {
  const sql = postgres(t.db.superUrl, { max: 1, onnotice: () => undefined });
  try {
    await change(sql);
  } finally {
    await sql.end();
  }
}

describe('40 loads, each sent to two servers at once', () => {
  it(
    'are counted once each, whatever order their bottles come in',
    async () => {
      expect(await check(builtProgram())).toEqual([]);
    },
    LIMIT_MS,
  );
});

describe('the same check is red', () => {
  it(
    'without the row lock: loads overwrite one another',
    async () => {
      const lock = ".for('no key update', { of: bottleTotals })";
      const mutant = await Mutant.make('features/bottles/bottles.repository.js', lock);
      try {
        const found = await check(mutant.folder);
        expect(found).toContainEqual(expect.stringMatching(/^a bottle counts \d+ rolls after \d+$/));
        expect(found).toContainEqual(expect.stringMatching(/^reconcile: .* is stored as /));
      } finally {
        await mutant.remove();
      }
    },
    LIMIT_MS,
  );

  it(
    'without the unique key of actions: a load sent twice is answered with an error',
    async () => {
      const found = await check(
        builtProgram(),
        (sql) => sql`alter table actions drop constraint actions_pk cascade`,
      );
      expect(found).toContainEqual(expect.stringMatching(/^load \S+ was answered .*500/));
    },
    LIMIT_MS,
  );

  it(
    'without any unique key of a load: it is counted twice',
    async () => {
      const found = await check(builtProgram(), async (sql) => {
        await sql`alter table actions drop constraint actions_pk cascade`;
        await sql`alter table loads drop constraint loads_pk cascade`;
        await sql`alter table load_film drop constraint load_film_pk`;
        await sql`alter table load_steps drop constraint load_steps_pk`;
      });
      expect(found).toContainEqual(expect.stringMatching(/^40 loads are kept as \d+ actions and \d+ loads$/));
      expect(found).toContainEqual(expect.stringMatching(/^a bottle counts \d+ rolls after \d+$/));
    },
    LIMIT_MS,
  );
});
