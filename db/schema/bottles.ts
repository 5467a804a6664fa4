import type { BottleTotals } from '@wetside/chemistry';
import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { actions } from './actions.js';
import { chemistryVersions } from './chemistries.js';
import { darkroomId, instant, microlitres, minorUnits, oneOf, ownDarkroomOnly } from './columns.js';

export const materials = ['film', 'rc-paper', 'fb-paper'] as const;
export const containerKinds = ['bottle', 'floating-lid', 'tray', 'tank'] as const;
export const containerMaterials = ['glass', 'pet', 'soft-polyethylene', 'concertina'] as const;

/** Any mixed solution with a label. Immutable: how it stands is in its totals. */
export const bottles = pgTable(
  'bottles',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    /** FX-31: two letters by role and a number that is never used again. */
    code: text('code').notNull(),
    chemistryVersionId: uuid('chemistry_version_id').notNull(),
    /** A fixer is for film or for paper from its mixing on; null: the chemistry takes whatever its document lists. */
    material: text('material', { enum: materials }),
    /** The action that made it. */
    madeByActionId: uuid('made_by_action_id').notNull(),
    /** What its chemistry cost on its day. */
    costMinor: minorUnits('cost_minor'),
    currency: text('currency'),
  },
  (t) => [
    primaryKey({ name: 'bottles_pk', columns: [t.darkroomId, t.id] }),
    unique('bottles_code_uq').on(t.darkroomId, t.code),
    foreignKey({
      name: 'bottles_version_fk',
      columns: [t.darkroomId, t.chemistryVersionId],
      foreignColumns: [chemistryVersions.darkroomId, chemistryVersions.id],
    }),
    foreignKey({
      name: 'bottles_action_fk',
      columns: [t.darkroomId, t.madeByActionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    index('bottles_by_action').on(t.darkroomId, t.madeByActionId),
    check('bottles_material', oneOf('material', materials)),
    check('bottles_cost', sql`(${t.costMinor} is null) = (${t.currency} is null)`),
    ownDarkroomOnly('bottles'),
  ],
);

/**
 * The running totals of a bottle: the fold of its actions, kept by `apply` under this row's lock, exactly as the
 * rules' package writes them. Row locks are taken here first, in the order of bottle_id. The columns beside the
 * document repeat what queries look for; a test holds them equal.
 */
export const bottleTotals = pgTable(
  'bottle_totals',
  {
    darkroomId: darkroomId(),
    bottleId: uuid('bottle_id').notNull(),
    /** Null: its mix was voided, it never stood here. */
    totals: jsonb('totals').$type<BottleTotals>(),
    inUse: boolean('in_use').notNull(),
    volumeUl: microlitres('volume_ul').notNull(),
    /** When time alone would change its verdict: a hint for the sweep, checked by reconcile. */
    nextLookAt: instant('next_look_at'),
  },
  (t) => [
    primaryKey({ name: 'bottle_totals_pk', columns: [t.darkroomId, t.bottleId] }),
    foreignKey({
      name: 'bottle_totals_bottle_fk',
      columns: [t.darkroomId, t.bottleId],
      foreignColumns: [bottles.darkroomId, bottles.id],
    }),
    index('bottle_totals_in_use')
      .on(t.darkroomId, t.bottleId)
      .where(sql`in_use`),
    index('bottle_totals_next_look')
      .on(t.darkroomId, t.nextLookAt)
      .where(sql`next_look_at is not null`),
    check('bottle_totals_volume', sql`${t.volumeUl} >= 0`),
    check('bottle_totals_in_use_real', sql`not (${t.inUse} and ${t.totals} is null)`),
    ownDarkroomOnly('bottle_totals'),
  ],
);

/** The last number given out: bottle codes by their two letters, orders by 'order'. */
export const counters = pgTable(
  'counters',
  { darkroomId: darkroomId(), name: text('name').notNull(), last: integer('last').notNull() },
  (t) => [
    primaryKey({ name: 'counters_pk', columns: [t.darkroomId, t.name] }),
    check('counters_last', sql`${t.last} >= 0`),
    ownDarkroomOnly('counters'),
  ],
);
