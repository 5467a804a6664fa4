import postgres from 'postgres';
import { migrate } from './migrate.mjs';
import { say, Trouble } from './say.mjs';

/** A database that somebody else runs, named by DATABASE_URL, DATABASE_JOBS_URL and DATABASE_ADMIN_URL. */
export class GivenDatabase {
  startedHere = false;

  /** @param {{ DATABASE_URL: string, DATABASE_JOBS_URL: string, DATABASE_ADMIN_URL: string }} logins */
  constructor(logins) {
    this.logins = logins;
  }

  async start() {
    const { hostname, pathname } = new URL(this.logins.DATABASE_URL);
    try {
      await withClient(this.logins.DATABASE_URL, (client) => client`select 1`);
    } catch (error) {
      throw new Trouble(
        `The database ${pathname.slice(1)} on ${hostname} does not let wetside_app in (${String(/** @type {Error} */ (error).message)}): start it, or mend DATABASE_URL.`,
      );
    }
    say(`  given: ${pathname.slice(1)} on ${hostname}`);
    return this.logins;
  }

  async stop() {}

  /** wetside_jobs may create its schema for as long as it takes; the admin may say so in the owner's name. */
  async migrate() {
    await this.#rights('grant create on database %I to wetside_jobs');
    const trouble = await migrate(this.logins);
    await this.#rights('revoke create on database %I from wetside_jobs');
    if (trouble) throw new Trouble(trouble);
  }

  /** @param {string} statement %I stands for the database */
  async #rights(statement) {
    await withClient(this.logins.DATABASE_ADMIN_URL, async (client) => {
      const [row] = await client`select format(${statement}, current_database()) as line`;
      await client.begin(async (tx) => {
        await tx`set local role wetside_owner`;
        await tx.unsafe(row?.['line']);
      });
    });
  }
}

/**
 * One connection for one piece of work.
 * @template T
 * @param {string} url
 * @param {(client: import('postgres').Sql) => Promise<T>} work
 */
export async function withClient(url, work) {
  const client = postgres(url, { max: 1, onnotice: () => undefined, connect_timeout: 10 });
  try {
    return await work(client);
  } finally {
    await client.end({ timeout: 5 });
  }
}
