import { withClient } from './given-database.mjs';
import { at } from './paths.mjs';
import { mustRun } from './run.mjs';
import { say, Trouble } from './say.mjs';

/** @param {string} url @param {string} name */
function onDatabase(url, name) {
  const other = new URL(url);
  other.pathname = `/${name}`;
  return other.href;
}

/**
 * Fills a new database and puts it in the place of the one that stands there, which stays as it was if that fails.
 * @template T
 * @param {import('./database.mjs').Cluster} cluster
 * @param {import('./database.mjs').DatabaseLogins} logins
 * @param {boolean} keep whether what stood there is kept, until the next time
 * @param {(logins: import('./database.mjs').DatabaseLogins) => Promise<T>} fill
 */
export async function swap(cluster, logins, keep, fill) {
  const name = new URL(logins.DATABASE_URL).pathname.slice(1);
  const next = `${name}_restored`;
  const before = `${name}_before_restore`;
  const root = onDatabase(logins.DATABASE_SUPER_URL ?? '', 'postgres');
  const drop = (/** @type {string} */ one) =>
    withClient(root, (client) => client`drop database if exists ${client(one)} with (force)`);
  await drop(next);
  await mustRun('The new database could not be made.', at('scripts', 'postgres.sh'), ['database', next], {
    env: cluster.env,
  });
  try {
    const there = Object.fromEntries(
      Object.entries(logins).map(([key, url]) => [key, onDatabase(url, next)]),
    );
    const filled = await fill(/** @type {typeof logins} */ (/** @type {unknown} */ (there)));
    await drop(before);
    await withClient(root, (client) => exchange(client, { name, next, before }));
    if (keep) say(`  what stood there is kept as the database ${before} until the next restore`);
    else await drop(before);
    return filled;
  } catch (error) {
    await drop(next);
    throw error;
  }
}

/** @param {import('postgres').Sql} client @param {{ name: string, next: string, before: string }} names */
async function exchange(client, { name, next, before }) {
  try {
    // One transaction: there is never no database of that name.
    await client.begin(async (tx) => {
      await tx`alter database ${tx(name)} rename to ${tx(before)}`;
      await tx`alter database ${tx(next)} rename to ${tx(name)}`;
    });
  } catch (error) {
    throw new Trouble(
      `The restored database could not be put in place (${String(/** @type {Error} */ (error).message)}): end what is connected to it and restore again. Nothing has been changed.`,
    );
  }
}
