import { cloneDatabase, type TestDatabase } from '@wetside/db/testing/clone';
import postgres from 'postgres';
import { foreignKeyComplaints, keyComplaints, nameComplaints, type Catalog } from './catalog-keys.js';
import { backDoorComplaints, policyComplaints, tableComplaints } from './catalog-policies.js';
import { grantComplaints, loginComplaints, queueComplaints } from './catalog-rights.js';

type Check = (root: Catalog) => Promise<string[]>;
type Break = (root: Catalog) => PromiseLike<unknown>;

let db: TestDatabase;
let root: postgres.Sql;
let app: postgres.Sql;
beforeAll(async () => {
  db = await cloneDatabase();
  root = postgres(db.superUrl, { max: 1, onnotice: () => undefined });
  app = postgres(db.appUrl, { max: 1 });
});
afterAll(async () => {
  await root.end();
  await app.end();
  await db.drop();
});

/** What the check says once that is broken. The break is undone with its transaction: roles are the whole cluster's. */
async function afterBreaking(breaking: Break, check: Check): Promise<string[]> {
  const undone = new Error('undone');
  const said: string[] = [];
  try {
    await root.begin(async (tx) => {
      await breaking(tx);
      said.push(...(await check(tx)));
      throw undone;
    });
  } catch (error) {
    if (error !== undone) throw error;
  }
  return said;
}

const CHECKS: [string, Check][] = [
  ['every key begins with the darkroom', keyComplaints],
  ['every foreign key carries the darkroom and only refuses', foreignKeyComplaints],
  ['no name is a stump', nameComplaints],
  ['every table is a darkroom’s, the owner’s, and forces row security', tableComplaints],
  ['every table has its policy and no wider one', policyComplaints],
  ['nothing leads past row security', backDoorComplaints],
  ['the application’s login is nobody special', loginComplaints],
  ['what happened can only be added to', grantComplaints],
  ['the queue has one door', queueComplaints],
];

const LONG = 'a_name_so_long_that_postgresql_had_to_cut_it_somewhere_in_there';

const BROKEN: [string, Check, Break, string][] = [
  [
    'a unique index without the darkroom',
    keyComplaints,
    (sql) => sql`create unique index loose on packs (name)`,
    'Key loose of packs does not begin with darkroom_id.',
  ],
  [
    'a unique constraint with the darkroom last',
    keyComplaints,
    (sql) => sql`alter table lots add constraint loose unique (lot_number, darkroom_id)`,
    'Key loose of lots does not begin with darkroom_id.',
  ],
  [
    'a primary key taken away',
    keyComplaints,
    (sql) => sql`alter table counters drop constraint counters_pk`,
    "Table counters has no primary key that is its darkroom's.",
  ],
  [
    'a foreign key without the darkroom',
    foreignKeyComplaints,
    async (sql) => {
      await sql`create unique index loose on packs (id)`;
      await sql`alter table lots add constraint lots_loose_fk foreign key (pack_id) references packs (id)`;
    },
    'Foreign key lots_loose_fk of lots does not carry darkroom_id.',
  ],
  [
    'a foreign key that cascades',
    foreignKeyComplaints,
    (sql) => sql`
      alter table lots add constraint lots_loose_fk foreign key (darkroom_id, pack_id)
      references packs (darkroom_id, id) on delete cascade`,
    'Foreign key lots_loose_fk of lots does more than refuse.',
  ],
  [
    'a foreign key to a person',
    foreignKeyComplaints,
    (sql) =>
      sql`alter table guests add constraint guests_loose_fk foreign key (id) references identity.people (id)`,
    'Foreign key guests_loose_fk of guests leads to identity.people.',
  ],
  [
    'a name of 63 bytes',
    nameComplaints,
    (sql) => sql`create index ${sql(LONG)} on packs (darkroom_id)`,
    `The name ${LONG} has 63 bytes or more.`,
  ],
  [
    'row security not forced',
    tableComplaints,
    (sql) => sql`alter table holds no force row level security`,
    'Table holds does not force row security.',
  ],
  [
    'row security off',
    tableComplaints,
    (sql) => sql`alter table holds disable row level security`,
    'Table holds does not force row security.',
  ],
  [
    'a table of somebody else',
    tableComplaints,
    (sql) => sql`alter table holds owner to wetside_admin`,
    'Table holds belongs to wetside_admin.',
  ],
  [
    'a table without a darkroom',
    tableComplaints,
    (sql) => sql`create table trays (id uuid primary key)`,
    'Table trays has no darkroom_id that is always there.',
  ],
  [
    'a policy dropped',
    policyComplaints,
    (sql) => sql`drop policy bottles_own_darkroom on bottles`,
    'Table bottles has no policy that holds it to its darkroom.',
  ],
  [
    'a policy that checks no writing',
    policyComplaints,
    (sql) => sql`alter policy bottles_own_darkroom on bottles with check (true)`,
    'Table bottles has no policy that holds it to its darkroom.',
  ],
  [
    'a second policy that opens everything',
    policyComplaints,
    (sql) => sql`create policy wide on bottles for select using (true)`,
    'Policy wide of bottles opens more than its darkroom.',
  ],
  [
    'a view',
    backDoorComplaints,
    (sql) => sql`create view all_bottles as select * from bottles`,
    'View all_bottles shows rows past row security.',
  ],
  [
    'a function with its owner’s rights',
    backDoorComplaints,
    (sql) =>
      sql`create function peep() returns bigint language sql security definer as 'select count(*) from bottles'`,
    "Function peep acts with its owner's rights.",
  ],
  [
    'a login that bypasses',
    loginComplaints,
    (sql) => sql`alter role wetside_app bypassrls`,
    'wetside_app may bypass row security.',
  ],
  [
    'a login that is a member',
    loginComplaints,
    (sql) => sql`grant wetside_owner to wetside_app`,
    'wetside_app is a member of wetside_owner.',
  ],
  [
    'a login that owns',
    loginComplaints,
    (sql) => sql`alter table holds owner to wetside_app`,
    'wetside_app owns something: table holds.',
  ],
  [
    'a login that may build',
    loginComplaints,
    (sql) => sql`grant create on schema public to wetside_app`,
    'wetside_app may create in schema public.',
  ],
  [
    'what happened open to change',
    grantComplaints,
    (sql) => sql`grant update (reason) on holds to wetside_app`,
    'wetside_app may change holds.',
  ],
  [
    'a delete granted',
    grantComplaints,
    (sql) => sql`grant delete on counters to wetside_app`,
    'wetside_app may delete from counters.',
  ],
  [
    'a delete granted to everybody',
    grantComplaints,
    (sql) => sql`grant delete on identity.sessions to public`,
    'wetside_app may delete from sessions.',
  ],
  [
    'a truncate granted',
    grantComplaints,
    (sql) => sql`grant truncate on actions to wetside_app`,
    'wetside_app may do more with actions than work with its rows.',
  ],
  [
    'a new table that nobody has placed',
    grantComplaints,
    (sql) => sql`create table readings (darkroom_id uuid not null)`,
    'Nobody says whether readings tells what happened.',
  ],
  [
    'the queue’s table open',
    queueComplaints,
    (sql) => sql`grant select on graphile_worker._private_jobs to wetside_app`,
    'wetside_app may touch graphile_worker._private_jobs.',
  ],
  [
    'the door open to everybody',
    queueComplaints,
    (sql) => sql`grant execute on function graphile_worker.enqueue(text, json, interval) to public`,
    'The door to the queue is not as it should be.',
  ],
  [
    'the door’s search path loose',
    queueComplaints,
    (sql) => sql`alter function graphile_worker.enqueue(text, json, interval) reset search_path`,
    'The door to the queue is not as it should be.',
  ],
];

describe('in the catalogue', () => {
  it.each(CHECKS)('%s', async (_, check) => {
    expect(await check(root)).toEqual([]);
  });

  it('each check has been seen to fail', () => {
    expect(CHECKS.filter(([, check]) => !BROKEN.some(([, broken]) => broken === check))).toEqual([]);
  });
});

describe('the walk sees', () => {
  it.each(BROKEN)('%s', async (_, check, breaking, complaint) => {
    expect(await afterBreaking(breaking, check)).toContain(complaint);
    expect(await check(root)).toEqual([]);
  });
});

describe('the queue, to the application’s login,', () => {
  const refused = (query: PromiseLike<unknown>) => expect(query).rejects.toMatchObject({ code: '42501' });

  it('takes a job through its door', async () => {
    await app`select graphile_worker.enqueue('walk', '{"seen":"1"}'::json)`;
    const jobs = await root`select task_identifier from graphile_worker.jobs where task_identifier = 'walk'`;
    expect(jobs).toHaveLength(1);
  });

  it('shows and takes nothing else', async () => {
    await refused(app`select * from graphile_worker._private_jobs`);
    await refused(app`select * from graphile_worker.jobs`);
    await refused(app`select graphile_worker.add_job('walk', '{}'::json)`);
    await refused(app`delete from graphile_worker._private_jobs`);
  });

  it('what happened, to the same login, is neither changed nor deleted', async () => {
    await refused(app`update actions set kind = 'load'`);
    await refused(app`delete from actions`);
    await refused(app`truncate actions`);
    await refused(app`delete from bottle_totals`);
  });
});
