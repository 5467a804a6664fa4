import * as schema from '@wetside/db';
import { is, sql } from 'drizzle-orm';
import { getTableConfig, PgTable } from 'drizzle-orm/pg-core';
import type { Tx } from '../database/database.js';

/** Every column that this program was built to use, as schema.table.column. */
const built = (Object.values(schema) as unknown[])
  .filter((exported): exported is PgTable => is(exported, PgTable))
  .flatMap((table) => {
    const { schema: home = 'public', name, columns } = getTableConfig(table);
    return columns.map((column) => `${home}.${name}.${column.name}`);
  });

/**
 * What this program uses and the database lacks: something when a migration has not run. Read from the catalogue,
 * which every login may read; the list of migrations is the admin's alone.
 */
export async function missingColumns(tx: Tx): Promise<string[]> {
  const rows = await tx.execute<{ name: string }>(sql`
    select n.nspname || '.' || c.relname || '.' || a.attname as name
    from pg_attribute a
    join pg_class c on c.oid = a.attrelid and c.relkind in ('r', 'p')
    join pg_namespace n on n.oid = c.relnamespace and n.nspname in ('public', 'identity')
    where a.attnum > 0 and not a.attisdropped`);
  const present = new Set(rows.map(({ name }) => name));
  return built.filter((name) => !present.has(name));
}
