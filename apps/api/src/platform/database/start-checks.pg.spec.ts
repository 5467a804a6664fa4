import { cloneDatabase, type TestDatabase } from '@wetside/db/testing/clone';
import postgres from 'postgres';
import { readEnvironment } from '../../config/environment.js';
import { Database } from './database.js';
import { refuseUnsafeDatabase } from './start-checks.js';

let db: TestDatabase;
let root: postgres.Sql;
beforeAll(async () => {
  db = await cloneDatabase();
  root = postgres(db.superUrl, { max: 1, onnotice: () => undefined });
});
afterAll(async () => {
  await root.end();
  await db.drop();
});

async function check(databaseUrl: string): Promise<void> {
  const environment = readEnvironment({
    MODE: 'test',
    DATABASE_URL: databaseUrl,
    DATABASE_JOBS_URL: db.jobsUrl,
  });
  const database = new Database(environment);
  try {
    await refuseUnsafeDatabase(database);
  } finally {
    await database.onApplicationShutdown();
  }
}

describe('the check at the start', () => {
  it('is content with the application’s login on a migrated database', async () => {
    await expect(check(db.appUrl)).resolves.toBeUndefined();
  });

  it.each([
    ['a superuser', () => db.superUrl, 'is a superuser'],
    ['one that bypasses row security', () => db.adminUrl, 'may bypass row security'],
    ['a member of another role', () => db.adminUrl, 'is a member of'],
    ['an owner', () => db.jobsUrl, 'owns graphile_worker.'],
  ])('refuses the login of %s', async (_, url, sentence) => {
    await expect(check(url())).rejects.toThrow(sentence);
  });

  it.each([
    ['alter table memberships no force row level security', 'Table memberships does not force row security.'],
    ['alter table memberships disable row level security', 'Table memberships does not force row security.'],
    [
      'alter table memberships owner to wetside_admin',
      'Table memberships belongs to wetside_admin, not to wetside_owner.',
    ],
    ['create table trays (darkroom_id uuid)', 'Table trays does not force row security.'],
  ])('refuses a database after: %s', async (statement, sentence) => {
    await root.unsafe(statement);
    await expect(check(db.appUrl)).rejects.toThrow(sentence);
    await root.unsafe('drop table if exists trays');
    await root.unsafe('alter table memberships owner to wetside_owner');
    await root.unsafe('alter table memberships enable row level security, force row level security');
    await expect(check(db.appUrl)).resolves.toBeUndefined();
  });
});
