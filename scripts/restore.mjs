// npm run restore -- FILE [--over]: a backup beside what stands there, and in its place once it is whole.
import { existsSync, writeFileSync } from 'node:fs';
import { build } from './lib/build.mjs';
import { fileNamed, loginOf, program, rowCounts, sayCounts } from './lib/dump.mjs';
import { GivenDatabase, withClient } from './lib/given-database.mjs';
import { at, local } from './lib/paths.mjs';
import { clearLastRun } from './lib/program.mjs';
import { mustRun, readAll, run } from './lib/run.mjs';
import { begin, say, step, Trouble } from './lib/say.mjs';
import { store } from './lib/store.mjs';
import { swap } from './lib/swap.mjs';
import { darkroomsIn, refuseNewer, settleRestored } from './lib/restored.mjs';

/** What to restore of it: the schema public is there already, with its rights. @param {string} file */
async function contents(file) {
  const { code, output } = await readAll(program('pg_restore'), ['--list', file]);
  if (code !== 0 || !/ TABLE DATA identity darkrooms /.test(output))
    throw new Trouble(`${file} is no whole backup of Wetside's: give a file that npm run backup wrote.`);
  const list = local('restore.list');
  const wanted = output
    .split('\n')
    .filter((line) => !/ (SCHEMA - public|(ACL|COMMENT) - SCHEMA public) /.test(line));
  writeFileSync(list, wanted.join('\n'));
  return list;
}

/**
 * @param {import('./lib/database.mjs').Cluster | GivenDatabase} database
 * @param {any} logins @param {string} file @param {string} list
 */
async function fill(database, logins, file, list) {
  const url = logins.DATABASE_ADMIN_URL;
  const args = [
    '--exit-on-error',
    '--single-transaction',
    `--use-list=${list}`,
    `--dbname=${loginOf(url).PGDATABASE}`,
  ];
  await step('Reading the backup', () =>
    mustRun(
      'The backup could not be restored: see the lines above.',
      program('pg_restore'),
      [...args, file],
      {
        env: loginOf(url),
      },
    ),
  );
  await withClient(url, refuseNewer);
  await step('Bringing the database to this version, with a new queue', () => database.migrate(logins));
  const settled = await withClient(url, settleRestored);
  say(`  withdrawn: ${settled.mails} mails; ended: ${settled.sessions} sessions, ${settled.codes} codes`);
  const counts = await withClient(url, rowCounts);
  if (process.env['COUNTS']) say(JSON.stringify(counts));
  return counts;
}

/** @param {string} url @param {boolean} over @param {boolean} given */
async function refuseToLose(url, over, given) {
  const rooms = await withClient(url, darkroomsIn);
  if (rooms > 0 && given)
    throw new Trouble(`The given database holds ${rooms} darkrooms: give an empty one.`);
  if (rooms > 0 && !over)
    throw new Trouble(
      `The database holds ${rooms === 1 ? 'a darkroom' : `${rooms} darkrooms`}: say --over to put the backup in their place.`,
    );
  return rooms;
}

await begin(async () => {
  const names = process.argv.slice(2);
  const name = names.find((one) => !one.startsWith('--'));
  if (!name) throw new Trouble('Say what to restore: npm run restore -- FILE [--over]');
  const file = fileNamed(name);
  if (!existsSync(file)) throw new Trouble(`There is no file ${file}.`);
  const list = await contents(file);
  const { database, note } = store();
  await clearLastRun(note);
  await build();
  const logins = await step('Starting the database', () => database.start());
  const given = database instanceof GivenDatabase;
  try {
    const rooms = await refuseToLose(logins.DATABASE_ADMIN_URL, names.includes('--over'), given);
    const counts = given
      ? await fill(database, logins, file, list)
      : await swap(database, logins, rooms > 0, (there) => fill(database, there, file, list));
    say(`Restored: ${sayCounts(counts)}.`);
    const reconcile = at('apps/api/dist/cli/reconcile.js');
    say('Folding all that happened again:');
    return await run(process.execPath, [reconcile], { env: { ...process.env, ...logins } });
  } finally {
    if (database.startedHere) await database.stop();
  }
});
