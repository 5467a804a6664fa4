import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { migrateDatabase } from '../migrate/migrate.js';
import { dbFolder } from '../migrate/paths.js';

const adminUrl = process.env['DATABASE_ADMIN_URL'];
const jobsUrl = process.env['DATABASE_JOBS_URL'];
if (!adminUrl || !jobsUrl) {
  console.error(
    'Set DATABASE_ADMIN_URL and DATABASE_JOBS_URL to migrate (scripts/postgres.sh env prints them).',
  );
  process.exit(1);
}
await migrateDatabase(dbFolder(dirname(fileURLToPath(import.meta.url))), { adminUrl, jobsUrl });
console.log('The database is at this version.');
