import { defineConfig } from 'drizzle-kit';

export default defineConfig({
  dialect: 'postgresql',
  schema: ['./schema/*.ts'],
  out: './migrations',
  dbCredentials: { url: process.env['DATABASE_ADMIN_URL'] ?? 'postgres://localhost/none' },
  schemaFilter: ['public', 'identity'],
  entities: { roles: { exclude: ['wetside_owner', 'wetside_admin', 'wetside_jobs', 'wetside_app'] } },
  strict: true,
  verbose: true,
});
