import { refreshTokens, sessions } from '@wetside/db';
import { eq } from 'drizzle-orm';
import request, { type Response } from 'supertest';
import { Passphrases } from '../../platform/auth/passphrases.js';
import type { Turnstile } from '../../platform/turnstile/turnstile.js';
import { ORIGIN, PASSPHRASE, TestApp, type TestPerson } from '../../testing/test-app.js';

let t: TestApp;
let ada: TestPerson;
let darkroomId: string;

beforeAll(async () => {
  t = await TestApp.start();
  ada = await t.person('Ada Sink');
  darkroomId = await t.darkroom('riverside', ada);
});
afterAll(() => t.close());

const server = () => t.app.getHttpServer();

/** The cookies an answer sets, name to value. */
function cookiesOf(response: Response): Map<string, string> {
  const lines: unknown = response.get('set-cookie');
  const pairs = (Array.isArray(lines) ? lines : []).map(
    (line) => String(line).split(';')[0]?.split('=') ?? [],
  );
  return new Map(pairs.map(([name, value]) => [name ?? '', value ?? '']));
}

const refreshOf = (response: Response) =>
  `wetside-refresh-55500=${cookiesOf(response).get('wetside-refresh-55500') ?? ''}`;
const accessOf = (response: Response) =>
  `wetside-access-55500=${cookiesOf(response).get('wetside-access-55500') ?? ''}`;

function signIn(email: string, passphrase = PASSPHRASE) {
  return request(server())
    .post('/api/sign-in')
    .set('sec-fetch-site', 'same-origin')
    .send({ email, passphrase });
}

function refresh(cookie: string) {
  return request(server())
    .post('/api/sign-in/refresh')
    .set('sec-fetch-site', 'same-origin')
    .set('cookie', cookie);
}

const me = (cookie: string) => request(server()).get('/api/me').set('cookie', cookie);

describe('signing in', () => {
  it('answers with the person and their darkrooms, and keeps the tokens out of the body', async () => {
    const response = await signIn(' ADA.sink@darkroom.example').expect(200);
    expect(response.body).toEqual({
      person: { id: ada.personId, name: 'Ada Sink' },
      darkrooms: [
        { id: darkroomId, shortName: 'riverside', name: 'The riverside darkroom', role: 'manager' },
      ],
    });
    for (const value of cookiesOf(response).values()) expect(response.text).not.toContain(value);
    for (const line of response.get('set-cookie') ?? [])
      expect(line).toMatch(/; Path=\/; .*HttpOnly; SameSite=Lax$/);
  });

  it('shows who is signed in and the server’s time', async () => {
    const browser = await t.signedIn(ada);
    const response = await browser.get('/api/me').expect(200);
    expect(response.body).toMatchObject({
      person: { name: 'Ada Sink' },
      darkrooms: [{ shortName: 'riverside' }],
    });
    expect(response.headers['x-wetside-now']).toMatch(/^\d{4}-.*Z$/);
    expect(response.headers['cache-control']).toBe('no-store');
  });

  it('gives other tokens each time and ends the session the browser had', async () => {
    const first = await signIn(ada.email).expect(200);
    const second = await signIn(ada.email)
      .set('cookie', `${refreshOf(first)}; ${accessOf(first)}`)
      .expect(200);
    expect(refreshOf(second)).not.toBe(refreshOf(first));
    await me(accessOf(first)).expect(401);
    await me(accessOf(second)).expect(200);
  });

  it('says the same for a wrong passphrase as for an address that is not known', async () => {
    const wrong = await signIn(ada.email, 'not the right passphrase').expect(401);
    const unknown = await signIn('nobody@darkroom.example').expect(401);
    expect(wrong.body.code).toBe('sign-in-refused');
    expect(unknown.body).toEqual(wrong.body);
    expect(wrong.headers['content-type']).toContain('application/problem+json');
    expect(wrong.get('set-cookie')).toBeUndefined();
  });

  it('works as long for an address that is not known: one hash each', async () => {
    await signIn('nobody@darkroom.example').expect(401);
    // Each hash goes through the one gate that keeps them few at a time.
    const gate = Reflect.get(t.app.get(Passphrases), 'turnstile') as Turnstile;
    const hashes = jest.spyOn(gate, 'pass');
    await signIn('nobody.either@darkroom.example').expect(401);
    expect(hashes).toHaveBeenCalledTimes(1);
    await signIn(ada.email, 'not the right passphrase').expect(401);
    expect(hashes).toHaveBeenCalledTimes(2);
    hashes.mockRestore();
  });

  it('takes a passphrase as it is: another last character, case or end is another passphrase', async () => {
    for (const other of [
      `${PASSPHRASE}.`,
      PASSPHRASE.slice(0, -1),
      PASSPHRASE.toUpperCase(),
      ` ${PASSPHRASE}`,
    ]) {
      const guest = await t.person(`Guest ${other.length} ${other.codePointAt(0) ?? 0}`);
      await signIn(guest.email, other).expect(401);
    }
  });

  it('names the fields that were wrong', async () => {
    const response = await signIn('ada').send({ role: 'manager' }).expect(400);
    expect(response.body).toMatchObject({ code: 'invalid' });
    expect(response.body.errors.map(({ field }: { field: string }) => field)).toEqual(['role', 'email']);
  });

  it('stores argon2id with the asked parameters, and of a refresh token only its digest', async () => {
    const token = refreshOf(await signIn(ada.email).expect(200)).split('=')[1] ?? '';
    expect(Buffer.from(token, 'base64url')).toHaveLength(32);
    const rows = await t.database.asIdentity((tx) => tx.select().from(refreshTokens));
    expect(JSON.stringify(rows)).not.toContain(token);
    const person = await t.database.asIdentity((tx) => tx.query.credentials.findFirst());
    expect(person?.passphraseHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });
});

describe('refreshing', () => {
  it('turns a refresh token into new ones', async () => {
    const first = await signIn(ada.email);
    const second = await refresh(refreshOf(first)).expect(204);
    await me(accessOf(second)).expect(200);
    await refresh(refreshOf(second)).expect(204);
  });

  it('keeps the old token good until its successor is used, for an answer may be lost', async () => {
    const first = await signIn(ada.email);
    await refresh(refreshOf(first)).expect(204);
    const again = await refresh(refreshOf(first)).expect(204);
    await refresh(refreshOf(again)).expect(204);
  });

  it('ends the whole session when a token comes back after its successor was used', async () => {
    const first = await signIn(ada.email);
    const second = await refresh(refreshOf(first));
    const third = await refresh(refreshOf(second)).expect(204);
    const reuse = await refresh(refreshOf(first)).expect(401);
    expect(reuse.body.code).toBe('signed-out');
    await refresh(refreshOf(third)).expect(401);
    await me(accessOf(third)).expect(401);
  });

  it('ends it too when a lost answer’s token turns up elsewhere', async () => {
    const first = await signIn(ada.email);
    const lost = await refresh(refreshOf(first));
    const kept = await refresh(refreshOf(first));
    const next = await refresh(refreshOf(kept)).expect(204);
    await refresh(refreshOf(lost)).expect(401);
    await refresh(refreshOf(next)).expect(401);
  });

  it('is refused without a token and with an invented one', async () => {
    await refresh('').expect(401);
    await refresh(`wetside-refresh-55500=${'x'.repeat(43)}`).expect(401);
  });

  it('of two tabs at once leaves both signed in', async () => {
    const first = await signIn(ada.email);
    const both = await Promise.all([refresh(refreshOf(first)), refresh(refreshOf(first))]);
    expect(both.map(({ status }) => status)).toEqual([204, 204]);
    for (const answer of both) await me(accessOf(answer)).expect(200);
  });
});

describe('signing out', () => {
  it('ends the session at once, for both tokens', async () => {
    const first = await signIn(ada.email);
    const cookie = `${accessOf(first)}; ${refreshOf(first)}`;
    const out = await request(server())
      .post('/api/sign-out')
      .set('sec-fetch-site', 'same-origin')
      .set('cookie', cookie);
    expect(out.status).toBe(204);
    expect(cookiesOf(out).get('wetside-access-55500')).toBe('');
    await me(accessOf(first)).expect(401);
    const inside = await request(server())
      .get(`/api/darkrooms/${darkroomId}`)
      .set('cookie', accessOf(first))
      .expect(401);
    expect(inside.body.code).toBe('session-ended');
    await refresh(refreshOf(first)).expect(401);
  });

  it('is fine for whoever is not signed in', async () => {
    await t.browser().post('/api/sign-out').expect(204);
  });
});

describe('a session', () => {
  const ageBy = (personId: string, days: number, column: 'createdAt' | 'lastUsedAt') => {
    const then = new Date(t.clock.now().getTime() - days * 86_400_000);
    return t.database.asIdentity((tx) =>
      tx
        .update(sessions)
        .set({ [column]: then })
        .where(eq(sessions.personId, personId)),
    );
  };

  it.each([
    ['lastUsedAt', 29, 200, 204],
    ['lastUsedAt', 31, 401, 401],
    ['createdAt', 89, 200, 204],
    ['createdAt', 91, 401, 401],
  ] as const)('with %s %i days back answers %i', async (column, days, status, refreshed) => {
    const guest = await t.person(`Sessions ${column} ${days}`);
    const first = await signIn(guest.email);
    await ageBy(guest.personId, days, column);
    await me(accessOf(first)).expect(status);
    await refresh(refreshOf(first)).expect(refreshed);
  });
});

describe('requests from elsewhere', () => {
  const post = () => request(server()).post('/api/sign-in');
  const body = () => ({ email: ada.email, passphrase: PASSPHRASE });

  it.each([
    ['another site', { 'sec-fetch-site': 'cross-site' }],
    ['another origin of the same site', { 'sec-fetch-site': 'same-site', origin: ORIGIN }],
    ['another origin', { origin: 'http://elsewhere.example' }],
    ['nowhere', {}],
  ])('are refused from %s', async (_, headers) => {
    const response = await post().set(headers).send(body()).expect(403);
    expect(response.body.code).toBe('cross-site');
    expect(response.headers['access-control-allow-origin']).toBeUndefined();
  });

  it.each(['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x'])(
    'are not read as %s, the kinds a form of another site can send',
    async (type) => {
      const text = JSON.stringify(body());
      const own = await post().set({ 'sec-fetch-site': 'same-origin', 'content-type': type }).send(text);
      expect(own.status).toBe(415);
      expect(own.get('set-cookie')).toBeUndefined();
      await post().set({ 'sec-fetch-site': 'cross-site', 'content-type': type }).send(text).expect(415);
    },
  );

  it('are taken from the own origin by a browser that says only that', async () => {
    await post().set('origin', ORIGIN).send(body()).expect(200);
  });
});
