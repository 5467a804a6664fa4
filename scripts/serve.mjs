// npm run serve, once Node's packages are there: build, database, migrations, server; then waits to be stopped.
import { join } from 'node:path';
import { mkdirSync } from 'node:fs';
import { build } from './lib/build.mjs';
import { at } from './lib/paths.mjs';
import { isFree } from './lib/ports.mjs';
import {
  clearLastRun,
  forgetRun,
  noteRun,
  serverProgram,
  stopSignal,
  watchDatabase,
  wishedPort,
} from './lib/program.mjs';
import { begin, say, step, Trouble } from './lib/say.mjs';
import { Service } from './lib/service.mjs';
import { refuseForgetful, store } from './lib/store.mjs';

const { told, goOn, wasTold } = stopSignal();
const { database, note } = store();
const data = process.env['WETSIDE_DATA'] ?? '';
/** What to stop, the last started first. @type {{ name: string, stop: () => Promise<void> }[]} */
const started = [];

/** @returns {Promise<number>} the exit code, once everything is to stop */
async function serve() {
  const port = wishedPort('PORT', 3000);
  const databaseIsOurs = await clearLastRun(note);
  // No other port will do: what stands in front leads to this one.
  if (!(await isFree(port)))
    throw new Trouble(`Port ${port} is taken: end what uses it, or choose another with PORT.`);
  await build();
  goOn();
  const logins = await step('Starting the database', () => database.start());
  if (database.startedHere || databaseIsOurs) started.push({ name: 'database', stop: () => database.stop() });
  await refuseForgetful(logins.DATABASE_URL);
  goOn();
  await step('Bringing the database to this version', () => database.migrate(logins));
  goOn();
  mkdirSync(join(data, 'log'), { recursive: true });
  const settings = {
    PORT: String(port),
    DATABASE_URL: logins.DATABASE_URL,
    DATABASE_JOBS_URL: logins.DATABASE_JOBS_URL,
    WEB_DIST: at('apps/web/dist'),
    MODE: 'real',
  };
  // Only its own login and the queue's: never the admin's.
  const rest = { ...process.env };
  delete rest['DATABASE_ADMIN_URL'];
  const server = await step('Starting the server', async () => {
    const service = new Service(
      'server',
      [serverProgram],
      { ...rest, ...settings },
      join(data, 'log', 'server.log'),
    );
    started.push({ name: 'server', stop: () => service.stop() });
    const where = `${process.env['PUBLIC_ORIGIN']} (here: port ${port})`;
    const startedDatabase = started[0]?.name === 'database';
    noteRun({ where, servers: [service.pid], catchers: [], startedDatabase }, note);
    await service.ready(`http://127.0.0.1:${port}/api/ready`);
    return service;
  });
  say(`\nWetside serves ${process.env['PUBLIC_ORIGIN']} on port ${port}.\nCtrl-C or SIGTERM stops it.`);
  const unwatch =
    started[0]?.name === 'database' ? watchDatabase(database, logins.DATABASE_URL) : () => undefined;
  const how = await Promise.race([
    told.then(() => ''),
    server.ended.then((end) => `The server ended ${end}: its log is ${server.log}.`),
  ]);
  unwatch();
  say(how);
  return how === '' ? 0 : 1;
}

await begin(async () => {
  try {
    return await serve();
  } catch (error) {
    if (!wasTold()) throw error;
    say('Told to stop while starting.');
    return 130;
  } finally {
    for (const { name, stop } of started.reverse()) {
      say(`Stopping the ${name}`);
      await stop();
    }
    forgetRun(note);
  }
});
