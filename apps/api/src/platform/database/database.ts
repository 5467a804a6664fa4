import { Injectable, type OnApplicationShutdown } from '@nestjs/common';
import * as schema from '@wetside/db';
import { sql } from 'drizzle-orm';
import { drizzle, type PostgresJsDatabase } from 'drizzle-orm/postgres-js';
import postgres from 'postgres';
import { Environment } from '../../config/environment.js';
import { isWorthAnotherTry } from './sql-errors.js';

type Schema = typeof schema;
/** An open transaction; every repository method takes one, so that no query can slip outside it. */
export type Tx = Parameters<Parameters<PostgresJsDatabase<Schema>['transaction']>[0]>[0];

export interface DarkroomScope {
  darkroomId: string;
  personId?: string;
}

export interface TransactionOptions {
  readOnly?: boolean;
}

const TRIES = 3;

@Injectable()
export class Database implements OnApplicationShutdown {
  private readonly client: postgres.Sql;
  private readonly db: PostgresJsDatabase<Schema>;

  /** Connects with the first query, not here. */
  constructor(environment: Environment) {
    this.client = postgres(environment.databaseUrl, {
      max: environment.databasePool,
      onnotice: () => undefined,
      connection: {
        application_name: 'wetside-api',
        statement_timeout: 15_000,
        idle_in_transaction_session_timeout: 30_000,
      },
    });
    this.db = drizzle(this.client, { schema });
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
    await this.client.end({ timeout: 5 });
  }

  private async run<T>(
    darkroomId: string,
    personId: string,
    work: (tx: Tx) => Promise<T>,
    options: TransactionOptions,
  ): Promise<T> {
    for (let attempt = 1; ; attempt += 1) {
      try {
        return await this.db.transaction(
          async (tx) => {
            if (darkroomId || personId) {
              await tx.execute(
                sql`select set_config('app.darkroom', ${darkroomId}, true), set_config('app.person', ${personId}, true)`,
              );
            }
            return work(tx);
          },
          options.readOnly ? { accessMode: 'read only' } : undefined,
        );
      } catch (error) {
        if (attempt >= TRIES || !isWorthAnotherTry(error)) throw error;
      }
    }
  }
}
