import { Injectable, type OnApplicationShutdown } from '@nestjs/common';
import { sql } from 'drizzle-orm';
import { Environment } from '../../config/environment.js';
import { problem } from '../errors/problem.js';
import { NoPlace, Turnstile } from '../turnstile/turnstile.js';
import { Pool, type Tx } from './pool.js';
import { isAboutConnection, isWorthAnotherTry } from './sql-errors.js';
import { within } from './within.js';

export type { Tx } from './pool.js';

export interface DarkroomScope {
  darkroomId: string;
  personId?: string;
}

export interface TransactionOptions {
  readOnly?: boolean;
}

const TRIES = 3;
/** Requests that may wait for each connection: more would only wait in vain. */
const LINE = 50;

@Injectable()
export class Database implements OnApplicationShutdown {
  private readonly places: Turnstile;
  private readonly pools = new Set<Pool>();
  private pool: Pool;
  private stopped = false;

  /** Connects with the first query, not here. */
  constructor(private readonly environment: Environment) {
    const { databasePool, limits } = environment;
    this.places = new Turnstile(databasePool, { length: databasePool * LINE, waitMs: limits.waitMs });
    this.pool = this.newPool();
  }

  /**
   * Work on one darkroom's rows: row security shows that darkroom (and the person's own memberships) only.
   * The work is run again from its start, up to three times in all, when it met a deadlock or a serialisation failure,
   * so it must hold no effect outside the transaction.
   */
  inDarkroom<T>(
    scope: DarkroomScope,
    work: (tx: Tx) => Promise<T>,
    options: TransactionOptions = {},
  ): Promise<T> {
    return this.run(scope.darkroomId, scope.personId ?? '', work, options);
  }

  /** Work across darkrooms for one person, who sees their own memberships and nothing else. */
  asPerson<T>(personId: string, work: (tx: Tx) => Promise<T>, options: TransactionOptions = {}): Promise<T> {
    return this.run('', personId, work, options);
  }

  /** Work on the identity schema, with no darkroom set. */
  asIdentity<T>(work: (tx: Tx) => Promise<T>, options: TransactionOptions = {}): Promise<T> {
    return this.run('', '', work, options);
  }

  async onApplicationShutdown(): Promise<void> {
    this.stopped = true;
    await Promise.all([...this.pools].map((pool) => pool.close(5)));
  }

  private async run<T>(
    darkroomId: string,
    personId: string,
    work: (tx: Tx) => Promise<T>,
    options: TransactionOptions,
  ): Promise<T> {
    const scoped = async (tx: Tx): Promise<T> => {
      if (darkroomId || personId) {
        await tx.execute(
          sql`select set_config('app.darkroom', ${darkroomId}, true), set_config('app.person', ${personId}, true)`,
        );
      }
      return work(tx);
    };
    for (let attempt = 1; ; attempt += 1) {
      try {
        return await this.transact(scoped, options);
      } catch (error) {
        if (attempt >= TRIES || !isWorthAnotherTry(error)) throw error;
      }
    }
  }

  /** Its place is given back when the transaction has ended, which may be after the answer was given up. */
  private async transact<T>(work: (tx: Tx) => Promise<T>, options: TransactionOptions): Promise<T> {
    const leave = await this.place();
    const { pool } = this;
    const ended = pool.transaction(options.readOnly ? 'read only' : 'read write', work).finally(leave);
    try {
      return await within(this.environment.limits.transactionMs, ended);
    } catch (error) {
      if (isAboutConnection(error)) this.replace(pool);
      throw error;
    }
  }

  private async place(): Promise<() => void> {
    try {
      return await this.places.enter();
    } catch (error) {
      throw error instanceof NoPlace ? problem('busy') : error;
    }
  }

  private replace(pool: Pool): void {
    if (pool !== this.pool || this.stopped) return;
    this.pool = this.newPool();
    void pool.retire(this.environment.limits.transactionMs).then(() => this.pools.delete(pool));
  }

  private newPool(): Pool {
    const pool = new Pool(this.environment);
    this.pools.add(pool);
    return pool;
  }
}
