// npm test: runs every part whatever the others did, and ends with the count alone on the last line.
// `npm test -- web pure` runs those parts alone.
import { mkdirSync, rmSync } from 'node:fs';
import { availableParallelism } from 'node:os';
import { performance } from 'node:perf_hooks';
import { build } from './lib/build.mjs';
import { checkCount, jestCount, playwrightCount } from './lib/counts.mjs';
import { Cluster } from './lib/database.mjs';
import { at, local } from './lib/paths.mjs';
import { slowestFiles } from './lib/reports.mjs';
import { read, run } from './lib/run.mjs';
import { begin, say, secondsSince, Trouble } from './lib/say.mjs';

/** @typedef {import('./lib/counts.mjs').Count} Count */

const bin = (/** @type {string} */ name) => at('node_modules/.bin', name);
const results = local('test-results');
const cluster = new Cluster('test');
// A test must never reach the database that keeps data, whatever this terminal has set.
const clean = Object.fromEntries(
  Object.entries(process.env).filter(([name]) => !/^(DATABASE_|PG|SMTP_URL|CLOCK_OFFSET)/.test(name)),
);
const env = { ...clean, TZ: process.env['TZ'] || 'Europe/Lisbon' };

/** @type {Promise<NodeJS.ProcessEnv> | undefined} */
let database;
/** The tests' database, started once, with the addresses that tests read. */
function withDatabase() {
  database ??= (async () => {
    // A cluster that makes nothing durable is not trusted after a crash: it is made anew unless it runs.
    if (!(await cluster.isRunning())) await cluster.destroy();
    return { ...env, ...(await cluster.start()) };
  })();
  return database;
}

/** @type {Promise<void> | undefined} */
let built;
const withBuild = () => (built ??= build());

/** @param {string} project @param {NodeJS.ProcessEnv} jestEnv */
async function jest(project, jestEnv) {
  const file = `${results}/${project}.json`;
  // Jest leaves a core for whoever watches; here nobody does.
  const workers = `--maxWorkers=${availableParallelism()}`;
  const args = [
    '-c',
    'jest.config.mjs',
    workers,
    '--selectProjects',
    project,
    '--json',
    '--outputFile',
    file,
  ];
  return jestCount(file, await runQuietly([bin('jest'), ...args], jestEnv));
}

/** Jest prints its report on the standard output as well, which nobody wants to read. @param {string[]} command @param {NodeJS.ProcessEnv} commandEnv */
async function runQuietly(command, commandEnv) {
  return (await read(command[0] ?? '', command.slice(1), { env: commandEnv })).code;
}

/** @type {Record<string, () => Promise<Count>>} */
const parts = {
  lint: async () => {
    const codes = [
      await run(bin('eslint'), ['.']),
      await run(bin('prettier'), ['--check', '--log-level', 'warn', '.']),
    ];
    return checkCount(Math.max(...codes));
  },
  types: async () => checkCount(await run(process.execPath, [at('scripts/typecheck.mjs')])),
  pure: () => jest('pure', env),
  // Some of its tests start the built server.
  postgresql: async () => {
    await withBuild();
    return jest('pg', await withDatabase());
  },
  web: async () => {
    const file = `${results}/web.json`;
    const args = ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${file}`];
    return jestCount(file, await run(bin('vitest'), args, { cwd: at('apps/web'), env }));
  },
  browser: async () => {
    const file = `${results}/browser.json`;
    await withBuild();
    const chromium = await read(at('scripts/chromium.sh'), []);
    if (chromium.code !== 0) throw new Trouble('There is no browser: see the lines above.');
    const browserEnv = {
      ...(await withDatabase()),
      E2E_CHROMIUM: chromium.output.trim(),
      E2E_RESULTS: results,
      PLAYWRIGHT_JSON_OUTPUT_FILE: file,
      PLAYWRIGHT_JSON_OUTPUT_NAME: file,
    };
    return playwrightCount(
      file,
      await run(bin('playwright'), ['test', '--reporter=list,json'], {
        cwd: at('apps/e2e'),
        env: browserEnv,
      }),
    );
  },
};

/** Parts of one group run at once: each of these two keeps one core busy. */
const together = [['lint', 'types'], ['pure'], ['postgresql'], ['web'], ['browser']];
const notThere = () => Promise.reject(new Trouble('There is no such part.'));

/** @param {string} name @param {() => Promise<Count>} work @returns {Promise<Count>} */
async function runPart(name, work) {
  const began = performance.now();
  say(`\n== ${name}`);
  /** @type {Count} */
  let count;
  try {
    count = await work();
  } catch (error) {
    count = {
      passed: 0,
      failed: 1,
      skipped: 0,
      note: error instanceof Error ? error.message : String(error),
    };
  }
  const skipped = count.skipped > 0 ? `, ${count.skipped} skipped` : '';
  say(
    `== ${name}: ${count.passed} passed, ${count.failed} failed${skipped}, in ${secondsSince(began)}${count.note ? ` (${count.note})` : ''}`,
  );
  return count;
}

async function main() {
  const wanted = process.argv.slice(2);
  const unknown = wanted.filter((name) => !(name in parts));
  if (unknown.length > 0)
    throw new Trouble(`There is no part ${unknown.join(', ')}: say ${Object.keys(parts).join(', ')}.`);
  rmSync(results, { recursive: true, force: true });
  mkdirSync(results, { recursive: true });
  const total = { passed: 0, failed: 0 };
  /** @type {string[]} */
  const red = [];
  for (const group of together) {
    const names = group.filter((name) => wanted.length === 0 || wanted.includes(name));
    const counts = await Promise.all(names.map((name) => runPart(name, parts[name] ?? notThere)));
    counts.forEach((count, index) => {
      total.passed += count.passed;
      total.failed += count.failed;
      if (count.failed > 0) red.push(names[index] ?? '');
    });
  }
  if (database && cluster.startedHere) await cluster.stop();
  const slowest = slowestFiles(results, 10).map(
    ({ name, ms }) => `  ${(ms / 1000).toFixed(1).padStart(6)} s  ${name}`,
  );
  if (slowest.length > 0) say(`\nThe slowest files:\n${slowest.join('\n')}`);
  if (red.length > 0) say(`\nFailed: ${red.join(', ')}. The reports are in ${results}.`);
  say(`\n${total.passed} passed, ${total.failed} failed`);
  return total.failed === 0 ? 0 : 1;
}

for (const name of /** @type {NodeJS.Signals[]} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
  process.once(name, async () => {
    say('Stopping the tests');
    if (cluster.startedHere) await cluster.stop();
    process.exit(130);
  });
}
await begin(main);
