import type postgres from 'postgres';

/** Table to its count of rows and a checksum over all of them, whatever row security would show. */
export type TableSums = ReadonlyMap<string, string>;

/** @param root a login that row security does not bind */
export async function tableSums(root: postgres.Sql): Promise<TableSums> {
  const rows = await root<{ name: string; sum: string }[]>`
    select format('%I.%I', n.nspname, c.relname) as name,
      (xpath('/row/sum/text()', query_to_xml(format(
        'select count(*) || '':'' || coalesce(md5(string_agg(md5(t::text), '''' order by md5(t::text))), ''-'') as sum
         from %I.%I t', n.nspname, c.relname), false, true, '')))[1]::text as sum
    from pg_class c join pg_namespace n on n.oid = c.relnamespace
    where c.relkind = 'r' and n.nspname in ('public', 'identity')`;
  return new Map(rows.map(({ name, sum }) => [name, sum]));
}

/** The tables in which something is not as it was. */
export function changedTables(before: TableSums, after: TableSums): string[] {
  const names = new Set([...before.keys(), ...after.keys()]);
  return [...names].filter((name) => before.get(name) !== after.get(name)).sort();
}
