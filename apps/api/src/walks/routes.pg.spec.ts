import { Controller, Get, Module, Put } from '@nestjs/common';
import { darkroomSettings, memberships } from '@wetside/db';
import { and, eq } from 'drizzle-orm';
import postgres from 'postgres';
import { v7 } from 'uuid';
import { LeastRole } from '../platform/auth/access.decorators.js';
import { Caller, CallerInfo } from '../platform/auth/caller.js';
import { DarkroomAccess } from '../platform/auth/darkroom-access.js';
import { registeredRoutes, type RegisteredRoute } from '../platform/auth/routes.js';
import { Database } from '../platform/database/database.js';
import { FilledHouse, type Ids } from '../testing/filled-house.js';
import { cookieAfter, signedCookie } from '../testing/signed-cookie.js';
import { changedTables, tableSums } from '../testing/table-sums.js';
import { TestApp } from '../testing/test-app.js';
import { unknownIds } from './repository-calls.js';
import { attempts, film, mixOf, put, type Attempt, type Attempts } from './route-attempts.js';
import { badTokens, forged } from './route-people.js';
import { keyOf, unmatched, walkRoute, type Ground } from './route-walk.js';

const SECRET = 'a secret that is only ever used in tests';
let house = '';

/** Routes that a careless hand might write. */
@Controller('darkrooms/:darkroomId/trial')
class CarelessController {
  constructor(
    private readonly database: Database,
    private readonly access: DarkroomAccess,
  ) {}

  @Get('open')
  @LeastRole('manager')
  open(@Caller() caller: CallerInfo): Promise<unknown> {
    caller.entered = true;
    return this.database.inDarkroom({ darkroomId: house }, (tx) => tx.select().from(memberships));
  }

  @Put('early')
  @LeastRole('manager')
  async early(@Caller() caller: CallerInfo): Promise<string> {
    await this.database.inDarkroom({ darkroomId: house }, (tx) =>
      tx.update(darkroomSettings).set({ nearDaysMax: 3 }).where(eq(darkroomSettings.darkroomId, house)),
    );
    return this.access.enter(caller, house, () => Promise.resolve('done'));
  }
}

@Module({ controllers: [CarelessController] })
class CarelessModule {}

let t: TestApp;
let root: postgres.Sql;
let ground: Ground;
let routes: RegisteredRoute[];
const isCareless = ({ path }: RegisteredRoute) => path.includes('/trial/');

const cookieOf = (email: string) => signedCookie(t, email);

const membershipOf = (darkroomId: string, personId: string) =>
  and(eq(memberships.darkroomId, darkroomId), eq(memberships.personId, personId));

async function people(own: FilledHouse, foreign: FilledHouse): Promise<Ground['people']> {
  const { member, technician, manager } = own.emails;
  const roles = {
    member: await cookieOf(member),
    technician: await cookieOf(technician),
    manager: await cookieOf(manager),
  };
  const gone = await t.person('Gustav Gone');
  const { darkroomId } = own.ids;
  await t.join(darkroomId, gone, 'manager');
  const former = await cookieOf(gone.email);
  await t.database.inDarkroom({ darkroomId }, (tx) =>
    tx.update(memberships).set({ leftAt: t.clock.now() }).where(membershipOf(darkroomId, gone.personId)),
  );
  const signedOut = await cookieOf(manager);
  await t.browser().post('/api/sign-out').set('cookie', signedOut).expect(204);
  return { roles, former, signedOut, stranger: await cookieOf(foreign.emails.manager) };
}

beforeAll(async () => {
  t = await TestApp.start({}, [CarelessModule], { background: false });
  root = postgres(t.db.superUrl, { max: 1, onnotice: () => undefined });
  const own = await FilledHouse.open(t, 'riverside');
  const foreign = await FilledHouse.open(t, 'hillside');
  house = own.ids.darkroomId;
  const signedIn = await people(own, foreign);
  const nowS = Math.floor(t.clock.now().getTime() / 1000);
  const bad = badTokens(signedIn.roles.manager, SECRET, nowS);
  ground = { app: t.app, root, own, foreign, shortName: 'riverside', people: signedIn, badTokens: bad };
  routes = registeredRoutes(t.app);
}, 60_000);
afterAll(async () => {
  await root.end();
  await t.close();
});

async function walk(some: readonly RegisteredRoute[], known: Attempts) {
  let requests = 0;
  const persons = new Set<string>();
  const complaints: string[] = [];
  for (const route of some) {
    const make = known[keyOf(route)];
    if (!make) continue;
    const walked = await walkRoute(ground, route, make);
    requests += walked.requests;
    for (const who of walked.persons) persons.add(who);
    complaints.push(...walked.complaints);
  }
  return { requests, persons, complaints };
}

describe('every route that Nest has registered', () => {
  const real = () => routes.filter((route) => !isCareless(route));

  it('has a right request', () => {
    expect(unmatched(real(), attempts)).toEqual([]);
  });

  it('refuses whom it must, changes nothing then, and serves its least role with the same request', async () => {
    const { requests, persons, complaints } = await walk(real(), attempts);
    expect(complaints).toEqual([]);
    process.stdout.write(`${real().length} routes × ${persons.size} kinds of person: ${requests} requests\n`);
  }, 90_000);
});

describe('a token', () => {
  it('made by hand and right in everything is taken, so that the wrong ones are refused for what is wrong', async () => {
    const cookie = forged(ground.people.roles.manager, SECRET, {});
    await t.browser().get('/api/me').set('cookie', cookie).expect(200);
  });

  it('for refreshing that was used and superseded ends its session', async () => {
    const first = await cookieOf(ground.own.emails.manager);
    const refresh = (cookie: string) => t.browser().post('/api/sign-in/refresh').set('cookie', cookie);
    const second = cookieAfter(await refresh(first).expect(204));
    const third = cookieAfter(await refresh(second).expect(204));
    await refresh(first).expect(401);
    await t.browser().get('/api/me').set('cookie', third).expect(401);
    await t.browser().get(ground.own.house.url('bottles')).set('cookie', third).expect(401);
  });
});

it('a role that is taken away is gone with the next request', async () => {
  const { darkroomId } = ground.own.ids;
  const person = await t.person('Dora Demoted');
  await t.join(darkroomId, person, 'technician');
  const browser = await t.signedIn(person);
  await browser.get(ground.own.house.url('shelf')).expect(200);
  await t.database.inDarkroom({ darkroomId }, (tx) =>
    tx.update(memberships).set({ role: 'member' }).where(membershipOf(darkroomId, person.personId)),
  );
  await browser.get(ground.own.house.url('shelf')).expect(403);
});

describe('another darkroom’s row, named inside an action, is as one that never was:', () => {
  const loadOf = (own: FilledHouse, more: object, owner?: object) =>
    put(own, 'loads', { bottleIds: [own.ids.bottleId], material: 'film', film: film(owner), ...more });
  const draftOf = (own: FilledHouse, supplierId: string, supplierPackId: string) =>
    put(own, 'order-drafts', {
      orderId: v7(),
      supplierId,
      lines: [{ id: v7(), supplierPackId, count: 1 }],
    });
  const receiptOf = (own: FilledHouse, line: object, more: object) => {
    const lot = { packId: own.ids.packId, lotId: v7(), lotNumber: '1', expiresOn: null, count: 1 };
    return put(own, 'receipts', { lines: [{ ...lot, ...line }], ...more });
  };
  const mix = (own: FilledHouse, from: object, more: object = {}) =>
    put(own, 'mixes', { ...mixOf(own, from), ...more });
  const named: [string, (own: FilledHouse, ids: Ids) => Attempt][] = [
    ['a film’s owner', (own, ids) => loadOf(own, {}, { membershipId: ids.managerId })],
    ['a load’s line', (own, ids) => loadOf(own, { lineVersionId: ids.newId })],
    ['a load’s bottle', (own, ids) => loadOf(own, { bottleIds: [own.ids.bottleId, ids.bottleId] })],
    ['a mix’s lot', (own, ids) => mix(own, { kind: 'lot', lotId: ids.lotId })],
    ['a mix’s opened pack', (own, ids) => mix(own, { kind: 'opened', openedPackIds: [ids.openedPackId] })],
    ['a mix’s bottle of stock', (own, ids) => mix(own, { kind: 'stock', bottleId: ids.bottleId })],
    ['a mix’s chemistry', (own, ids) => mix(own, { kind: 'hand' }, { chemistryVersionId: ids.versionId })],
    ['a draft’s supplier', (own, ids) => draftOf(own, ids.supplierId, own.ids.supplierPackId)],
    ['a draft’s pack', (own, ids) => draftOf(own, own.ids.supplierId, ids.supplierPackId)],
    ['a delivery’s order', (own, ids) => receiptOf(own, {}, { orderId: ids.sentOrderId })],
    [
      'a delivery’s line',
      (own, ids) => receiptOf(own, { orderLineId: ids.draftLineId }, { orderId: own.ids.sentOrderId }),
    ],
  ];

  it.each(named)('%s', async (_, make) => {
    const { own, foreign, people: by } = ground;
    const send = ({ url, body }: Attempt) => t.browser().put(url).set('cookie', by.roles.manager).send(body);
    const before = await tableSums(root);
    const met = await send(make(own, foreign.ids));
    const unmet = await send(make(own, unknownIds(foreign.ids)));
    expect([400, 404, 422]).toContain(met.status);
    expect(met.body).toEqual(unmet.body);
    expect(changedTables(before, await tableSums(root))).toEqual([]);
  });
});

describe('the walk sees', () => {
  const trial = (path: string) => routes.filter((route) => route.path.endsWith(`/trial/${path}`));
  const to = (path: string): Attempts => ({
    [`GET /darkrooms/:darkroomId/trial/${path}`]: ({ house: h }) => ({
      url: h.url(`trial/${path}`),
      names: false,
    }),
    [`PUT /darkrooms/:darkroomId/trial/${path}`]: ({ house: h }) => ({
      url: h.url(`trial/${path}`),
      names: false,
    }),
  });

  it('a route that nobody says how to call', () => {
    expect(unmatched(routes, attempts)).toEqual([
      'Nobody says how to call GET /darkrooms/:darkroomId/trial/open.',
      'Nobody says how to call PUT /darkrooms/:darkroomId/trial/early.',
    ]);
    expect(unmatched([], { 'GET /gone': () => ({ url: '', names: false }) })).toEqual([
      'There is no GET /gone any more.',
    ]);
  });

  it('a route that asks nobody who they are', async () => {
    const { complaints } = await walk(trial('open'), to('open'));
    const key = 'GET /darkrooms/:darkroomId/trial/open';
    for (const who of ['a stranger', 'a manager who has left', 'a member', 'a technician'])
      expect(complaints).toContain(`${key} answers ${who} 200 .`);
  });

  it('a route that writes before it asks', async () => {
    const { complaints } = await walk(trial('early'), to('early'));
    expect(complaints).toContain(
      'PUT /darkrooms/:darkroomId/trial/early changed public.darkroom_settings, though it refused.',
    );
  });
});
