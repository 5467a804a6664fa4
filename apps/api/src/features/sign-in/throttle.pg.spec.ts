import { rateCounters } from '@wetside/db';
import { and, eq } from 'drizzle-orm';
import request from 'supertest';
import type { Tx } from '../../platform/database/database.js';
import { Throttle } from '../../platform/auth/throttle.js';
import { PASSPHRASE, TestApp, type TestPerson } from '../../testing/test-app.js';

let t: TestApp;
beforeAll(async () => {
  t = await TestApp.start();
});
beforeEach(() => t.database.asIdentity((tx) => tx.delete(rateCounters)));
afterAll(() => t.close());

const WRONG = 'not the right passphrase';
const tryOnce = (email: string, passphrase = WRONG) =>
  request(t.app.getHttpServer())
    .post('/api/sign-in')
    .set('sec-fetch-site', 'same-origin')
    .send({ email, passphrase });

async function fail(person: TestPerson, times: number): Promise<void> {
  for (let i = 0; i < times; i += 1) await tryOnce(person.email).expect(401);
}

describe('guessing', () => {
  it('is slowed more and more, whoever asks, and never locks anybody out', async () => {
    const eve = await t.person('Eve Guess');
    await fail(eve, 3);
    for (const delay of [1, 2, 4, 8]) {
      const refused = await tryOnce(eve.email, PASSPHRASE).expect(429);
      expect(refused.body.code).toBe('too-many');
      expect(refused.headers['retry-after']).toBe(String(delay));
      t.clock.advance(delay * 1000);
      await tryOnce(eve.email).expect(401);
    }
    t.clock.advance(16_000);
    await tryOnce(eve.email, PASSPHRASE).expect(200);
    await fail(eve, 3);
  });

  it('is slowed alike at an address that is not known', async () => {
    for (let i = 0; i < 3; i += 1) await tryOnce('unknown@darkroom.example').expect(401);
    const refused = await tryOnce('Unknown@darkroom.example').expect(429);
    expect(refused.headers['retry-after']).toBe('1');
  });

  it('does not keep out the device the person has used before', async () => {
    const fay = await t.person('Fay Known');
    const own = await t.signedIn(fay);
    await fail(fay, 3);
    await tryOnce(fay.email, PASSPHRASE).expect(429);
    await own.post('/api/sign-in').send({ email: fay.email, passphrase: PASSPHRASE }).expect(200);
  });

  it('gains nothing by asking many at once', async () => {
    const gil = await t.person('Gil Many');
    const answers = await Promise.all(Array.from({ length: 12 }, () => tryOnce(gil.email)));
    expect(answers.filter(({ status }) => status === 401)).toHaveLength(3);
    expect(answers.filter(({ status }) => status === 429)).toHaveLength(9);
  });

  it('stops for a network address after 30 wrong tries in 15 minutes, whatever it says it was forwarded for', async () => {
    const hal = await t.person('Hal Last');
    for (let i = 0; i < 30; i += 1) await tryOnce(`guess-${i}@darkroom.example`).expect(401);
    const refused = await tryOnce(hal.email, PASSPHRASE).set('x-forwarded-for', '192.0.2.7').expect(429);
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(880);
    t.clock.advance(15 * 60_000);
    await tryOnce(hal.email, PASSPHRASE).expect(200);
  });

  it('does not count those who get in', async () => {
    const ina = await t.person('Ina Often');
    for (let i = 0; i < 35; i += 1) await tryOnce(ina.email, PASSPHRASE).expect(200);
  });
});

/** Throttle's own way to its counters. */
interface Locking {
  lock(tx: Tx, subject: string, key: string, now: Date): Promise<typeof rateCounters.$inferSelect>;
}

it('mutant: without the lock on a counter’s row a crowd counts as one try', async () => {
  const jo = await t.person('Jo Crowd');
  await fail(jo, 2);
  let reading = 0;
  let letGo = (): void => undefined;
  const allRead = new Promise<void>((go) => (letGo = go));
  const lock = jest
    .spyOn(t.app.get<Throttle, Locking>(Throttle), 'lock')
    .mockImplementation(async (tx, subject, key) => {
      const where = and(eq(rateCounters.subject, subject), eq(rateCounters.key, key));
      const [row] = await tx.select().from(rateCounters).where(where);
      if (!row) throw new Error('There is no such counter.');
      // Two counters a try, four tries: nobody writes before all have read.
      reading += 1;
      if (subject === 'sign-in:person') return row;
      if (reading === 8) letGo();
      await allRead;
      return row;
    });
  const answers = await Promise.all([1, 2, 3, 4].map(() => tryOnce(jo.email)));
  lock.mockRestore();
  expect(answers.map(({ status }) => status)).toEqual([401, 401, 401, 401]);
  await tryOnce(jo.email).expect(429);
});
