// npm run dev: the server compiled and restarted as files change, the web through Vite, on npm start's database.
import { spawn } from 'node:child_process';
import { build } from './lib/build.mjs';
import { Cluster } from './lib/database.mjs';
import { saySignIns, wholeDemo } from './lib/demo.mjs';
import { at, ROOT } from './lib/paths.mjs';
import { freePort } from './lib/ports.mjs';
import {
  clearLastRun,
  forgetRun,
  noteRun,
  serverProgram,
  serverSettings,
  startMailCatcher,
  stopSignal,
  wishedPort,
} from './lib/program.mjs';
import { begin, say, step } from './lib/say.mjs';

const { told, goOn, wasTold } = stopSignal();
const cluster = new Cluster('durable');
/** @type {(() => Promise<unknown>)[]} */
const stops = [];

/**
 * A watcher with this terminal's output, in a process group of its own as it starts programs itself.
 * @param {string[]} args what Node runs @param {NodeJS.ProcessEnv} env @param {string} [cwd]
 */
function watcher(args, env, cwd = ROOT) {
  const child = spawn(process.execPath, args, {
    cwd,
    env: { ...process.env, ...env },
    stdio: ['ignore', 'inherit', 'inherit'],
    detached: true,
  });
  const ended = new Promise((resolve) => child.once('exit', resolve));
  stops.push(() => {
    if (child.exitCode === null && child.signalCode === null && child.pid)
      process.kill(-child.pid, 'SIGTERM');
    return ended;
  });
  return ended;
}

async function start() {
  const databaseIsOurs = await clearLastRun();
  await build();
  goOn();
  const logins = await step('Starting the database', () => cluster.start());
  const startedDatabase = cluster.startedHere || databaseIsOurs;
  if (startedDatabase) stops.push(() => cluster.stop());
  await step('Bringing the database to this version', () => cluster.migrate(logins));
  goOn();
  const mail = await step('Starting the mail catcher', startMailCatcher);
  stops.push(() => mail.service.stop());
  const port = await freePort('the server', wishedPort('PORT', 3100));
  const webPort = await freePort('the web', wishedPort('WEB_PORT', 5173), [port]);
  // The browser speaks to Vite, which hands /api on: that is the origin the server must expect.
  const origin = `http://localhost:${webPort}`;
  const settings = serverSettings(logins, { port, origin, smtpPort: mail.smtpPort });
  // Vite serves the pages: the server must not hand out built ones, which may be old.
  delete settings['WEB_DIST'];
  noteRun({
    where: `${origin} (npm run dev)`,
    servers: [],
    catchers: [mail.service.pid],
    startedDatabase,
    settings,
  });
  const signIns = await step('Looking after the demo', () => wholeDemo(settings, logins));
  goOn();

  const ends = [
    watcher(
      [
        at('node_modules/typescript/bin/tsc'),
        '-b',
        'apps/api/tsconfig.build.json',
        '--watch',
        '--preserveWatchOutput',
      ],
      {},
    ),
    watcher(['--watch', '--watch-preserve-output', serverProgram], settings),
    watcher(
      [at('node_modules/vite/bin/vite.js'), '--port', String(webPort), '--strictPort'],
      { API_PORT: String(port), WEB_PORT: String(webPort) },
      at('apps/web'),
    ),
  ];
  say(
    `\n  ${origin} (the server alone: http://localhost:${port}/api)\n  Its mail: ${mail.inbox}\n\n  Sign in as:`,
  );
  saySignIns(signIns);
  say('\nCtrl-C stops it.');
  await Promise.race([told, ...ends]);
}

await begin(async () => {
  try {
    await start();
  } catch (error) {
    if (!wasTold()) throw error;
    say('Told to stop while starting.');
  } finally {
    for (const stop of stops.reverse()) await stop();
    forgetRun();
  }
});
