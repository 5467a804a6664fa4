import * as schema from '@wetside/db';
import { sql, type Column, type SQL } from 'drizzle-orm';
import { drizzle, type PostgresJsDatabase } from 'drizzle-orm/postgres-js';
import type { Tx } from './pool.js';

interface Prepared<R> {
  execute(values: Record<string, unknown>): Promise<R>;
}
interface Preparable<R> {
  prepare(name: string): Prepared<R>;
}

/** Queries are written down on this one; it is connected to nothing. */
const nowhere = drizzle.mock({ schema });

/**
 * A query that every load or look at the sink sends: Drizzle writes it down once, where it would else take longer over
 * each than the database does. Values come by `sql.placeholder`. It runs on the transaction that it is given, like any.
 * @returns the query to call with the transaction and a value for every placeholder
 */
export function hotQuery<R>(
  name: string,
  write: (db: PostgresJsDatabase<typeof schema>) => Preparable<R>,
): (tx: Tx, values: Record<string, unknown>) => Promise<R> {
  const prepared = write(nowhere).prepare(name);
  return (tx, values) => {
    const session: object = Reflect.get(tx, 'session') as object;
    const client: unknown = Reflect.get(session, 'client');
    const here: unknown = Object.create(prepared, { client: { value: client } });
    return (here as Prepared<R>).execute(values);
  };
}

/** The column of ids is one of the list that comes by the placeholder, however long: the statement stays the same. */
export const isAnyOf = (column: Column, placeholder: string): SQL =>
  sql`${column} = any(${sql.placeholder(placeholder)}::uuid[])`;
