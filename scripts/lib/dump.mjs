import { join, resolve } from 'node:path';
import { ROOT } from './paths.mjs';

/** What a backup holds: not the queue, which is made anew and only says "look at this row". */
export const SCHEMAS = ['public', 'identity', 'drizzle'];

/** @param {string} name one of PostgreSQL's programs */
export const program = (name) => join(process.env['PG_BIN'] ?? '', name);

/** A file as the person named it, from where they stood. @param {string} file */
export const fileNamed = (file) => resolve(process.env['INIT_CWD'] ?? ROOT, file);

/** A login for PostgreSQL's programs: by environment, as arguments can be read by all. @param {string} url */
export function loginOf(url) {
  const { hostname, port, username, password, pathname, searchParams } = new URL(url);
  const sslmode = searchParams.get('sslmode');
  return {
    ...process.env,
    PGHOST: hostname,
    PGPORT: port || '5432',
    PGUSER: decodeURIComponent(username),
    PGPASSWORD: decodeURIComponent(password),
    PGDATABASE: pathname.slice(1),
    ...(sslmode ? { PGSSLMODE: sslmode } : {}),
  };
}

/**
 * Rows of every table, by name.
 * @param {import('postgres').Sql | import('postgres').TransactionSql} client
 * @returns {Promise<Record<string, number>>}
 */
export async function rowCounts(client) {
  const tables = await client`
    select n.nspname as home, c.relname as name from pg_class c join pg_namespace n on n.oid = c.relnamespace
    where c.relkind = 'r' and n.nspname = any(${SCHEMAS}) order by 1, 2`;
  /** @type {Record<string, number>} */
  const counts = {};
  for (const { home, name } of tables) {
    const [row] = await client`select count(*)::int as rows from ${client(home)}.${client(name)}`;
    counts[`${home}.${name}`] = row?.['rows'];
  }
  return counts;
}

/** What a person reads of them. @param {Record<string, number>} counts */
export function sayCounts(counts) {
  const told = [
    ['identity.darkrooms', 'darkroom'],
    ['public.bottles', 'bottle'],
    ['public.actions', 'action'],
    ['public.mails', 'mail'],
  ];
  const all = Object.values(counts).reduce((sum, rows) => sum + rows, 0);
  const parts = told.map(([table = '', name]) => {
    const rows = counts[table] ?? 0;
    return `${rows} ${name}${rows === 1 ? '' : 's'}`;
  });
  return `${parts.join(', ')}; ${all} rows in ${Object.keys(counts).length} tables`;
}
