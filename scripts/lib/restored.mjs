import { readFileSync } from 'node:fs';
import { performance } from 'node:perf_hooks';
import { at } from './paths.mjs';
import { Trouble } from './say.mjs';

/** @typedef {import('postgres').Sql} Sql */

/** @param {Sql} client @returns {Promise<number>} darkrooms in a database, 0 in one that has never been migrated */
export async function darkroomsIn(client) {
  const [table] = await client`select to_regclass('identity.darkrooms') is not null as there`;
  if (!table?.['there']) return 0;
  const [row] = await client`select count(*)::int as rooms from identity.darkrooms`;
  return row?.['rooms'];
}

/** An older program would not know what to do with it. @param {Sql} client @throws Trouble */
export async function refuseNewer(client) {
  const journal = JSON.parse(readFileSync(at('db/migrations/meta/_journal.json'), 'utf8'));
  const newest = Math.max(...journal.entries.map((/** @type {{ when: number }} */ { when }) => when));
  const [row] = await client`select max(created_at)::float8 as newest from drizzle.__drizzle_migrations`;
  if (row?.['newest'] > newest)
    throw new Trouble('The backup comes from a newer Wetside: bring this checkout to that version first.');
}

/**
 * What must not go on where the backup left off: mails that waited (they went out, or somebody has seen to it since),
 * and whoever was signed in then, for some of them have signed out since.
 * @param {Sql} client the admin's
 * @returns {Promise<{ mails: number, sessions: number, codes: number }>} how many
 */
export async function settleRestored(client) {
  const now = new Date(performance.timeOrigin + performance.now());
  return client.begin(async (tx) => {
    const mails = await tx`
      update mails set state = 'withdrawn', withdrawn_because = 'restored', lease_id = null, lease_until = null
      where state in ('waiting', 'leased')`;
    const sessions = await tx`
      update identity.sessions set ended_at = ${now}, ended_why = 'ended-elsewhere' where ended_at is null`;
    const codes = await tx`update identity.one_time_codes set used_at = ${now} where used_at is null`;
    return { mails: mails.count, sessions: sessions.count, codes: codes.count };
  });
}
