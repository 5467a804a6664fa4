import { sql } from 'drizzle-orm';
import type { Database, Tx } from './database.js';

/** The database is not set up so that darkrooms are kept apart; each sentence names one reason. */
export class UnsafeDatabase extends Error {
  override readonly name = 'UnsafeDatabase';
}

interface LoginRow extends Record<string, unknown> {
  login: string;
  superuser: boolean;
  bypasses: boolean;
  owns: string | null;
  memberOf: string | null;
}

interface TableRow extends Record<string, unknown> {
  name: string;
  owner: string;
  enabled: boolean;
  forced: boolean;
}

/**
 * Row security binds only a login that is nobody special, and only tables that force it on their owner:
 * the server must not run on anything else.
 * @throws UnsafeDatabase
 */
export async function refuseUnsafeDatabase(database: Database): Promise<void> {
  const complaints = await database.asIdentity(
    async (tx) => [...(await aboutLogin(tx)), ...(await aboutTables(tx))],
    { readOnly: true },
  );
  if (complaints.length > 0) throw new UnsafeDatabase(complaints.join('\n'));
}

async function aboutLogin(tx: Tx): Promise<string[]> {
  const [row] = await tx.execute<LoginRow>(sql`
    select r.rolname as login, r.rolsuper as superuser, r.rolbypassrls as bypasses,
      (select min(c.oid::regclass::text) from pg_class c where c.relowner = r.oid) as owns,
      (select min(g.rolname) from pg_auth_members m join pg_roles g on g.oid = m.roleid where m.member = r.oid) as "memberOf"
    from pg_roles r where r.rolname = session_user`);
  if (!row) return ['The database does not know its own login.'];
  return [
    row.superuser ? `The database login ${row.login} is a superuser; row security does not bind it.` : '',
    row.bypasses ? `The database login ${row.login} may bypass row security.` : '',
    row.owns ? `The database login ${row.login} owns ${row.owns}; it must own nothing.` : '',
    row.memberOf
      ? `The database login ${row.login} is a member of ${row.memberOf}; it must be a member of no role.`
      : '',
  ].filter((sentence) => sentence !== '');
}

async function aboutTables(tx: Tx): Promise<string[]> {
  const rows = await tx.execute<TableRow>(sql`
    select c.oid::regclass::text as name, pg_get_userbyid(c.relowner) as owner,
      c.relrowsecurity as enabled, c.relforcerowsecurity as forced
    from pg_class c
    join pg_namespace n on n.oid = c.relnamespace and n.nspname = 'public'
    join pg_attribute a on a.attrelid = c.oid and a.attname = 'darkroom_id' and not a.attisdropped
    where c.relkind in ('r', 'p') order by 1`);
  if (rows.length === 0) return ['The database has no darkroom tables; run the migrations first.'];
  return rows.flatMap((table) => [
    ...(table.enabled && table.forced ? [] : [`Table ${table.name} does not force row security.`]),
    ...(table.owner === 'wetside_owner'
      ? []
      : [`Table ${table.name} belongs to ${table.owner}, not to wetside_owner.`]),
  ]);
}
