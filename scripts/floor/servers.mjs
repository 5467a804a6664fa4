// Both programs on one database and pool, and the rounds of requests put to them in turn.
import { spawn } from 'node:child_process';
import { setTimeout as wait } from 'node:timers/promises';
import { at } from '../lib/paths.mjs';
import { freePort } from '../lib/ports.mjs';
import { read } from '../lib/run.mjs';
import { Trouble } from '../lib/say.mjs';

/** @typedef {{ name: string, origin: string, signIn: boolean, pid: number, file?: string, stop: () => void }} Server */
/** @typedef {{ perSecond: number, p50: number, p99: number, requests: number, cpuMs: number, refused: number }} Round */

const STEP_MS = 100;
const STARTS_WITHIN_MS = 30_000;
const WARM_UP_S = 15;

/** @param {string} name @param {string[]} args @param {(port: number) => NodeJS.ProcessEnv} env @param {{ path?: string, signIn?: boolean }} [how] @returns {Promise<Server>} */
export async function startServer(name, args, env, { path = '/', signIn = false } = {}) {
  const port = await freePort(name, 55_600);
  const child = spawn(
    process.execPath,
    args.map((one) => one.replace('PORT', String(port))),
    {
      env: env(port),
      stdio: ['ignore', 'ignore', 'inherit'],
    },
  );
  const origin = `http://127.0.0.1:${port}`;
  const answers = () =>
    fetch(`${origin}${path}`).then(
      () => true,
      () => false,
    );
  for (let waited = 0; !(await answers()); waited += STEP_MS) {
    if (child.exitCode !== null || waited > STARTS_WITHIN_MS) throw new Trouble(`${name} did not start.`);
    await wait(STEP_MS);
  }
  return { name, origin, signIn, pid: child.pid ?? 0, stop: () => void child.kill('SIGTERM') };
}

/** @param {Server} server @param {object} order @returns {Promise<Round>} */
async function oneRound(server, order) {
  const full = { file: server.file, ...order, origin: server.origin, signIn: server.signIn, pid: server.pid };
  const { code, output } = await read(process.execPath, [at('scripts/floor/load.mjs'), JSON.stringify(full)]);
  if (code !== 0) throw new Trouble(`${server.name}: ${output}`);
  return JSON.parse(output.split('\n').find((line) => line.startsWith('{')) ?? '{}');
}

/** @param {number[]} values */
export const median = (values) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? 0;

/**
 * Rounds in turn, so that a machine that is slow for a while is slow for all of them; the median of each.
 * @param {Server[]} servers @param {object} order @param {number} rounds
 * @returns {Promise<Record<string, Round>>}
 */
export async function inTurn(servers, order, rounds) {
  /** @type {Record<string, Round[]>} */
  const all = Object.fromEntries(servers.map(({ name }) => [name, []]));
  // A program that is just compiled is slow at first; that is not what is asked.
  for (const server of servers) await oneRound(server, { ...order, seconds: WARM_UP_S });
  for (let n = 0; n < rounds; n += 1) {
    for (const server of servers) all[server.name]?.push(await oneRound(server, order));
  }
  const keys = /** @type {const} */ (['requests', 'perSecond', 'p50', 'p99', 'cpuMs']);
  return Object.fromEntries(
    Object.entries(all).map(([name, list]) => {
      const middle = Object.fromEntries(keys.map((key) => [key, median(list.map((one) => one[key]))]));
      const refused = list.reduce((sum, one) => sum + one.refused, 0);
      return [name, /** @type {Round} */ ({ ...middle, refused })];
    }),
  );
}
