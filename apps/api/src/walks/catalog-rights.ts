import type { Catalog } from './catalog-keys.js';

/** What happened, and what never changes once it is there: read and added to, nothing else. */
export const HAPPENED: readonly string[] = [
  ...['actions', 'voids', 'setting_changes', 'decisions', 'placement_changes'],
  ...['mixes', 'mix_draws', 'loads', 'load_film', 'load_steps', 'holds', 'discards'],
  ...['deliveries', 'delivery_lines', 'stock_movements', 'order_changes', 'notices'],
  ...['bottles', 'chemistry_versions', 'makes', 'pack_parts', 'guests'],
  ...['lines', 'steps', 'line_versions', 'line_steps'],
];
/** Running figures, states, and what the house may reword. */
export const CHANGING: readonly string[] = [
  ...[
    'bottle_totals',
    'lots',
    'opened_packs',
    'counters',
    'orders',
    'order_lines',
    'events',
    'mails',
    'placements',
  ],
  ...['memberships', 'darkroom_settings', 'chemistries', 'packs', 'suppliers', 'supplier_packs'],
];
/** Counters of guesses are thrown away once they are over. */
const FORGETTABLE = ['rate_counters'];

interface RightsRow {
  schema: string;
  name: string;
  reads: boolean;
  adds: boolean;
  changes: boolean;
  deletes: boolean;
  more: boolean;
}

/** The application's login is nobody special: it owns nothing, bypasses nothing, and is a member of nothing. */
export async function loginComplaints(root: Catalog): Promise<string[]> {
  const rows = await root<{ complaint: string }[]>`
    with app as (select * from pg_roles where rolname = 'wetside_app')
    select format('wetside_app may %s.', may) as complaint from app, lateral (values
      (rolsuper, 'everything'), (rolbypassrls, 'bypass row security'), (rolcreaterole, 'make roles'),
      (rolcreatedb, 'make databases'), (rolreplication, 'copy the cluster')) as has(it, may) where it
    union all
    select format('wetside_app owns something: %s.', pg_describe_object(d.classid, d.objid, 0))
    from pg_shdepend d, app
    where d.refobjid = app.oid and d.refclassid = 'pg_authid'::regclass and d.deptype = 'o'
      and d.dbid in (0, (select oid from pg_database where datname = current_database()))
    union all
    select format('wetside_app is a member of %s.', m.roleid::regrole) from pg_auth_members m, app
    where m.member = app.oid
    union all
    select format('wetside_app may create in schema %s.', n.nspname) from pg_namespace n
    where n.nspname !~ '^pg_' and has_schema_privilege('wetside_app', n.oid, 'CREATE')
    union all
    select 'wetside_app may create schemas.' where has_database_privilege('wetside_app', current_database(), 'CREATE')`;
  const [there] = await root`select 1 from pg_roles where rolname = 'wetside_app'`;
  return there ? rows.map(({ complaint }) => complaint) : ['There is no login wetside_app.'];
}

/** What happened is only ever added to; nothing of a darkroom is ever deleted. */
export async function grantComplaints(root: Catalog): Promise<string[]> {
  const rows = await root<RightsRow[]>`
    select n.nspname as schema, c.relname as name,
      has_table_privilege('wetside_app', c.oid, 'SELECT') as reads,
      has_table_privilege('wetside_app', c.oid, 'INSERT') as adds,
      has_any_column_privilege('wetside_app', c.oid, 'UPDATE') as changes,
      has_table_privilege('wetside_app', c.oid, 'DELETE') as deletes,
      has_table_privilege('wetside_app', c.oid, 'TRUNCATE, TRIGGER, REFERENCES') as more
    from pg_class c join pg_namespace n on n.oid = c.relnamespace
    where c.relkind in ('r', 'p') and n.nspname in ('public', 'identity') order by 1, 2`;
  const names = rows.map(({ name }) => name);
  const gone = [...HAPPENED, ...CHANGING].filter((name) => !names.includes(name));
  return [...gone.map((name) => `Table ${name} is not there.`), ...rows.flatMap(rightsOf)];
}

function rightsOf({ schema, name, reads, adds, changes, deletes, more }: RightsRow): string[] {
  const inside = schema === 'public';
  const known = !inside || HAPPENED.includes(name) || CHANGING.includes(name);
  return [
    ...(known ? [] : [`Nobody says whether ${name} tells what happened.`]),
    ...(reads && adds ? [] : [`wetside_app cannot read and add to ${name}.`]),
    ...(changes && HAPPENED.includes(name) ? [`wetside_app may change ${name}.`] : []),
    ...(deletes && !(schema === 'identity' && FORGETTABLE.includes(name))
      ? [`wetside_app may delete from ${name}.`]
      : []),
    ...(more ? [`wetside_app may do more with ${name} than work with its rows.`] : []),
  ];
}

/** One door to the queue: `enqueue`. Its tables are shut, and no other function lends its owner's rights. */
export async function queueComplaints(root: Catalog): Promise<string[]> {
  const rows = await root<{ complaint: string }[]>`
    select format('wetside_app may touch %s.', c.oid::regclass) as complaint
    from pg_class c join pg_namespace n on n.oid = c.relnamespace and n.nspname in ('graphile_worker', 'drizzle')
    where c.relkind in ('r', 'p', 'v', 'm') and (has_table_privilege('wetside_app', c.oid, 'INSERT, UPDATE, DELETE, TRUNCATE')
      or has_any_column_privilege('wetside_app', c.oid, 'SELECT, INSERT, UPDATE'))
    union all
    select format('Function %s lends its owner''s rights.', p.oid::regprocedure)
    from pg_proc p join pg_namespace n on n.oid = p.pronamespace and n.nspname = 'graphile_worker'
    where p.prosecdef and p.proname <> 'enqueue' and has_function_privilege('wetside_app', p.oid, 'EXECUTE')
    order by 1`;
  const doors = await root<
    { owner: string; definer: boolean; path: string | null; app: boolean; all: boolean }[]
  >`
    select pg_get_userbyid(p.proowner) as owner, p.prosecdef as definer,
      array_to_string(p.proconfig, ' ') as path, has_function_privilege('wetside_app', p.oid, 'EXECUTE') as app,
      exists (select 1 from aclexplode(coalesce(p.proacl, acldefault('f', p.proowner))) g where g.grantee = 0) as all
    from pg_proc p join pg_namespace n on n.oid = p.pronamespace and n.nspname = 'graphile_worker'
    where p.proname = 'enqueue'`;
  const [door] = doors;
  const fit =
    doors.length === 1 &&
    door?.owner === 'wetside_jobs' &&
    door.definer &&
    door.app &&
    !door.all &&
    door.path === 'search_path=pg_catalog, pg_temp';
  return [
    ...rows.map(({ complaint }) => complaint),
    ...(fit ? [] : ['The door to the queue is not as it should be.']),
  ];
}
