import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  date,
  foreignKey,
  index,
  integer,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { chemistries } from './chemistries.js';
import {
  darkroomId,
  instant,
  microlitres,
  milligrams,
  minorUnits,
  oneOf,
  ownDarkroomOnly,
} from './columns.js';

export const packForms = ['kit', 'concentrate', 'powder', 'ready-to-use', 'raw'] as const;
export type PackForm = (typeof packForms)[number];

/** What chemistry is bought in. */
export const packs = pgTable(
  'packs',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    name: text('name').notNull(),
    form: text('form', { enum: packForms }).notNull(),
    /** Months that an unopened pack keeps, for guessing an expiry that is not printed on it; null: not known. */
    keepsUnopenedMonths: integer('keeps_unopened_months'),
    /** Order when unopened + on order is at or under this; null: the house does not watch it. */
    reorderPoint: integer('reorder_point'),
    reorderUpTo: integer('reorder_up_to'),
    archivedAt: instant('archived_at'),
  },
  (t) => [
    primaryKey({ name: 'packs_pk', columns: [t.darkroomId, t.id] }),
    check('packs_form', oneOf('form', packForms)),
    check('packs_keeps', sql`${t.keepsUnopenedMonths} > 0`),
    check('packs_reorder', sql`${t.reorderPoint} >= 0 and ${t.reorderUpTo} > ${t.reorderPoint}`),
    ownDarkroomOnly('packs'),
  ],
);

/** A pack's parts: A, B, C, or one part without a name. Each holds mL or g. */
export const packParts = pgTable(
  'pack_parts',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    packId: uuid('pack_id').notNull(),
    position: integer('position').notNull(),
    name: text('name').notNull(),
    sizeUl: microlitres('size_ul'),
    sizeMg: milligrams('size_mg'),
    keepsOpenedMonths: integer('keeps_opened_months'),
  },
  (t) => [
    primaryKey({ name: 'pack_parts_pk', columns: [t.darkroomId, t.id] }),
    unique('pack_parts_position_uq').on(t.darkroomId, t.packId, t.position),
    foreignKey({
      name: 'pack_parts_pack_fk',
      columns: [t.darkroomId, t.packId],
      foreignColumns: [packs.darkroomId, packs.id],
    }),
    check(
      'pack_parts_size',
      sql`num_nonnulls(${t.sizeUl}, ${t.sizeMg}) = 1 and coalesce(${t.sizeUl}, ${t.sizeMg}) > 0`,
    ),
    ownDarkroomOnly('pack_parts'),
  ],
);

/** What a pack, or a stock solution, makes: which chemistry and how much of it when it is used whole. */
export const makes = pgTable(
  'makes',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    packId: uuid('pack_id'),
    stockChemistryId: uuid('stock_chemistry_id'),
    chemistryId: uuid('chemistry_id').notNull(),
    /** Volume of the working solution from one whole pack; null for a stock solution, whose dilution tells it. */
    volumeUl: microlitres('volume_ul'),
    /** A powder packet is mixed whole; liquid parts may be divided in proportion. */
    wholeOnly: boolean('whole_only').notNull(),
  },
  (t) => [
    primaryKey({ name: 'makes_pk', columns: [t.darkroomId, t.id] }),
    foreignKey({
      name: 'makes_pack_fk',
      columns: [t.darkroomId, t.packId],
      foreignColumns: [packs.darkroomId, packs.id],
    }),
    foreignKey({
      name: 'makes_stock_chemistry_fk',
      columns: [t.darkroomId, t.stockChemistryId],
      foreignColumns: [chemistries.darkroomId, chemistries.id],
    }),
    foreignKey({
      name: 'makes_chemistry_fk',
      columns: [t.darkroomId, t.chemistryId],
      foreignColumns: [chemistries.darkroomId, chemistries.id],
    }),
    check('makes_from', sql`num_nonnulls(${t.packId}, ${t.stockChemistryId}) = 1`),
    check('makes_volume', sql`${t.volumeUl} > 0 and (${t.packId} is null) = (${t.volumeUl} is null)`),
    ownDarkroomOnly('makes'),
  ],
);

export const suppliers = pgTable(
  'suppliers',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    name: text('name').notNull(),
    email: text('email').notNull(),
    currency: text('currency').notNull(),
    minimumMinor: minorUnits('minimum_minor'),
    /** As told by the supplier; null: learnt from past orders, else a guess. */
    leadDays: integer('lead_days'),
    archivedAt: instant('archived_at'),
  },
  (t) => [
    primaryKey({ name: 'suppliers_pk', columns: [t.darkroomId, t.id] }),
    check('suppliers_numbers', sql`${t.minimumMinor} >= 0 and ${t.leadDays} >= 0`),
    check('suppliers_currency', sql`${t.currency} ~ '^[A-Z]{3}$'`),
    ownDarkroomOnly('suppliers'),
  ],
);

/** A pack as one supplier sells it. The currency is the supplier's. */
export const supplierPacks = pgTable(
  'supplier_packs',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    supplierId: uuid('supplier_id').notNull(),
    packId: uuid('pack_id').notNull(),
    /** The supplier's own name or number for it, for the order. */
    supplierName: text('supplier_name').notNull(),
    priceMinor: minorUnits('price_minor'),
    /** Sold out until this day, as the house was told. */
    outUntil: date('out_until', { mode: 'string' }),
  },
  (t) => [
    primaryKey({ name: 'supplier_packs_pk', columns: [t.darkroomId, t.id] }),
    unique('supplier_packs_pair_uq').on(t.darkroomId, t.supplierId, t.packId),
    foreignKey({
      name: 'supplier_packs_supplier_fk',
      columns: [t.darkroomId, t.supplierId],
      foreignColumns: [suppliers.darkroomId, suppliers.id],
    }),
    foreignKey({
      name: 'supplier_packs_pack_fk',
      columns: [t.darkroomId, t.packId],
      foreignColumns: [packs.darkroomId, packs.id],
    }),
    check('supplier_packs_price', sql`${t.priceMinor} >= 0`),
    index('supplier_packs_by_pack').on(t.darkroomId, t.packId),
    ownDarkroomOnly('supplier_packs'),
  ],
);

/** Unmixed stock by lot. `unopened` is the running sum of the lot's movements, moved under its row lock. */
export const lots = pgTable(
  'lots',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    packId: uuid('pack_id').notNull(),
    lotNumber: text('lot_number').notNull(),
    expiresOn: date('expires_on', { mode: 'string' }),
    expiryIsGuess: boolean('expiry_is_guess').notNull(),
    unopened: integer('unopened').notNull(),
  },
  (t) => [
    primaryKey({ name: 'lots_pk', columns: [t.darkroomId, t.id] }),
    foreignKey({
      name: 'lots_pack_fk',
      columns: [t.darkroomId, t.packId],
      foreignColumns: [packs.darkroomId, packs.id],
    }),
    index('lots_by_pack').on(t.darkroomId, t.packId, t.id),
    check('lots_unopened', sql`${t.unopened} >= 0`),
    ownDarkroomOnly('lots'),
  ],
);

/** One part of one opened pack and what is left in it. An emptied one stays, at 0. */
export const openedPacks = pgTable(
  'opened_packs',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    lotId: uuid('lot_id').notNull(),
    packPartId: uuid('pack_part_id').notNull(),
    openedOn: date('opened_on', { mode: 'string' }).notNull(),
    leftUl: microlitres('left_ul'),
    leftMg: milligrams('left_mg'),
    /** Set when the opening itself was voided: it never was opened. */
    voidedAt: instant('voided_at'),
  },
  (t) => [
    primaryKey({ name: 'opened_packs_pk', columns: [t.darkroomId, t.id] }),
    foreignKey({
      name: 'opened_packs_lot_fk',
      columns: [t.darkroomId, t.lotId],
      foreignColumns: [lots.darkroomId, lots.id],
    }),
    foreignKey({
      name: 'opened_packs_part_fk',
      columns: [t.darkroomId, t.packPartId],
      foreignColumns: [packParts.darkroomId, packParts.id],
    }),
    index('opened_packs_by_lot').on(t.darkroomId, t.lotId, t.id),
    check(
      'opened_packs_left',
      sql`num_nonnulls(${t.leftUl}, ${t.leftMg}) = 1 and coalesce(${t.leftUl}, ${t.leftMg}) >= 0`,
    ),
    ownDarkroomOnly('opened_packs'),
  ],
);
