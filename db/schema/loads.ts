import type { FilmClass, StepFlag } from '@wetside/chemistry';
import { sql } from 'drizzle-orm';
import { check, foreignKey, index, integer, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { actions } from './actions.js';
import { bottles, materials } from './bottles.js';
import { darkroomId, microlitres, oneOf, ownDarkroomOnly, tenThousandths } from './columns.js';
import { lineVersions } from './lines.js';
import { guests, memberships } from './people.js';

export const loadFlags = ['time_unsure', 'late', 'reported'] as const;
export type LoadFlag = (typeof loadFlags)[number];

/** What went through a bottle or a line in one go. */
export const loads = pgTable(
  'loads',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    lineVersionId: uuid('line_version_id'),
    /** About the load as a whole: its time is unsure, it was told late, the person said that it had happened already. */
    flags: text('flags').array().$type<LoadFlag[]>().notNull(),
    note: text('note'),
  },
  (t) => [
    primaryKey({ name: 'loads_pk', columns: [t.darkroomId, t.actionId] }),
    foreignKey({
      name: 'loads_action_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    foreignKey({
      name: 'loads_line_version_fk',
      columns: [t.darkroomId, t.lineVersionId],
      foreignColumns: [lineVersions.darkroomId, lineVersions.id],
    }),
    check(
      'loads_flags',
      sql.raw(`flags <@ array[${loadFlags.map((flag) => `'${flag}'`).join(', ')}]::text[]`),
    ),
    ownDarkroomOnly('loads'),
  ],
);

/** The film of a load: so many of a format and a class, and whose they are. */
export const loadFilm = pgTable(
  'load_film',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    ordinal: integer('ordinal').notNull(),
    /** A named format, or 'sheet' with its size. */
    format: text('format').notNull(),
    widthMm: integer('width_mm'),
    heightMm: integer('height_mm'),
    count: integer('count').notNull(),
    filmClass: text('film_class').$type<FilmClass>().notNull(),
    ownerMembershipId: uuid('owner_membership_id'),
    ownerGuestId: uuid('owner_guest_id'),
  },
  (t) => [
    primaryKey({ name: 'load_film_pk', columns: [t.darkroomId, t.actionId, t.ordinal] }),
    foreignKey({
      name: 'load_film_load_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [loads.darkroomId, loads.actionId],
    }),
    foreignKey({
      name: 'load_film_membership_fk',
      columns: [t.darkroomId, t.ownerMembershipId],
      foreignColumns: [memberships.darkroomId, memberships.id],
    }),
    foreignKey({
      name: 'load_film_guest_fk',
      columns: [t.darkroomId, t.ownerGuestId],
      foreignColumns: [guests.darkroomId, guests.id],
    }),
    index('load_film_by_membership').on(t.darkroomId, t.ownerMembershipId),
    check('load_film_count', sql`${t.count} > 0`),
    check(
      'load_film_size',
      sql`(${t.format} = 'sheet') = (${t.widthMm} is not null and ${t.heightMm} is not null)`,
    ),
    check('load_film_owner', sql`num_nonnulls(${t.ownerMembershipId}, ${t.ownerGuestId}) = 1`),
    ownDarkroomOnly('load_film'),
  ],
);

const stepFlags = [
  'over_capacity',
  'past_date',
  'on_hold',
  'after_discard',
  'incompatible',
  'wrong_material',
  'volume_short',
] as const satisfies readonly StepFlag[];

/** One bottle that a load went through: what it was charged, rounded up once, and how the bottle stood as far as was known then. */
export const loadSteps = pgTable(
  'load_steps',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    bottleId: uuid('bottle_id').notNull(),
    material: text('material', { enum: materials }).notNull(),
    nominalE4: tenThousandths('nominal_e4').notNull(),
    /** The film class's factor in 1/10,000; null where the load's classes have different ones. */
    factorE4: integer('factor_e4'),
    countedE4: tenThousandths('counted_e4').notNull(),
    takenUl: microlitres('taken_ul').notNull(),
    flags: text('flags').array().$type<StepFlag[]>().notNull(),
  },
  (t) => [
    primaryKey({ name: 'load_steps_pk', columns: [t.darkroomId, t.actionId, t.bottleId] }),
    foreignKey({
      name: 'load_steps_load_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [loads.darkroomId, loads.actionId],
    }),
    foreignKey({
      name: 'load_steps_bottle_fk',
      columns: [t.darkroomId, t.bottleId],
      foreignColumns: [bottles.darkroomId, bottles.id],
    }),
    index('load_steps_by_bottle').on(t.darkroomId, t.bottleId, t.actionId),
    check('load_steps_material', oneOf('material', materials)),
    check(
      'load_steps_amounts',
      sql`${t.nominalE4} > 0 and ${t.countedE4} > 0 and ${t.factorE4} > 0 and ${t.takenUl} >= 0`,
    ),
    check(
      'load_steps_flags',
      sql.raw(`flags <@ array[${stepFlags.map((flag) => `'${flag}'`).join(', ')}]::text[]`),
    ),
    ownDarkroomOnly('load_steps'),
  ],
);

/** A technician's decision on a reported load. It changes no number; only a void subtracts. */
export const decisions = pgTable(
  'decisions',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    loadActionId: uuid('load_action_id').notNull(),
    decision: text('decision', { enum: ['accept'] }).notNull(),
    reason: text('reason').notNull(),
  },
  (t) => [
    primaryKey({ name: 'decisions_pk', columns: [t.darkroomId, t.actionId] }),
    foreignKey({
      name: 'decisions_action_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    foreignKey({
      name: 'decisions_load_fk',
      columns: [t.darkroomId, t.loadActionId],
      foreignColumns: [loads.darkroomId, loads.actionId],
    }),
    check('decisions_decision', oneOf('decision', ['accept'])),
    index('decisions_by_load').on(t.darkroomId, t.loadActionId),
    ownDarkroomOnly('decisions'),
  ],
);
