import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { drizzle } from 'drizzle-orm/postgres-js';
import { migrate } from 'drizzle-orm/postgres-js/migrator';
import { runMigrations } from 'graphile-worker';
import postgres from 'postgres';

export interface MigrationLogins {
  /** wetside_admin's; tables are made in wetside_owner's name. */
  adminUrl: string;
  /** wetside_jobs's; the queue's schema is its own. */
  jobsUrl: string;
}

/**
 * Brings a database to this version: the queue's schema first (it needs `create on database`, see sql/database.sql),
 * then the darkroom's tables, each in the name of the role that is to own them.
 */
export async function migrateDatabase(folder: string, logins: MigrationLogins): Promise<void> {
  await runMigrations({ connectionString: logins.jobsUrl });
  const jobs = postgres(logins.jobsUrl, { max: 1, onnotice: () => undefined });
  try {
    await jobs.unsafe(await readFile(join(folder, 'sql', 'enqueue.sql'), 'utf8'));
  } finally {
    await jobs.end();
  }
  const admin = postgres(logins.adminUrl, {
    max: 1,
    onnotice: () => undefined,
    connection: { role: 'wetside_owner' },
  });
  try {
    await migrate(drizzle(admin), { migrationsFolder: join(folder, 'migrations') });
  } finally {
    await admin.end();
  }
}
