import { connect } from 'node:net';
import { at } from './paths.mjs';
import { mustRun, read, run } from './run.mjs';
import { Trouble, say } from './say.mjs';

const script = at('scripts', 'postgres.sh');

/**
 * @typedef {object} DatabaseLogins
 * @property {string} DATABASE_URL the program's own login
 * @property {string} DATABASE_ADMIN_URL migrates and reconciles
 * @property {string} DATABASE_JOBS_URL the queue's
 * @property {string} DATABASE_SUPER_URL for tests alone
 */

/** A private cluster: the one that keeps data, or the tests' own. */
export class Cluster {
  /** @param {'durable' | 'test'} profile */
  constructor(profile) {
    this.env = { ...process.env, PG_PROFILE: profile };
    this.startedHere = false;
  }

  async isRunning() {
    return (await read(script, ['status'], { env: this.env })).code === 0;
  }

  /** Starts it if it is not running, and says where it lies. @returns {Promise<DatabaseLogins>} */
  async start() {
    this.startedHere = !(await this.isRunning());
    await mustRun('The database did not start: see the lines above.', script, ['start'], { env: this.env });
    const { output } = await read(script, ['env'], { env: this.env });
    const logins = Object.fromEntries(
      [...output.matchAll(/^export (\w+)='(.*)'$/gm)].map(([, name, url]) => [name, url]),
    );
    say(`  ${(await read(script, ['status'], { env: this.env })).output.trim()}`);
    return /** @type {DatabaseLogins} */ (/** @type {unknown} */ (logins));
  }

  async stop() {
    await run(script, ['stop'], { env: this.env });
  }

  async destroy() {
    await run(script, ['destroy'], { env: this.env });
  }

  /**
   * Brings the database to this version. wetside_jobs may create its schema for as long as that takes, no longer.
   * @param {DatabaseLogins} logins
   */
  async migrate(logins) {
    const name = new URL(logins.DATABASE_URL).pathname.slice(1);
    await mustRun('The rights for the migration could not be set.', script, ['grant-jobs', name], {
      env: this.env,
    });
    const { code, output } = await read(process.execPath, [at('db', 'dist', 'cli', 'migrate.js')], {
      env: { ...process.env, ...logins },
    });
    await mustRun('The rights for the migration could not be taken back.', script, ['revoke-jobs', name], {
      env: this.env,
    });
    if (code !== 0)
      throw new Trouble(`${output}The database could not be brought to this version: see the lines above.`);
  }
}

/** @param {string} url @returns {Promise<boolean>} whether anything listens at that login's port */
export function answers(url) {
  return new Promise((resolve) => {
    const socket = connect(Number(new URL(url).port), '127.0.0.1');
    socket.once('connect', () => (socket.destroy(), resolve(true)));
    socket.once('error', () => resolve(false));
  });
}
