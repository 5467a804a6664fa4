import { sql } from 'drizzle-orm';
import { bigint, pgPolicy, timestamp, uuid } from 'drizzle-orm/pg-core';
import { darkrooms } from './identity.js';

/** The darkroom a row belongs to: first in every key, named by every query, held by every policy. */
export const darkroomId = () =>
  uuid('darkroom_id')
    .notNull()
    .references(() => darkrooms.id);

export const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'date' });

/** Microlitres. bigint, for a 3,000 L tank line does not fit four bytes. */
export const microlitres = (name: string) => bigint(name, { mode: 'number' });
/** Milligrams. */
export const milligrams = (name: string) => bigint(name, { mode: 'number' });
/** 1/10,000 of a roll (or of an 8×10 print, by the material). */
export const tenThousandths = (name: string) => bigint(name, { mode: 'number' });
/** Minor units of a currency that stands beside it. */
export const minorUnits = (name: string) => bigint(name, { mode: 'number' });

/**
 * The second lock of a table: only rows of the darkroom that this transaction has entered.
 * After a transaction the setting reads '' and not NULL, hence nullif.
 */
export const ownDarkroomOnly = (table: string) =>
  pgPolicy(`${table}_own_darkroom`, {
    for: 'all',
    to: 'public',
    using: sql`darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid`,
    withCheck: sql`darkroom_id = nullif(current_setting('app.darkroom', true), '')::uuid`,
  });

/** `name in ('a', 'b')` for a CHECK: text with a check grows by a migration, an enum type does not shrink. */
export const oneOf = (column: string, values: readonly string[]) =>
  sql.raw(`"${column}" in (${values.map((value) => `'${value.replaceAll("'", "''")}'`).join(', ')})`);
