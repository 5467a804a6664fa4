// npm run reconcile, demo:reset, darkroom:new: a command of the server's on npm start's database.
// It works beside a running npm start, and without one: then the database runs for as long as the command.
import { existsSync } from 'node:fs';
import { build } from './lib/build.mjs';
import { Cluster } from './lib/database.mjs';
import { at } from './lib/paths.mjs';
import { demo, lastRun, saySignIns, serverSettings } from './lib/program.mjs';
import { run } from './lib/run.mjs';
import { begin, say, step, Trouble } from './lib/say.mjs';

const [name = '', ...args] = process.argv.slice(2);

await begin(async () => {
  await build();
  const program = at('apps/api/dist/cli', `${name}.js`);
  if (!existsSync(program)) throw new Trouble(`There is no command ${name}.`);
  const cluster = new Cluster('durable');
  const logins = await step('Starting the database', () => cluster.start());
  try {
    if (cluster.startedHere)
      await step('Bringing the database to this version', () => cluster.migrate(logins));
    const settings = {
      ...serverSettings(logins, { port: 3000, origin: 'http://localhost:3000', smtpPort: 2525 }),
      // Links in mails must lead to the program that runs, if one does.
      ...(cluster.startedHere ? {} : lastRun()?.settings),
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
    if (cluster.startedHere) await cluster.stop();
  }
});
