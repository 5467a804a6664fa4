import { memberships, rateCounters } from '@wetside/db';
import { sql } from 'drizzle-orm';
import { TestApp, type TestPerson } from '../../testing/test-app.js';
import { isUniqueViolation, sqlState } from './sql-errors.js';

let t: TestApp;
let ada: TestPerson;
let bo: TestPerson;
let adas: string;
let bos: string;

beforeAll(async () => {
  t = await TestApp.start();
  ada = await t.person('Ada');
  bo = await t.person('Bo');
  adas = await t.darkroom('riverside', ada);
  bos = await t.darkroom('hillside', bo);
});
afterAll(() => t.close());

const thrownBy = (work: Promise<unknown>): Promise<unknown> =>
  work.then(
    () => null,
    (error: unknown) => error,
  );

describe('a transaction', () => {
  it('sees the darkroom it is in, and no other', async () => {
    const rows = await t.database.inDarkroom({ darkroomId: adas }, (tx) => tx.select().from(memberships));
    expect(rows.map(({ displayName }) => displayName)).toEqual(['Ada']);
    const shut = await thrownBy(
      t.database.inDarkroom({ darkroomId: adas }, (tx) =>
        tx.insert(memberships).values({
          darkroomId: bos,
          id: adas,
          personId: ada.personId,
          role: 'manager',
          displayName: 'Ada',
          joinedAt: t.clock.now(),
        }),
      ),
    );
    expect(sqlState(shut)).toBe('42501');
  });

  it('of identity sees no darkroom, and that of a person their own memberships', async () => {
    expect(await t.database.asIdentity((tx) => tx.select().from(memberships))).toEqual([]);
    const own = await t.database.asPerson(bo.personId, (tx) => tx.select().from(memberships));
    expect(own.map(({ darkroomId }) => darkroomId)).toEqual([bos]);
  });

  it('leaves nothing behind on its connection', async () => {
    for (let i = 0; i < 20; i += 1) {
      await t.database.inDarkroom({ darkroomId: adas, personId: ada.personId }, (tx) =>
        tx.execute(sql`select 1`),
      );
      expect(await t.database.asIdentity((tx) => tx.select().from(memberships))).toEqual([]);
    }
  });

  it('that only reads cannot write', async () => {
    const write = t.database.asIdentity((tx) => tx.delete(rateCounters), { readOnly: true });
    expect(sqlState(await thrownBy(write))).toBe('25006');
  });

  it('is all or nothing', async () => {
    const key = { subject: 'test', windowStart: t.clock.now(), count: 1 };
    await thrownBy(
      t.database.asIdentity(async (tx) => {
        await tx.insert(rateCounters).values({ ...key, key: 'first' });
        throw new Error('spilt');
      }),
    );
    expect(await t.database.asIdentity((tx) => tx.select().from(rateCounters))).toEqual([]);
  });
});

describe('a deadlock', () => {
  it('is tried again from the start, in one place', async () => {
    const counter = (key: string) => ({ subject: 'deadlock', key, windowStart: t.clock.now(), count: 0 });
    await t.database.asIdentity((tx) => tx.insert(rateCounters).values([counter('a'), counter('b')]));
    const lock = (key: string) =>
      sql`update identity.rate_counters set count = count + 1 where subject = 'deadlock' and key = ${key}`;
    let runs = 0;
    let met = () => {};
    const bothHoldOne = new Promise<void>((go) => (met = go));
    let holding = 0;
    const cross = (first: string, second: string) =>
      t.database.asIdentity(async (tx) => {
        runs += 1;
        await tx.execute(lock(first));
        if ((holding += 1) === 2) met();
        await bothHoldOne;
        await tx.execute(lock(second));
      });
    await Promise.all([cross('a', 'b'), cross('b', 'a')]);
    const rows = await t.database.asIdentity((tx) =>
      tx.select({ count: rateCounters.count }).from(rateCounters),
    );
    expect(rows).toEqual([{ count: 2 }, { count: 2 }]);
    expect(runs).toBe(3);
  });

  it('is given up after the third try, and other failures at once', async () => {
    let runs = 0;
    const failing = (code: string) =>
      thrownBy(
        t.database.asIdentity((tx) => {
          runs += 1;
          return tx.execute(
            sql`do ${sql.raw(`$$ begin raise exception 'made up' using errcode = '${code}'; end $$`)}`,
          );
        }),
      );
    expect(sqlState(await failing('40001'))).toBe('40001');
    expect(runs).toBe(3);
    expect(sqlState(await failing('23514'))).toBe('23514');
    expect(runs).toBe(4);
  });
});

it('a unique violation is known by its constraint', async () => {
  const row = { subject: 'twice', key: 'k', windowStart: t.clock.now(), count: 0 };
  const error = await thrownBy(t.database.asIdentity((tx) => tx.insert(rateCounters).values([row, row])));
  expect(isUniqueViolation(error, 'rate_counters_pk')).toBe(true);
  expect(isUniqueViolation(error, 'actions_pk')).toBe(false);
});
