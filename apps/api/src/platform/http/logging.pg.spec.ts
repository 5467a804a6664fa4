import postgres from 'postgres';
import request from 'supertest';
import { Mutant } from '../../testing/built-server.js';
import { cookieAfter } from '../../testing/signed-cookie.js';
import { StockHouse } from '../../testing/stock-house.js';
import { PASSPHRASE, SECRET, TestApp } from '../../testing/test-app.js';
import { until } from '../../testing/until.js';
import { ChattyServer, SMTP_PASSWORD, SMTP_USER, WaryPost } from './logging.fixture.js';

const WRONG = 'not the passphrase of anybody';
const MANAGER = 'ines.cellar@darkroom.example';
const BROKEN = { email: 'broken@darkroom.example', passphrase: 'a passphrase for a broken server' };
const OWN_PAGES = { 'sec-fetch-site': 'same-origin' };

interface Line {
  time?: number;
  msg?: string;
  context?: string;
  code?: string;
  personId?: string | null;
  req?: { id: number; method: string; url: string; remoteAddress: string };
  res?: { statusCode: number };
}

let t: TestApp;
let house: StockHouse;
let root: postgres.Sql;
let post: WaryPost;
let managerId: string;

beforeAll(async () => {
  t = await TestApp.start({}, [], { background: false });
  house = await StockHouse.open(t, 'cellar');
  root = postgres(t.db.superUrl, { max: 1, onnotice: () => undefined });
  const [row] = await root<{ id: string }[]>`select id from identity.people where email = ${MANAGER}`;
  managerId = row?.id ?? '';
}, 60_000);
beforeEach(async () => {
  post = await WaryPost.open();
});
afterEach(() => post.close());
afterAll(async () => {
  await root.end();
  await t.close();
});

interface Run {
  /** Text that must not stand in the log, by what it is. */
  secrets: [string, string][];
  text: string;
  lines: Line[];
}

/** A query that fails carries its values in its error: the address, and whatever else was put in. */
async function failAQuery(agent: ReturnType<typeof request>): Promise<void> {
  await root`alter table identity.credentials rename to credentials_away`;
  try {
    await agent.post('/api/sign-in').set(OWN_PAGES).send(BROKEN).expect(500);
  } finally {
    await root`alter table identity.credentials_away rename to credentials`;
  }
}

/** Everything in which a secret passes through the program, at one server that logs all it can. */
async function live(): Promise<Run> {
  const server = await ChattyServer.start(t.db, post.url);
  const agent = request(server.url);
  const secrets: [string, string][] = [];
  try {
    const signIn = (email: string, passphrase: string) =>
      agent.post('/api/sign-in').set(OWN_PAGES).send({ email, passphrase });
    const first = await signIn(MANAGER, PASSPHRASE).expect(200);
    await signIn(MANAGER, WRONG).expect(401);
    await signIn('nobody@darkroom.example', WRONG).expect(401);
    const cookie = cookieAfter(first);
    const renewed = await agent
      .post('/api/sign-in/refresh')
      .set({ ...OWN_PAGES, cookie })
      .expect(204);
    for (const [which, held] of [
      ['first', cookie],
      ['renewed', cookieAfter(renewed)],
    ] as const)
      for (const pair of held.split('; '))
        secrets.push([`a ${which} ${pair.split('=')[0] ?? ''}`, pair.split('=')[1] ?? '']);

    await agent
      .get(house.url('shelf'))
      .set({ cookie: cookieAfter(renewed) })
      .expect(200);
    await agent.put(house.url('holds/x')).set({ 'sec-fetch-site': 'cross-site', cookie }).expect(403);
    await agent.get(`/api/darkrooms/not-here%0a%7B%22level%22:30%7D/shelf?token=${WRONG.slice(0, 7)}`);
    await agent.get(house.url('shelf')).expect(401);

    const { orderId } = await house.draft();
    const now = t.clock.nowIso();
    await agent
      .put(house.url(`order-sendings/${crypto.randomUUID()}`))
      .set({ ...OWN_PAGES, cookie: cookieAfter(renewed) })
      .send({
        content: { v: 1, happenedAt: now, orderId, revision: 1 },
        envelope: { sentAt: now, deviceNow: now, queued: false },
      })
      .expect(201);
    await until(() => post.heard.filter((line) => line === '.').length >= 2);

    await failAQuery(agent);
  } finally {
    await server.stop();
  }
  const [stored] = await root<{ hash: string }[]>`
    select passphrase_hash as hash from identity.credentials where person_id = ${managerId}`;
  const from = post.heard.indexOf('') + 1;
  const body = post.heard.slice(from, post.heard.indexOf('.')).filter((line) => line.length > 15);
  expect(body.length).toBeGreaterThan(0);
  secrets.push(
    ['the passphrase', PASSPHRASE],
    ['a wrong passphrase', WRONG],
    ['the passphrase of a failed request', BROKEN.passphrase],
    ['the address of a failed query', BROKEN.email],
    ['a stored hash', stored?.hash ?? ''],
    ['the way a hash begins', '$argon2id$'],
    ['the session secret', SECRET],
    ['the mail server’s password', SMTP_PASSWORD],
    ['it, as it goes over', Buffer.from(`\0${SMTP_USER}\0${SMTP_PASSWORD}`).toString('base64')],
    ['the database’s password', new URL(t.db.appUrl).password],
    ['the queue’s password', new URL(t.db.jobsUrl).password],
    ...body.map((line): [string, string] => ['a mail’s body', line]),
  );
  const written = server.said.split('\n').filter((line) => line !== '' && !line.startsWith('Wetside is at '));
  return { secrets, text: server.said, lines: written.map((line) => JSON.parse(line) as Line) };
}

const leaks = ({ secrets, text }: Run): string[] => [
  ...new Set(secrets.filter(([, secret]) => secret === '' || text.includes(secret)).map(([what]) => what)),
];

it('what the program logs at its chattiest has who, what and when, and no secret', async () => {
  const run = await live();
  expect(run.secrets.length).toBeGreaterThan(15);
  expect(leaks(run)).toEqual([]);

  const find = (wanted: Partial<Line>) =>
    run.lines.filter((line) =>
      Object.entries(wanted).every(([key, value]) => line[key as keyof Line] === value),
    );
  const [signedIn] = find({ msg: 'signed in' });
  expect(signedIn).toMatchObject({ personId: managerId, req: { url: '/api/sign-in', method: 'POST' } });
  const refused = find({ msg: 'sign-in refused' });
  expect(refused.map(({ personId }) => personId)).toEqual([managerId, null]);
  expect(refused[0]?.req?.remoteAddress).toBe('127.0.0.1');
  const [crossing] = find({ msg: 'refused', code: 'cross-site' });
  expect(crossing?.req?.url).toBe(house.url('holds/x'));
  const lineBreak = '/api/darkrooms/not-here%0a%7B%22level%22:30%7D/shelf';
  expect(run.lines.filter(({ req }) => req?.url === lineBreak).length).toBeGreaterThan(0);
  expect(find({ msg: 'refused', code: 'signed-out' })).toHaveLength(2);
  const shelf = find({ msg: 'request completed', personId: managerId });
  expect(shelf).toContainEqual(expect.objectContaining({ req: expect.objectContaining({ method: 'GET' }) }));
  expect(run.lines.filter(({ msg }) => msg?.startsWith('Mail ') ?? false)).toMatchObject([
    { msg: expect.stringMatching(/, try 1: .*451 not now/) },
  ]);
  const asked = run.lines.filter(({ req }) => req !== undefined);
  expect(asked.every(({ time, req }) => typeof time === 'number' && typeof req?.id === 'number')).toBe(true);
}, 60_000);

it('mutant: without an error’s own words for the log, the values of a failed query stand in it', async () => {
  const cut = 'err: (error) => describedError(error.raw ?? error),';
  const mutant = await Mutant.make('platform/http/logging.module.js', cut);
  try {
    const server = await ChattyServer.start(t.db, post.url, mutant.folder);
    await failAQuery(request(server.url)).finally(() => server.stop());
    expect(server.said).toContain(BROKEN.email);
  } finally {
    await mutant.remove();
  }
}, 60_000);
