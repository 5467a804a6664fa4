// npm start, once Node's packages are there: database, build, mail catcher, demo, server; then waits for Ctrl-C.
import { performance } from 'node:perf_hooks';
import { build } from './lib/build.mjs';
import { Cluster } from './lib/database.mjs';
import { saySignIns, wholeDemo } from './lib/demo.mjs';
import { freePort } from './lib/ports.mjs';
import {
  clearLastRun,
  forgetRun,
  noteRun,
  serverProgram,
  serverSettings,
  startMailCatcher,
  stopSignal,
  watchDatabase,
  wishedPort,
} from './lib/program.mjs';
import { begin, say, secondsSince, step } from './lib/say.mjs';
import { Service } from './lib/service.mjs';

const began = performance.now();
const { told, goOn, wasTold } = stopSignal();
const cluster = new Cluster('durable');
/** What to stop, the last started first. @type {{ name: string, stop: () => Promise<void> }[]} */
const started = [];

async function stopAll() {
  for (const { name, stop } of started.reverse()) {
    say(`Stopping the ${name}`);
    await stop();
  }
  forgetRun();
}

/** @returns {Promise<number>} the exit code, once everything is to stop */
async function start() {
  const databaseIsOurs = await clearLastRun();
  await build();
  goOn();
  const logins = await step('Starting the database', () => cluster.start());
  if (cluster.startedHere || databaseIsOurs) started.push({ name: 'database', stop: () => cluster.stop() });
  goOn();
  await step('Bringing the database to this version', () => cluster.migrate(logins));
  goOn();
  const mail = await step('Starting the mail catcher', startMailCatcher);
  started.push({ name: 'mail catcher', stop: () => mail.service.stop() });
  const port = await freePort('Wetside', wishedPort('PORT', 3000));
  const origin = `http://localhost:${port}`;
  const settings = serverSettings(logins, { port, origin, smtpPort: mail.smtpPort });
  const run = {
    where: `${origin} (its inbox: ${mail.inbox})`,
    servers: /** @type {number[]} */ ([]),
    catchers: [mail.service.pid],
    startedDatabase: started[0]?.name === 'database',
    settings,
  };
  noteRun(run);
  const signIns = await step('Looking after the demo', () => wholeDemo(settings, logins));
  goOn();
  const server = await step('Starting the server', async () => {
    const service = new Service('server', [serverProgram], { ...process.env, ...settings });
    started.push({ name: 'server', stop: () => service.stop() });
    noteRun({ ...run, servers: [service.pid] });
    await service.ready(`http://127.0.0.1:${port}/api/ready`);
    return service;
  });

  say(
    `\nWetside is ready after ${secondsSince(began)}.\n\n  ${origin}\n  Its mail: ${mail.inbox}\n\n  Sign in as:`,
  );
  saySignIns(signIns);
  say('\nCtrl-C stops it.');
  const unwatch = watchDatabase(cluster, logins.DATABASE_URL);
  const how = await Promise.race([
    told.then(() => ''),
    server.ended.then(
      (end) => `The server ended ${end}: its log is ${server.log}. Start again with npm start.`,
    ),
    mail.service.ended.then(
      (end) => `The mail catcher ended ${end}: its log is ${mail.service.log}. Start again with npm start.`,
    ),
  ]);
  unwatch();
  say(how);
  return how === '' ? 0 : 1;
}

await begin(async () => {
  try {
    return await start();
  } catch (error) {
    // Ctrl-C ends the step that was running, which then looks like a failure.
    if (!wasTold()) throw error;
    say('Told to stop while starting.');
    return 130;
  } finally {
    await stopAll();
  }
});
