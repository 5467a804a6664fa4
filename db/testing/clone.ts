import { createHash, randomBytes } from 'node:crypto';
import { readdir, readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import postgres from 'postgres';
import { migrateDatabase } from '../migrate/migrate.js';
import { dbFolder } from '../migrate/paths.js';

export interface TestDatabase {
  name: string;
  appUrl: string;
  adminUrl: string;
  jobsUrl: string;
  superUrl: string;
  drop(): Promise<void>;
}

const LOGINS = {
  app: 'DATABASE_URL',
  admin: 'DATABASE_ADMIN_URL',
  jobs: 'DATABASE_JOBS_URL',
  super: 'DATABASE_SUPER_URL',
};
type Login = keyof typeof LOGINS;

/** The db workspace as its package resolves: neither __dirname nor import.meta exists under both Jest and Node. */
function folderOfDb(): string {
  return dbFolder(
    dirname(createRequire(join(process.cwd(), 'package.json')).resolve('@wetside/db/package.json')),
  );
}

/** The cluster's login for that role, on another database. */
function urlOf(login: Login, database: string): string {
  const text = process.env[LOGINS[login]];
  if (!text) throw new Error(`Set ${LOGINS[login]}: PG_PROFILE=test scripts/postgres.sh env prints it.`);
  const url = new URL(text);
  url.pathname = `/${database}`;
  return url.href;
}

/** One template a set of migrations: its name is their hash, so a changed migration makes a new one. */
async function templateName(folder: string): Promise<string> {
  const hash = createHash('sha256');
  for (const part of ['migrations', 'sql']) {
    for (const file of (await readdir(join(folder, part))).filter((name) => name.endsWith('.sql')).sort()) {
      hash.update(file).update(await readFile(join(folder, part, file)));
    }
  }
  return `wetside_template_${hash.digest('hex').slice(0, 12)}`;
}

async function runFile(url: string, file: string): Promise<void> {
  const client = postgres(url, { max: 1, onnotice: () => undefined });
  try {
    await client.unsafe(await readFile(file, 'utf8'));
  } finally {
    await client.end();
  }
}

/** Makes the migrated template if it is not there; one maker at a time, however many test processes ask. */
async function ensureTemplate(folder: string): Promise<string> {
  const name = await templateName(folder);
  const root = postgres(urlOf('super', 'postgres'), { max: 1, onnotice: () => undefined });
  try {
    await root`select pg_advisory_lock(727117)`;
    const [done] = await root`select 1 from pg_database where datname = ${name} and datistemplate`;
    if (done) return name;
    await root`drop database if exists ${root(name)} with (force)`;
    await root`create database ${root(name)} owner wetside_owner`;
    await runFile(urlOf('super', name), join(folder, 'sql', 'database.sql'));
    await migrateDatabase(folder, { adminUrl: urlOf('admin', name), jobsUrl: urlOf('jobs', name) });
    await runFile(urlOf('super', name), join(folder, 'sql', 'jobs-done.sql'));
    await root`alter database ${root(name)} is_template true`;
    return name;
  } finally {
    await root.end();
  }
}

/** A fresh, migrated, empty database with the program's real roles; drop it when the test file is done. */
export async function cloneDatabase(): Promise<TestDatabase> {
  const template = await ensureTemplate(folderOfDb());
  const name = `wetside_test_${randomBytes(6).toString('hex')}`;
  const root = postgres(urlOf('super', 'postgres'), { max: 1, onnotice: () => undefined });
  try {
    // Cloning needs the template to have no other session for a moment: two clones at once wait for each other.
    await root`select pg_advisory_lock(727117)`;
    await root`create database ${root(name)} template ${root(template)} owner wetside_owner`;
  } finally {
    await root.end();
  }
  await runFile(urlOf('super', name), join(folderOfDb(), 'sql', 'database.sql'));
  return {
    name,
    appUrl: urlOf('app', name),
    adminUrl: urlOf('admin', name),
    jobsUrl: urlOf('jobs', name),
    superUrl: urlOf('super', name),
    drop: () => dropDatabase(name),
  };
}

async function dropDatabase(name: string): Promise<void> {
  const root = postgres(urlOf('super', 'postgres'), { max: 1, onnotice: () => undefined });
  try {
    await root`drop database if exists ${root(name)} with (force)`;
  } finally {
    await root.end();
  }
}
