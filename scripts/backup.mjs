// npm run backup -- FILE: one moment of the database in one file, with owners and rights; see docs/operate.md.
import { closeSync, existsSync, fsyncSync, openSync, renameSync, rmSync, statSync } from 'node:fs';
import { dirname } from 'node:path';
import { fileNamed, loginOf, program, rowCounts, sayCounts, SCHEMAS } from './lib/dump.mjs';
import { withClient } from './lib/given-database.mjs';
import { mustRun } from './lib/run.mjs';
import { begin, say, step, Trouble } from './lib/say.mjs';
import { store } from './lib/store.mjs';

/** A name is only given to a file that is whole and on the disk. @param {string} part @param {string} file */
function settle(part, file) {
  for (const [from, to] of [
    [part, file],
    [dirname(file), ''],
  ]) {
    const handle = openSync(from ?? '', 'r');
    fsyncSync(handle);
    closeSync(handle);
    if (to) renameSync(from ?? '', to);
  }
}

/** @param {string} url the admin's @param {string} file */
async function dump(url, file) {
  const part = `${file}.part`;
  rmSync(part, { force: true });
  closeSync(openSync(part, 'wx', 0o600));
  try {
    const counts = await withClient(url, (client) =>
      // The rows counted are the rows kept: both look at the same moment.
      client.begin('isolation level repeatable read read only', async (tx) => {
        const [row] = await tx`select pg_export_snapshot() as name`;
        const schemas = SCHEMAS.map((name) => `--schema=${name}`);
        const args = ['--format=custom', `--snapshot=${row?.['name']}`, ...schemas, `--file=${part}`];
        await mustRun('The backup could not be made: see the lines above.', program('pg_dump'), args, {
          env: loginOf(url),
        });
        return rowCounts(tx);
      }),
    );
    settle(part, file);
    return counts;
  } finally {
    rmSync(part, { force: true });
  }
}

await begin(async () => {
  const [name] = process.argv.slice(2);
  if (!name) throw new Trouble('Say where to: npm run backup -- FILE');
  const file = fileNamed(name);
  if (existsSync(file)) throw new Trouble(`${file} is there already: choose another name.`);
  if (!existsSync(dirname(file))) throw new Trouble(`There is no folder ${dirname(file)}: make it first.`);
  const { database } = store();
  const logins = await step('Starting the database', () => database.start());
  try {
    const counts = await step('Writing the backup', () => dump(logins.DATABASE_ADMIN_URL, file));
    if (process.env['COUNTS']) say(JSON.stringify(counts));
    say(`${file} holds ${sayCounts(counts)}; ${Math.ceil(statSync(file).size / 1024)} kB.`);
  } finally {
    if (database.startedHere) await database.stop();
  }
});
