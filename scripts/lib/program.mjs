// What npm start and npm run dev share: the order in which things start and stop, and who is told what.
import { randomBytes } from 'node:crypto';
import { chmodSync, existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { clearInterval, setInterval } from 'node:timers';
import { answers } from './database.mjs';
import { at, local } from './paths.mjs';
import { freePort } from './ports.mjs';
import { say, Trouble } from './say.mjs';
import { Service, stopLeftOver } from './service.mjs';

export const serverProgram = at('apps/api/dist/main.js');
export const catcherProgram = at('apps/mail-catcher/dist/main.js');
const runningFile = () => local('running.json');
const DATABASE_CHECK_MS = 5_000;

/**
 * @typedef {object} Running what .local/running.json says of a run
 * @property {string} where for the sentence that a second start prints
 * @property {number[]} servers
 * @property {number[]} catchers
 * @property {boolean} startedDatabase
 * @property {NodeJS.ProcessEnv} [settings] the server's, for commands that run beside it; not of real use, whose secrets stay off the disk
 */

/** @returns {Running | null} the run that is on, or that was killed @param {string} [file] of a run elsewhere than in .local */
export function lastRun(file = runningFile()) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return null;
  }
}

/** @param {Running} running @param {string} [file] */
export function noteRun(running, file = runningFile()) {
  writeFileSync(file, JSON.stringify(running), { mode: 0o600 });
}

export function forgetRun(file = runningFile()) {
  rmSync(file, { force: true });
}

/** After a kill -9 the parts of that run are still there: they are stopped first. @returns {Promise<boolean>} whether that run had started the database @param {string} [file] */
export async function clearLastRun(file = runningFile()) {
  const last = lastRun(file);
  if (!last) return false;
  let found = false;
  for (const pid of last.servers) found = (await stopLeftOver(pid, serverProgram)) || found;
  for (const pid of last.catchers) found = (await stopLeftOver(pid, catcherProgram)) || found;
  if (found) say('The last run was cut short: what it left behind is stopped, nothing stored is lost.');
  forgetRun(file);
  return last.startedDatabase;
}

/** The key that signs sessions: made once, so that a restart signs nobody out. */
export function sessionSecret() {
  const file = local('secret');
  if (!existsSync(file)) writeFileSync(file, randomBytes(32).toString('base64url'), { mode: 0o600 });
  chmodSync(file, 0o600);
  const secret = readFileSync(file, 'utf8').trim();
  if (secret.length < 32)
    throw new Trouble(`${file} is damaged: delete it and start again; everybody then signs in anew.`);
  return secret;
}

/** @param {string} name @param {number} otherwise */
export function wishedPort(name, otherwise) {
  const value = Number(process.env[name] || otherwise);
  if (!Number.isInteger(value) || value < 1 || value > 65_535)
    throw new Trouble(`${name} is not a port: give a number from 1 to 65535.`);
  return value;
}

export async function startMailCatcher() {
  const smtpPort = await freePort('the mail catcher', wishedPort('SMTP_PORT', 2525));
  const httpPort = await freePort('the inbox', wishedPort('INBOX_PORT', 8025), [smtpPort]);
  const service = new Service('mail catcher', [catcherProgram], {
    ...process.env,
    SMTP_PORT: String(smtpPort),
    HTTP_PORT: String(httpPort),
    MAIL_DIR: local('mail'),
  });
  await service.ready(`http://127.0.0.1:${httpPort}/inbox.css`);
  return { service, smtpPort, inbox: `http://localhost:${httpPort}` };
}

/**
 * What the server is told. Only its own login and the queue's: never the admin's.
 * @param {{ DATABASE_URL: string, DATABASE_JOBS_URL: string }} logins
 * @param {{ port: number, origin: string, smtpPort: number }} places
 * @returns {Record<string, string>}
 */
export function serverSettings(logins, { port, origin, smtpPort }) {
  return {
    HOST: '127.0.0.1',
    PORT: String(port),
    DATABASE_URL: logins.DATABASE_URL,
    DATABASE_JOBS_URL: logins.DATABASE_JOBS_URL,
    SMTP_URL: `smtp://127.0.0.1:${smtpPort}`,
    MAIL_FROM: process.env['MAIL_FROM'] || 'Wetside <wetside@darkroom.example>',
    PUBLIC_ORIGIN: origin,
    SESSION_SECRET: sessionSecret(),
    WEB_DIST: at('apps/web/dist'),
    MODE: 'demo',
    MAIL_GRACE_S: process.env['MAIL_GRACE_S'] || '60',
    SWEEP_S: process.env['SWEEP_S'] || '30',
  };
}

/** Brings a database back that somebody killed; the server finds it again by itself. @param {{ start: () => Promise<unknown> }} cluster @param {string} url */
export function watchDatabase(cluster, url) {
  let busy = false;
  const timer = setInterval(async () => {
    if (busy) return;
    busy = true;
    if (!(await answers(url))) {
      say('The database has gone: starting it again.');
      await cluster.start().catch((error) => say(String(error.message)));
    }
    busy = false;
  }, DATABASE_CHECK_MS);
  return () => clearInterval(timer);
}

/**
 * Listens for Ctrl-C and its kin; more than one changes nothing. `told` resolves at the first,
 * `goOn` ends a start between two of its steps.
 */
export function stopSignal() {
  let stopTold = false;
  /** @type {Promise<void>} */
  const told = new Promise((resolve) => {
    for (const name of /** @type {NodeJS.Signals[]} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
      process.on(name, () => {
        stopTold = true;
        resolve();
      });
    }
  });
  const goOn = () => {
    if (stopTold) throw new Trouble('Told to stop while starting.');
  };
  return { told, goOn, wasTold: () => stopTold };
}
