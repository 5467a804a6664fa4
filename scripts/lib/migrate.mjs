import { readdirSync, readFileSync } from 'node:fs';
import { at } from './paths.mjs';
import { readAll } from './run.mjs';

const folder = at('db', 'migrations');

/**
 * Brings a database to this version, or leaves it as it was: all new files are one transaction.
 * @param {{ DATABASE_ADMIN_URL: string, DATABASE_JOBS_URL: string }} logins
 * @returns {Promise<string | null>} a sentence when it did not work
 */
export async function migrate({ DATABASE_ADMIN_URL, DATABASE_JOBS_URL }) {
  const { code, output, errors } = await readAll(process.execPath, [at('db', 'dist', 'cli', 'migrate.js')], {
    env: { ...process.env, DATABASE_ADMIN_URL, DATABASE_JOBS_URL },
  });
  if (code === 0) return null;
  const why = /PostgresError: (.*)/.exec(errors)?.[1];
  const file = fileOf(errors);
  if (!file)
    return `${output}${errors}The database could not be brought to this version and is as it was: see the lines above, mend that and start again.`;
  return `The migration ${file} failed${why ? ` (${why})` : ''}: nothing of it is kept, the database is as it was; mend that file and start again.`;
}

/** The migration that holds the statement an error tells of. @param {string} errors */
function fileOf(errors) {
  const files = readdirSync(folder).filter((name) => name.endsWith('.sql'));
  const holds = (/** @type {string} */ name) =>
    readFileSync(at('db', 'migrations', name), 'utf8')
      .split('--> statement-breakpoint')
      .some((statement) => statement.trim() !== '' && errors.includes(statement.trim()));
  const found = files.sort().reverse().find(holds);
  return found ? `db/migrations/${found}` : null;
}
