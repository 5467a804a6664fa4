import type postgres from 'postgres';

/** Table to its count of rows and the sum of the transactions that wrote them: an update moves it, a lock or a rollback does not. */
export type RowStamps = ReadonlyMap<string, string>;

const names = new WeakMap<postgres.Sql, Promise<string[]>>();

/**
 * One statement over all tables, a few milliseconds, so that it can stand round every case.
 * @param root a login that row security does not bind
 */
export async function rowStamps(root: postgres.Sql): Promise<RowStamps> {
  const tables = names.get(root) ?? tablesOf(root);
  names.set(root, tables);
  const each = (await tables).map(
    (name) =>
      root`select ${name}::text as name, count(*) || ':' || coalesce(sum(xmin::text::bigint), 0) as stamp from ${root(name)}`,
  );
  const rows = await root<{ name: string; stamp: string }[]>`
    ${each.reduce((all, one) => root`${all} union all ${one}`)}`;
  return new Map(rows.map(({ name, stamp }) => [name, stamp]));
}

async function tablesOf(root: postgres.Sql): Promise<string[]> {
  const tables = await root<{ name: string }[]>`
    select n.nspname || '.' || c.relname as name
    from pg_class c join pg_namespace n on n.oid = c.relnamespace
    where c.relkind = 'r' and n.nspname in ('public', 'identity', 'graphile_worker')`;
  return tables.map(({ name }) => name);
}

/** The tables in which something was written since. */
export function writtenTables(before: RowStamps, after: RowStamps): string[] {
  return [...after.keys()].filter((name) => before.get(name) !== after.get(name)).sort();
}
