import { sql } from 'drizzle-orm';
import { check, foreignKey, integer, index, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { actions } from './actions.js';
import { bottles, containerKinds, containerMaterials } from './bottles.js';
import { darkroomId, instant, microlitres, milligrams, oneOf, ownDarkroomOnly } from './columns.js';
import { lots, openedPacks, packParts } from './stock.js';

/** A new bottle was mixed. */
export const mixes = pgTable(
  'mixes',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    bottleId: uuid('bottle_id').notNull(),
    volumeUl: microlitres('volume_ul').notNull(),
    containerSizeUl: microlitres('container_size_ul').notNull(),
    containerKind: text('container_kind', { enum: containerKinds }).notNull(),
    containerMaterial: text('container_material', { enum: containerMaterials }),
    /** Cooled, cleared, stood: not before this. */
    readyAt: instant('ready_at'),
    note: text('note'),
  },
  (t) => [
    primaryKey({ name: 'mixes_pk', columns: [t.darkroomId, t.actionId] }),
    foreignKey({
      name: 'mixes_action_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    foreignKey({
      name: 'mixes_bottle_fk',
      columns: [t.darkroomId, t.bottleId],
      foreignColumns: [bottles.darkroomId, bottles.id],
    }),
    index('mixes_by_bottle').on(t.darkroomId, t.bottleId),
    check('mixes_container_kind', oneOf('container_kind', containerKinds)),
    check('mixes_container_material', oneOf('container_material', containerMaterials)),
    check('mixes_volume', sql`${t.volumeUl} > 0 and ${t.containerSizeUl} >= ${t.volumeUl}`),
    ownDarkroomOnly('mixes'),
  ],
);

/** What went into a mix, part by part: from a lot's pack (opened before or by this mix) or from a stock bottle; neither: measured by hand. */
export const mixDraws = pgTable(
  'mix_draws',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    ordinal: integer('ordinal').notNull(),
    lotId: uuid('lot_id'),
    packPartId: uuid('pack_part_id'),
    openedPackId: uuid('opened_pack_id'),
    parentBottleId: uuid('parent_bottle_id'),
    volumeUl: microlitres('volume_ul'),
    massMg: milligrams('mass_mg'),
  },
  (t) => [
    primaryKey({ name: 'mix_draws_pk', columns: [t.darkroomId, t.actionId, t.ordinal] }),
    foreignKey({
      name: 'mix_draws_mix_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [mixes.darkroomId, mixes.actionId],
    }),
    foreignKey({
      name: 'mix_draws_lot_fk',
      columns: [t.darkroomId, t.lotId],
      foreignColumns: [lots.darkroomId, lots.id],
    }),
    foreignKey({
      name: 'mix_draws_part_fk',
      columns: [t.darkroomId, t.packPartId],
      foreignColumns: [packParts.darkroomId, packParts.id],
    }),
    foreignKey({
      name: 'mix_draws_opened_fk',
      columns: [t.darkroomId, t.openedPackId],
      foreignColumns: [openedPacks.darkroomId, openedPacks.id],
    }),
    foreignKey({
      name: 'mix_draws_parent_fk',
      columns: [t.darkroomId, t.parentBottleId],
      foreignColumns: [bottles.darkroomId, bottles.id],
    }),
    index('mix_draws_by_parent').on(t.darkroomId, t.parentBottleId),
    check(
      'mix_draws_amount',
      sql`num_nonnulls(${t.volumeUl}, ${t.massMg}) = 1 and coalesce(${t.volumeUl}, ${t.massMg}) > 0`,
    ),
    check('mix_draws_from', sql`num_nonnulls(${t.lotId}, ${t.parentBottleId}) <= 1`),
    ownDarkroomOnly('mix_draws'),
  ],
);
