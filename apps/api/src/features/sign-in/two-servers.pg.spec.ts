import { rateCounters } from '@wetside/db';
import { eq } from 'drizzle-orm';
import request, { type Response } from 'supertest';
import { BuiltServer, builtProgram, Mutant } from '../../testing/built-server.js';
import { cookieAfter } from '../../testing/signed-cookie.js';
import { PASSPHRASE, TestApp, type TestPerson } from '../../testing/test-app.js';

const OWN_PAGES = { 'sec-fetch-site': 'same-origin' };
const WRONG = 'not the right passphrase';

let t: TestApp;
let ada: TestPerson;
let one: BuiltServer;
let two: BuiltServer;

beforeAll(async () => {
  t = await TestApp.start({}, [], { background: false });
  ada = await t.person('Ada Twice');
  [one, two] = await Promise.all([
    BuiltServer.start(builtProgram(), t.db),
    BuiltServer.start(builtProgram(), t.db),
  ]);
}, 60_000);
beforeEach(() => t.database.asIdentity((tx) => tx.delete(rateCounters)));
afterAll(async () => {
  await Promise.all([one.stop(), two.stop()]);
  await t.close();
});

const signIn = (server: BuiltServer, email: string, passphrase = PASSPHRASE, more: object = {}) =>
  request(server.url)
    .post('/api/sign-in')
    .set({ ...OWN_PAGES, ...more })
    .send({ email, passphrase });
const refresh = (server: BuiltServer, cookie: string) =>
  request(server.url)
    .post('/api/sign-in/refresh')
    .set({ ...OWN_PAGES, cookie });
const me = (server: BuiltServer, cookie: string) => request(server.url).get('/api/me').set({ cookie });
const statuses = (answers: readonly Response[]) => answers.map(({ status }) => status).sort();

/** Twelve wrong tries at one person at once, half of them at each server. */
const crowd = (email: string) =>
  Promise.all(Array.from({ length: 12 }, (_, i) => signIn(i % 2 ? one : two, email, WRONG)));

describe('two servers on one database', () => {
  it('count tries together, and after a restart as before it', async () => {
    const bo = await t.person('Bo Aimed');
    expect(statuses(await crowd(bo.email))).toEqual([
      ...Array<number>(3).fill(401),
      ...Array<number>(9).fill(429),
    ]);
    // As after twenty wrong tries: the next one has to wait for as long as anybody ever does.
    await t.database.asIdentity((tx) =>
      tx.update(rateCounters).set({ count: 20, blockedUntil: new Date(t.clock.now().getTime() + 900_000) }),
    );
    await one.stop();
    one = await BuiltServer.start(builtProgram(), t.db);
    for (const server of [one, two]) {
      const refused = await signIn(server, bo.email).expect(429);
      expect(Number(refused.headers['retry-after'])).toBeGreaterThan(880);
      expect(refused.body.code).toBe('too-many');
    }
  }, 60_000);

  it('count a network address together, whatever a client says it was forwarded for', async () => {
    const guess = (i: number) =>
      signIn(i % 2 ? one : two, `guess-${i}@darkroom.example`, WRONG, { 'x-forwarded-for': `192.0.2.${i}` });
    await guess(0).expect(401);
    await t.database.asIdentity((tx) =>
      tx.update(rateCounters).set({ count: 28 }).where(eq(rateCounters.subject, 'sign-in:address')),
    );
    const answers = await Promise.all([1, 2, 3, 4, 5, 6].map(guess));
    expect(statuses(answers)).toEqual([401, 401, 429, 429, 429, 429]);
  }, 60_000);

  it('let two tabs refresh at once, both into the one session', async () => {
    const cookie = cookieAfter(await signIn(one, ada.email).expect(200));
    const tabs = await Promise.all([one, two, one, two].map((server) => refresh(server, cookie)));
    expect(statuses(tabs)).toEqual([204, 204, 204, 204]);
    for (const tab of tabs) await me(two, cookieAfter(tab)).expect(200);
    // One family: signing out in any of them ends all.
    const [first, second] = tabs.map(cookieAfter);
    const out = { ...OWN_PAGES, cookie: first ?? '' };
    await request(two.url).post('/api/sign-out').set(out).expect(204);
    await me(one, second ?? '').expect(401);
    await refresh(one, second ?? '').expect(401);
  });

  it('keep a token good while its answer may have been lost, at the other server too', async () => {
    const cookie = cookieAfter(await signIn(one, ada.email).expect(200));
    await refresh(one, cookie).expect(204);
    const again = cookieAfter(await refresh(two, cookie).expect(204));
    await refresh(one, again).expect(204);
  });

  it('end the session, old access and all, when a superseded token comes to the other', async () => {
    const { before, after } = await reuse(one, two);
    expect(before).toBe(200);
    expect(after).toEqual({ reused: 401, access: 401, firstAccess: 401, newest: 401 });
  });
});

/** Uses a token, its successor and the token again. What opens before, and what afterwards. */
async function reuse(here: BuiltServer, there: BuiltServer) {
  const first = cookieAfter(await signIn(here, ada.email).expect(200));
  const second = cookieAfter(await refresh(here, first).expect(204));
  const third = cookieAfter(await refresh(here, second).expect(204));
  const before = (await me(there, third)).status;
  const reused = (await refresh(there, first)).status;
  const after = {
    reused,
    access: (await me(here, third)).status,
    firstAccess: (await me(here, first)).status,
    newest: (await refresh(here, third)).status,
  };
  return { before, after };
}

it('mutant: without the session’s end a copied token is refused and its thief’s successors live on', async () => {
  const mutant = await Mutant.make(
    'platform/auth/sessions.js',
    "await this.repository.end(tx, session.id, 'reuse', now);",
  );
  const server = await BuiltServer.start(mutant.folder, t.db);
  try {
    const { after } = await reuse(server, server);
    expect(after).toEqual({ reused: 401, access: 200, firstAccess: 200, newest: 204 });
  } finally {
    await server.stop();
    await mutant.remove();
  }
}, 60_000);
