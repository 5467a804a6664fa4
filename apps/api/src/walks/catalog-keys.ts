import type postgres from 'postgres';

/** A connection, or a transaction on one. */
export type Catalog = postgres.ISql;

const told = (rows: readonly { complaint: string }[]): string[] => rows.map(({ complaint }) => complaint);

/** The darkroom stands first in every primary key, unique constraint and unique index of its tables. */
export async function keyComplaints(root: Catalog): Promise<string[]> {
  const keys = await root<{ complaint: string }[]>`
    select format('Key %s of %s does not begin with darkroom_id.', i.indexrelid::regclass, c.relname) as complaint
    from pg_index i
    join pg_class c on c.oid = i.indrelid and c.relkind in ('r', 'p')
    join pg_namespace n on n.oid = c.relnamespace and n.nspname = 'public'
    left join pg_attribute a on a.attrelid = c.oid and a.attname = 'darkroom_id' and not a.attisdropped
    where i.indisunique and i.indkey[0] is distinct from a.attnum order by 1`;
  const bare = await root<{ complaint: string }[]>`
    select format('Table %s has no primary key that is its darkroom''s.', c.relname) as complaint
    from pg_class c
    join pg_namespace n on n.oid = c.relnamespace and n.nspname = 'public'
    where c.relkind in ('r', 'p') and not exists (select 1 from pg_index i where i.indrelid = c.oid and i.indisprimary)
    order by 1`;
  return [...told(keys), ...told(bare)];
}

/** The two ways out of a darkroom: its row in the directory, and the person behind a membership. */
const WAYS_OUT = ['identity.darkrooms', 'identity.people'];

/** A row refers only to rows of its own darkroom, and nothing cascades. */
export async function foreignKeyComplaints(root: Catalog): Promise<string[]> {
  const rows = await root<
    { name: string; target: string; inside: boolean; carries: boolean; plain: boolean; source: string }[]
  >`
    select f.conname as name, f.confrelid::regclass::text as target, f.conrelid::regclass::text as source,
      own.attnum is not null and other.attnum is not null as inside,
      coalesce(f.conkey[1] = own.attnum and f.confkey[1] = other.attnum, false) as carries,
      f.confdeltype = 'a' and f.confupdtype = 'a' and f.convalidated as plain
    from pg_constraint f
    join pg_class c on c.oid = f.conrelid
    join pg_namespace n on n.oid = c.relnamespace and n.nspname = 'public'
    left join pg_attribute own on own.attrelid = f.conrelid and own.attname = 'darkroom_id'
    left join pg_attribute other on other.attrelid = f.confrelid and other.attname = 'darkroom_id'
    where f.contype = 'f' order by 1`;
  return rows.flatMap(({ name, source, target, inside, carries, plain }) => [
    ...(inside && !carries ? [`Foreign key ${name} of ${source} does not carry darkroom_id.`] : []),
    ...(!inside && !isWayOut(source, target) ? [`Foreign key ${name} of ${source} leads to ${target}.`] : []),
    ...(plain ? [] : [`Foreign key ${name} of ${source} does more than refuse.`]),
  ]);
}

function isWayOut(source: string, target: string): boolean {
  return target === WAYS_OUT[0] || (target === WAYS_OUT[1] && source === 'memberships');
}

/** PostgreSQL cuts a name at 63 bytes without a word: one of that length may be a longer one's stump. */
export async function nameComplaints(root: Catalog): Promise<string[]> {
  const rows = await root<{ complaint: string }[]>`
    select format('The name %s has 63 bytes or more.', name) as complaint from (
      select relname::text as name, relnamespace as space from pg_class
      union all select conname, connamespace from pg_constraint
      union all select polname, c.relnamespace from pg_policy p join pg_class c on c.oid = p.polrelid
      union all select attname, c.relnamespace from pg_attribute a join pg_class c on c.oid = a.attrelid) named
    join pg_namespace n on n.oid = space and n.nspname in ('public', 'identity')
    where octet_length(name) >= 63 order by 1`;
  return told(rows);
}
