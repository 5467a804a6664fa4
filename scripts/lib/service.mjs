import { spawn } from 'node:child_process';
import { closeSync, existsSync, openSync, readFileSync, renameSync, statSync } from 'node:fs';
import { performance } from 'node:perf_hooks';
import { setTimeout as pause } from 'node:timers/promises';
import { local, ROOT } from './paths.mjs';
import { Trouble } from './say.mjs';

const STOP_MS = 10_000;
const READY_MS = 60_000;
const LOG_BYTES = 10_000_000;

/**
 * A program that runs beside this one, its output in .local/log.
 * It gets a process group of its own: Ctrl-C reaches this script alone, which then stops all in order.
 * Its output goes to the file directly, so that it lives on if this script is killed.
 */
export class Service {
  /**
   * @param {string} name in sentences, and of the log
   * @param {string[]} args what Node runs
   * @param {NodeJS.ProcessEnv} env
   * @param {string} [logFile] its log, elsewhere than in .local
   */
  constructor(name, args, env, logFile = local('log', `${name.replaceAll(' ', '-')}.log`)) {
    this.name = name;
    this.log = logFile;
    if (existsSync(this.log) && statSync(this.log).size > LOG_BYTES) renameSync(this.log, `${this.log}.old`);
    const log = openSync(this.log, 'a', 0o600);
    this.logStart = statSync(this.log).size;
    this.child = spawn(process.execPath, args, {
      cwd: ROOT,
      env,
      detached: true,
      stdio: ['ignore', log, log],
    });
    closeSync(log);
    this.hasEnded = false;
    /** @type {Promise<string>} how it ended */
    this.ended = new Promise((resolve) => {
      this.child.once('exit', (code, signal) => {
        this.hasEnded = true;
        resolve(signal ? `by signal ${signal}` : `with code ${code}`);
      });
    });
  }

  get pid() {
    return this.child.pid ?? 0;
  }

  /** Waits until the address answers 200. @param {string} url */
  async ready(url) {
    const deadline = performance.now() + READY_MS;
    while (!this.hasEnded && performance.now() < deadline) {
      if (await isOk(url)) return;
      await pause(50);
    }
    throw new Trouble(
      `${this.logEnd()}The ${this.name} ${this.hasEnded ? 'ended' : 'did not answer'} while starting: its log is ${this.log}.`,
    );
  }

  /** The last lines that this run wrote. */
  logEnd() {
    const lines = readFileSync(this.log).subarray(this.logStart).toString('utf8').trimEnd().split('\n');
    return lines
      .slice(-20)
      .map((line) => `  ${line}\n`)
      .join('');
  }

  async stop() {
    if (!this.hasEnded) await stopProcess(this.pid, () => this.hasEnded);
  }
}

/** @param {string} url */
async function isOk(url) {
  try {
    return (await fetch(url, { signal: AbortSignal.timeout(2_000) })).ok;
  } catch {
    return false;
  }
}

/** Asks a process to end, and ends it when it does not. @param {number} pid @param {() => boolean} hasEnded */
async function stopProcess(pid, hasEnded) {
  const deadline = performance.now() + STOP_MS;
  signal(pid, 'SIGTERM');
  while (!hasEnded() && performance.now() < deadline) await pause(25);
  if (!hasEnded()) signal(pid, 'SIGKILL');
  while (!hasEnded()) await pause(25);
}

/** @param {number} pid @param {NodeJS.Signals} name */
function signal(pid, name) {
  try {
    process.kill(pid, name);
  } catch {
    // It ended by itself in the meantime, which is all that was wanted.
  }
}

/**
 * Stops what a killed run left behind, if that number still is that program.
 * @param {number} pid @param {string} program path that its command line must hold
 */
export async function stopLeftOver(pid, program) {
  const isIt = () => {
    try {
      return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0').includes(program);
    } catch {
      return false;
    }
  };
  if (!isIt()) return false;
  await stopProcess(pid, () => !isIt());
  return true;
}
