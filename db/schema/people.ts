import { sql } from 'drizzle-orm';
import {
  check,
  index,
  integer,
  pgPolicy,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { darkroomId, instant, microlitres, oneOf, ownDarkroomOnly, tenThousandths } from './columns.js';
import { people } from './identity.js';

export const roles = ['member', 'technician', 'manager'] as const;
export type MemberRole = (typeof roles)[number];

/** Who belongs to a darkroom. Never deleted: what was done names a membership, never a person. */
export const memberships = pgTable(
  'memberships',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    /** Null once the account is gone: "a former member". The one key that leaves the darkroom. */
    personId: uuid('person_id').references(() => people.id),
    role: text('role', { enum: roles }).notNull(),
    displayName: text('display_name').notNull(),
    joinedAt: instant('joined_at').notNull(),
    leftAt: instant('left_at'),
  },
  (t) => [
    primaryKey({ name: 'memberships_pk', columns: [t.darkroomId, t.id] }),
    unique('memberships_person_uq').on(t.darkroomId, t.personId),
    index('memberships_by_person').on(t.personId),
    check('memberships_role', oneOf('role', roles)),
    ownDarkroomOnly('memberships'),
    pgPolicy('memberships_own_person', {
      for: 'select',
      to: 'public',
      using: sql`person_id = nullif(current_setting('app.person', true), '')::uuid`,
    }),
  ],
);

/** The rules of the house: units, money and the thresholds of its warnings. */
export const darkroomSettings = pgTable(
  'darkroom_settings',
  {
    darkroomId: darkroomId(),
    temperatureUnit: text('temperature_unit', { enum: ['C', 'F'] }).notNull(),
    volumeUnit: text('volume_unit', { enum: ['mL', 'fl oz'] }).notNull(),
    currency: text('currency').notNull(),
    /** Low: left ≤ max(this share of what it was rated, lowRollsE4). 2,000 = 20 %. */
    lowShareE4: integer('low_share_e4').notNull(),
    lowRollsE4: tenThousandths('low_rolls_e4').notNull(),
    /** Near its date: min(this many days, nearShareE4 of its keeping). */
    nearDaysMax: integer('near_days_max').notNull(),
    nearShareE4: integer('near_share_e4').notNull(),
    /** The least a tank here needs; null where nobody said. */
    smallestTankUl: microlitres('smallest_tank_ul'),
  },
  (t) => [
    primaryKey({ name: 'darkroom_settings_pk', columns: [t.darkroomId] }),
    check('darkroom_settings_temperature_unit', oneOf('temperature_unit', ['C', 'F'])),
    check('darkroom_settings_volume_unit', oneOf('volume_unit', ['mL', 'fl oz'])),
    check('darkroom_settings_currency', sql`${t.currency} ~ '^[A-Z]{3}$'`),
    check(
      'darkroom_settings_thresholds',
      sql`${t.lowShareE4} between 0 and 10000 and ${t.lowRollsE4} >= 0 and ${t.nearDaysMax} >= 0 and ${t.nearShareE4} between 0 and 10000`,
    ),
    check('darkroom_settings_tank', sql`${t.smallestTankUl} > 0`),
    ownDarkroomOnly('darkroom_settings'),
  ],
);

/** Somebody whose film went through a bath without being a member: a name and how to reach them. */
export const guests = pgTable(
  'guests',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    name: text('name').notNull(),
    reach: text('reach').notNull(),
  },
  (t) => [primaryKey({ name: 'guests_pk', columns: [t.darkroomId, t.id] }), ownDarkroomOnly('guests')],
);
