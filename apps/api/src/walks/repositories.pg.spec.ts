import { Injectable, Module } from '@nestjs/common';
import { DiscoveryService } from '@nestjs/core';
import { bottles } from '@wetside/db';
import { eq } from 'drizzle-orm';
import postgres from 'postgres';
import { readEnvironment } from '../config/environment.js';
import { Database, type DarkroomScope, type Tx } from '../platform/database/database.js';
import { FilledHouse, type Ids } from '../testing/filled-house.js';
import { changedTables, tableSums } from '../testing/table-sums.js';
import { TestApp } from '../testing/test-app.js';
import { aboutBottles } from './bottle-calls.js';
import { aboutHouse } from './house-calls.js';
import { callsOf, type RepositoryCalls } from './repository-calls.js';
import {
  controlComplaint,
  isNothing,
  methodsOf,
  outcomeOf,
  shutComplaint,
  strangersComplaint,
  type Method,
} from './repository-walk.js';
import { aboutShelf } from './shelf-calls.js';

/** Queries that a careless hand might write. */
@Injectable()
class CarelessRepository {
  everything(tx: Tx) {
    return tx.select().from(bottles);
  }

  byId(tx: Tx, _darkroomId: string, id: string) {
    return tx.select({ id: bottles.id }).from(bottles).where(eq(bottles.id, id));
  }

  forgotten(tx: Tx) {
    return tx.select().from(bottles);
  }
}

@Module({ providers: [CarelessRepository] })
class CarelessModule {}

const careless = callsOf(CarelessRepository)(
  { everything: () => [], byId: (i) => [i.darkroomId, i.bottleId], forgotten: () => [] },
  {},
);
const known: readonly RepositoryCalls[] = [...aboutBottles, ...aboutShelf, ...aboutHouse];

let t: TestApp;
let root: postgres.Sql;
/** The same queries by a login that row security does not bind: only what they say themselves holds them. */
let unbound: Database;
let riverside: Ids;
let hillside: Ids;
let repositories: object[];
beforeAll(async () => {
  t = await TestApp.start({}, [CarelessModule], { background: false });
  root = postgres(t.db.superUrl, { max: 1, onnotice: () => undefined });
  const settings = { MODE: 'test', DATABASE_URL: t.db.adminUrl, DATABASE_JOBS_URL: t.db.jobsUrl };
  unbound = new Database(readEnvironment(settings));
  riverside = (await FilledHouse.open(t, 'riverside')).ids;
  hillside = (await FilledHouse.open(t, 'hillside')).ids;
  const providers = t.app.get(DiscoveryService).getProviders();
  const found = providers.flatMap(({ instance }) => {
    const it: unknown = instance;
    return typeof it === 'object' && it !== null && it.constructor.name.endsWith('Repository') ? [it] : [];
  });
  repositories = [...new Set(found)];
}, 60_000);
afterAll(async () => {
  await unbound.onApplicationShutdown();
  await root.end();
  await t.close();
});

const scopeOf = ({ darkroomId, personId }: Ids): DarkroomScope => ({ darkroomId, personId });
const real = (): Method[] =>
  methodsOf(
    repositories.filter((one) => !(one instanceof CarelessRepository)),
    known,
  ).methods;
const inside = (): Method[] => real().filter(({ outside }) => !outside);
const both = (): [string, Ids, Ids][] => [
  ['riverside', riverside, hillside],
  ['hillside', hillside, riverside],
];

/** What the walk says of these methods, in each darkroom about the other's rows. */
async function walk(
  methods: readonly Method[],
  say: (method: Method, own: Ids, foreign: Ids) => Promise<string[]>,
): Promise<string[]> {
  const complaints: string[] = [];
  for (const [where, own, foreign] of both()) {
    for (const method of methods) {
      complaints.push(...(await say(method, own, foreign)).map((one) => `In ${where}: ${one}`));
    }
  }
  return complaints;
}

const shut =
  (database: () => Database) =>
  async (method: Method, own: Ids, foreign: Ids): Promise<string[]> =>
    shutComplaint(method, await outcomeOf(database(), scopeOf(own), method, foreign, 'keep'));

describe('every repository that Nest has registered', () => {
  it('has arguments for each of its methods', () => {
    const others = repositories.filter((one) => !(one instanceof CarelessRepository));
    expect(methodsOf(others, known).complaints).toEqual([]);
    expect(known.filter(({ type }) => !others.some((one) => one instanceof type))).toEqual([]);
    process.stdout.write(`${others.length} repositories, ${real().length} methods, 2 darkrooms\n`);
  });

  it('reaches its own darkroom’s rows with them', async () => {
    const complaints = await walk(inside(), async (method, own) =>
      controlComplaint(method, await outcomeOf(t.database, scopeOf(own), method, own, 'take back')),
    );
    expect(complaints).toEqual([]);
  });

  it('asked for the other darkroom’s rows gives 0, changes 0 and locks 0', async () => {
    const before = await tableSums(root);
    expect(before.size).toBeGreaterThan(40);
    expect(
      await walk(
        inside(),
        shut(() => t.database),
      ),
    ).toEqual([]);
    expect(changedTables(before, await tableSums(root))).toEqual([]);
  });

  it('does not know the other’s ids from ids that never were, even with row security out of the way', async () => {
    // Found by the person alone, across darkrooms: that is what it is for, and row security holds it to the person.
    const byPerson = 'SignInRepository.ownDarkrooms';
    const complaints = await walk(inside(), (method, own, foreign) =>
      strangersComplaint(method.name === byPerson ? t.database : unbound, scopeOf(own), method, foreign),
    );
    expect(complaints).toEqual([]);
  });

  it('where it works outside any darkroom leaves every darkroom’s rows alone', async () => {
    const methods = real().filter(({ outside }) => outside);
    const before = await tableSums(root);
    for (const method of methods) await outcomeOf(t.database, scopeOf(riverside), method, hillside, 'keep');
    const changed = changedTables(before, await tableSums(root));
    expect(changed).toContain('identity.sessions');
    expect(changed.filter((table) => table.startsWith('public.'))).toEqual([]);
  });
});

describe('the walk sees', () => {
  const methods = () =>
    methodsOf(
      repositories.filter((one) => one instanceof CarelessRepository),
      [careless],
    ).methods;
  const one = (name: string) => methods().filter((method) => method.name.endsWith(`.${name}`));

  it('a repository, or a method, without arguments', () => {
    expect(methodsOf(repositories, known).complaints).toEqual([
      'Nobody says how to call CarelessRepository.everything.',
      'Nobody says how to call CarelessRepository.byId.',
      'Nobody says how to call CarelessRepository.forgotten.',
    ]);
    const some = repositories.filter((it) => it instanceof CarelessRepository);
    expect(
      methodsOf(some, [{ ...careless, calls: { everything: () => [], byId: () => [] } }]).complaints,
    ).toEqual(['Nobody says how to call CarelessRepository.forgotten.']);
  });

  it('a query that does not ask whose rows they are', async () => {
    expect(
      await walk(
        one('everything'),
        shut(() => t.database),
      ),
    ).toContain('In riverside: CarelessRepository.everything gives rows of another darkroom.');
  });

  it('a query that leaves the darkroom to row security alone', async () => {
    const strangers = (database: Database) =>
      walk(one('byId'), (method, own, foreign) =>
        strangersComplaint(database, scopeOf(own), method, foreign),
      );
    expect(await strangers(t.database)).toEqual([]);
    expect(await strangers(unbound)).toEqual([
      "In riverside: CarelessRepository.byId knows another darkroom's ids from ids that never were.",
      "In hillside: CarelessRepository.byId knows another darkroom's ids from ids that never were.",
    ]);
  });

  it('that row security is gone: every method but the one that is held by hand then gives, changes or locks', async () => {
    const blind = [];
    for (const method of inside()) {
      const seen = await outcomeOf(unbound, scopeOf(riverside), method, hillside, 'take back');
      if (shutComplaint(method, seen).length === 0) blind.push(method.name);
    }
    expect(blind).toEqual(['SweepRepository.lookAgain']);
  });
});

it('nothing is nothing however it is wrapped', () => {
  expect([null, [], {}, new Map([['a', []]]), { loads: 0, drawnBy: [] }, new Set()].every(isNothing)).toBe(
    true,
  );
  expect([1, 'x', [0, 'x'], new Map([['a', [1]]]), { a: new Date(0) }].some(isNothing)).toBe(false);
});
