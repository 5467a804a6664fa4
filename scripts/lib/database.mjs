import { connect } from 'node:net';
import { migrate } from './migrate.mjs';
import { at } from './paths.mjs';
import { mustRun, read, run } from './run.mjs';
import { Trouble, say } from './say.mjs';

const script = at('scripts', 'postgres.sh');

/**
 * @typedef {object} DatabaseLogins
 * @property {string} DATABASE_URL the program's own login
 * @property {string} DATABASE_ADMIN_URL migrates and reconciles
 * @property {string} DATABASE_JOBS_URL the queue's
 * @property {string} [DATABASE_SUPER_URL] for tests, and to make and swap databases in a restore; not of a given database
 */

/** A private cluster: the one that keeps data, or the tests' own. */
export class Cluster {
  /**
   * @param {'durable' | 'test'} profile
   * @param {string} [dir] where it lies, and nowhere else; without it .local, or what PG_DIR says
   */
  constructor(profile, dir) {
    this.env = { ...process.env, PG_PROFILE: profile, ...(dir ? { PG_DIR: dir, PG_HERE: '1' } : {}) };
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
    const trouble = await migrate(logins);
    await mustRun('The rights for the migration could not be taken back.', script, ['revoke-jobs', name], {
      env: this.env,
    });
    if (trouble) throw new Trouble(trouble);
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
