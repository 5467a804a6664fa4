import * as schema from '@wetside/db';
import { drizzle, type PostgresJsDatabase } from 'drizzle-orm/postgres-js';
import postgres from 'postgres';
import type { Environment } from '../../config/environment.js';
import { keepingPlans, type Send } from './kept-plans.js';
import { isConnectionLost } from './sql-errors.js';

type Schema = typeof schema;
/** An open transaction; every repository method takes one, so that no query can slip outside it. */
export type Tx = Parameters<Parameters<PostgresJsDatabase<Schema>['transaction']>[0]>[0];

export type AccessMode = 'read write' | 'read only';

/** Refuses every query: where those go whose transaction is over. */
const nowhere = postgres({ max: 1 });
void nowhere.end();

/**
 * Connections to the database. The driver would go on using one that has gone away under a transaction: a rollback on
 * it ends the process, and a late query could run inside somebody else's transaction. So nothing is sent any more on a
 * connection that was lost, and a pool that has lost one is retired: what runs on it ends, and a new one takes its place.
 */
export class Pool {
  private readonly client: postgres.Sql;
  private readonly databases: Readonly<Record<AccessMode, PostgresJsDatabase<Schema>>>;
  private running = 0;
  private retired = false;
  private empty: () => void = () => undefined;
  private readonly emptied = new Promise<void>((resolve) => (this.empty = resolve));

  /** Connects with the first query, not here. */
  constructor({ databaseUrl, databasePool, limits }: Environment) {
    this.client = postgres(databaseUrl, {
      max: databasePool,
      onnotice: () => undefined,
      connect_timeout: limits.waitMs / 1_000,
      keep_alive: 10,
      connection: {
        application_name: 'wetside-api',
        lock_timeout: limits.lockMs,
        statement_timeout: limits.statementMs,
        idle_in_transaction_session_timeout: limits.idleMs,
      },
    });
    this.databases = { 'read write': this.open('read write'), 'read only': this.open('read only') };
  }

  /** @throws whatever the work throws; the driver's error when the connection could not be made or was lost. */
  async transaction<T>(mode: AccessMode, work: (tx: Tx) => Promise<T>): Promise<T> {
    this.running += 1;
    try {
      return await this.databases[mode].transaction(work);
    } finally {
      this.running -= 1;
      if (this.retired && this.running === 0) this.empty();
    }
  }

  /** Takes no more work; what still runs after so many milliseconds is cut off. Resolves when all is closed. */
  async retire(afterMs: number): Promise<void> {
    this.retired = true;
    if (this.running > 0) {
      const cut = setTimeout(() => void this.close(0), afterMs).unref();
      await this.emptied;
      clearTimeout(cut);
    }
    await this.close(0);
  }

  async close(seconds: number): Promise<void> {
    await this.client.end({ timeout: seconds });
  }

  /** Drizzle over a client that begins its transactions as `begin` does; the mode goes out with BEGIN itself. */
  private open(mode: AccessMode): PostgresJsDatabase<Schema> {
    const begin = <T>(work: (sql: postgres.TransactionSql) => Promise<T>) => this.begin(mode, work);
    const client = new Proxy(this.client, {
      get: (target, name): unknown => (name === 'begin' ? begin : Reflect.get(target, name)),
    });
    return drizzle(client, { schema });
  }

  private async begin<T>(
    mode: AccessMode,
    work: (sql: postgres.TransactionSql) => Promise<T>,
  ): Promise<unknown> {
    let over = false;
    const guard = (sql: postgres.TransactionSql) =>
      new Proxy(sql, {
        get: (target, name): unknown => {
          const found: unknown = Reflect.get(over && name === 'unsafe' ? nowhere : target, name);
          return name === 'unsafe' ? keepingPlans(found as Send) : found;
        },
      });
    try {
      // Over with the work itself: what it left running must not follow the commit or the rollback.
      return await this.client.begin(mode, (sql) => orNever(work(guard(sql)).finally(() => (over = true))));
    } finally {
      over = true;
    }
  }
}

/**
 * The work, but without an end where the connection was lost: an end would make the driver roll back on what is gone.
 * The transaction itself ends all the same, with the driver's own word that the connection closed.
 */
function orNever<T>(work: Promise<T>): Promise<T> {
  return work.catch((error: unknown) => {
    if (isConnectionLost(error)) return new Promise<never>(() => undefined);
    throw error;
  });
}
