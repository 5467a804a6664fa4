// npm run reconcile, demo:reset, darkroom:new: a command of the server's on npm start's database, or on that of real
// use where WETSIDE_DATA is set. It works beside a running program, and without one: then the database runs for as
// long as the command.
import { existsSync } from 'node:fs';
import { build } from './lib/build.mjs';
import { at } from './lib/paths.mjs';
import { demo, saySignIns } from './lib/demo.mjs';
import { lastRun, serverSettings } from './lib/program.mjs';
import { refuseUnready } from './lib/real.mjs';
import { run } from './lib/run.mjs';
import { begin, say, step, Trouble } from './lib/say.mjs';
import { store } from './lib/store.mjs';

const [name = '', ...args] = process.argv.slice(2);

/** @param {{ DATABASE_URL: string, DATABASE_JOBS_URL: string }} logins @returns {Record<string, string>} */
function realSettings({ DATABASE_URL, DATABASE_JOBS_URL }) {
  if (name !== 'reconcile') refuseUnready();
  return { DATABASE_URL, DATABASE_JOBS_URL, MODE: 'real' };
}

await begin(async () => {
  const { real, database, note } = store();
  if (real && name === 'demo')
    throw new Trouble('The demo is not for real use: take WETSIDE_DATA out of the environment first.');
  await build();
  const program = at('apps/api/dist/cli', `${name}.js`);
  if (!existsSync(program)) throw new Trouble(`There is no command ${name}.`);
  const logins = await step('Starting the database', () => database.start());
  try {
    if (database.startedHere)
      await step('Bringing the database to this version', () => database.migrate(logins));
    const settings = {
      ...(real
        ? realSettings(logins)
        : serverSettings(logins, { port: 3000, origin: 'http://localhost:3000', smtpPort: 2525 })),
      // Links in mails must lead to the program that runs, if one does.
      ...(database.startedHere ? {} : lastRun(note)?.settings),
      DATABASE_ADMIN_URL: logins.DATABASE_ADMIN_URL,
    };
    if (name === 'demo') {
      const signIns = await step('Playing the demo', () => demo(settings, args));
      say('  Sign in as:');
      saySignIns(signIns);
      return 0;
    }
    return await run(process.execPath, [program, ...args], { env: { ...process.env, ...settings } });
  } finally {
    if (database.startedHere) await database.stop();
  }
});
