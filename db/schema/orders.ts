import { sql } from 'drizzle-orm';
import {
  check,
  foreignKey,
  index,
  integer,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { actions } from './actions.js';
import {
  darkroomId,
  instant,
  microlitres,
  milligrams,
  minorUnits,
  oneOf,
  ownDarkroomOnly,
} from './columns.js';
import { memberships } from './people.js';
import { lots, openedPacks, packs, supplierPacks, suppliers } from './stock.js';

export const orderStates = ['draft', 'sent', 'received', 'cancelled'] as const;

export const orders = pgTable(
  'orders',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    number: integer('number').notNull(),
    supplierId: uuid('supplier_id').notNull(),
    state: text('state', { enum: orderStates }).notNull(),
    currency: text('currency').notNull(),
    note: text('note'),
    /** Rises with each change: two people editing one draft see each other. */
    revision: integer('revision').notNull(),
    draftedBy: uuid('drafted_by').notNull(),
    draftedAt: instant('drafted_at').notNull(),
    sentBy: uuid('sent_by'),
    sentAt: instant('sent_at'),
    closedAt: instant('closed_at'),
  },
  (t) => [
    primaryKey({ name: 'orders_pk', columns: [t.darkroomId, t.id] }),
    unique('orders_number_uq').on(t.darkroomId, t.number),
    foreignKey({
      name: 'orders_supplier_fk',
      columns: [t.darkroomId, t.supplierId],
      foreignColumns: [suppliers.darkroomId, suppliers.id],
    }),
    foreignKey({
      name: 'orders_drafted_by_fk',
      columns: [t.darkroomId, t.draftedBy],
      foreignColumns: [memberships.darkroomId, memberships.id],
    }),
    foreignKey({
      name: 'orders_sent_by_fk',
      columns: [t.darkroomId, t.sentBy],
      foreignColumns: [memberships.darkroomId, memberships.id],
    }),
    index('orders_by_state').on(t.darkroomId, t.state, t.number),
    check('orders_state', oneOf('state', orderStates)),
    check('orders_currency', sql`${t.currency} ~ '^[A-Z]{3}$'`),
    ownDarkroomOnly('orders'),
  ],
);

/** A line keeps the price of its day. `received` is the running sum of its deliveries, moved under its row lock. A count of 0 is a line taken out of the draft. */
export const orderLines = pgTable(
  'order_lines',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    orderId: uuid('order_id').notNull(),
    supplierPackId: uuid('supplier_pack_id').notNull(),
    position: integer('position').notNull(),
    count: integer('count').notNull(),
    priceMinor: minorUnits('price_minor'),
    received: integer('received').notNull(),
    /** What will not come any more. */
    cancelled: integer('cancelled').notNull(),
  },
  (t) => [
    primaryKey({ name: 'order_lines_pk', columns: [t.darkroomId, t.id] }),
    unique('order_lines_position_uq').on(t.darkroomId, t.orderId, t.position),
    foreignKey({
      name: 'order_lines_order_fk',
      columns: [t.darkroomId, t.orderId],
      foreignColumns: [orders.darkroomId, orders.id],
    }),
    foreignKey({
      name: 'order_lines_pack_fk',
      columns: [t.darkroomId, t.supplierPackId],
      foreignColumns: [supplierPacks.darkroomId, supplierPacks.id],
    }),
    check(
      'order_lines_counts',
      sql`${t.count} >= 0 and ${t.received} >= 0 and ${t.cancelled} >= 0 and ${t.priceMinor} >= 0`,
    ),
    index('order_lines_by_supplier_pack').on(t.darkroomId, t.supplierPackId),
    ownDarkroomOnly('order_lines'),
  ],
);

export const orderChangeKinds = ['drafted', 'sent', 'cancelled'] as const;

/** An action that moved an order on. */
export const orderChanges = pgTable(
  'order_changes',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    orderId: uuid('order_id').notNull(),
    change: text('change', { enum: orderChangeKinds }).notNull(),
    reason: text('reason'),
  },
  (t) => [
    primaryKey({ name: 'order_changes_pk', columns: [t.darkroomId, t.actionId] }),
    foreignKey({
      name: 'order_changes_action_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    foreignKey({
      name: 'order_changes_order_fk',
      columns: [t.darkroomId, t.orderId],
      foreignColumns: [orders.darkroomId, orders.id],
    }),
    check('order_changes_change', oneOf('change', orderChangeKinds)),
    ownDarkroomOnly('order_changes'),
  ],
);

/** What came in one go: of an order, or by hand. */
export const deliveries = pgTable(
  'deliveries',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    orderId: uuid('order_id'),
    note: text('note'),
  },
  (t) => [
    primaryKey({ name: 'deliveries_pk', columns: [t.darkroomId, t.actionId] }),
    foreignKey({
      name: 'deliveries_action_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    foreignKey({
      name: 'deliveries_order_fk',
      columns: [t.darkroomId, t.orderId],
      foreignColumns: [orders.darkroomId, orders.id],
    }),
    index('deliveries_by_order').on(t.darkroomId, t.orderId),
    ownDarkroomOnly('deliveries'),
  ],
);

export const deliveryLines = pgTable(
  'delivery_lines',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    ordinal: integer('ordinal').notNull(),
    orderLineId: uuid('order_line_id'),
    lotId: uuid('lot_id').notNull(),
    count: integer('count').notNull(),
    priceMinor: minorUnits('price_minor'),
    currency: text('currency'),
  },
  (t) => [
    primaryKey({ name: 'delivery_lines_pk', columns: [t.darkroomId, t.actionId, t.ordinal] }),
    foreignKey({
      name: 'delivery_lines_delivery_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [deliveries.darkroomId, deliveries.actionId],
    }),
    foreignKey({
      name: 'delivery_lines_order_line_fk',
      columns: [t.darkroomId, t.orderLineId],
      foreignColumns: [orderLines.darkroomId, orderLines.id],
    }),
    foreignKey({
      name: 'delivery_lines_lot_fk',
      columns: [t.darkroomId, t.lotId],
      foreignColumns: [lots.darkroomId, lots.id],
    }),
    index('delivery_lines_by_lot').on(t.darkroomId, t.lotId),
    check(
      'delivery_lines_count',
      sql`${t.count} > 0 and ${t.priceMinor} >= 0 and (${t.priceMinor} is null) = (${t.currency} is null)`,
    ),
    ownDarkroomOnly('delivery_lines'),
  ],
);

export const stockMovementKinds = ['received', 'opened', 'drawn', 'counted', 'written-off'] as const;

/** Every change of what is on the shelf: a lot's unopened packs, or what is left in an opened one. Their sums are the shelf. */
export const stockMovements = pgTable(
  'stock_movements',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    ordinal: integer('ordinal').notNull(),
    kind: text('kind', { enum: stockMovementKinds }).notNull(),
    packId: uuid('pack_id').notNull(),
    lotId: uuid('lot_id').notNull(),
    unopenedDelta: integer('unopened_delta').notNull(),
    openedPackId: uuid('opened_pack_id'),
    deltaUl: microlitres('delta_ul'),
    deltaMg: milligrams('delta_mg'),
    /** A count keeps the figure that was seen. */
    seen: integer('seen'),
    reason: text('reason'),
  },
  (t) => [
    primaryKey({ name: 'stock_movements_pk', columns: [t.darkroomId, t.actionId, t.ordinal] }),
    foreignKey({
      name: 'stock_movements_action_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    foreignKey({
      name: 'stock_movements_pack_fk',
      columns: [t.darkroomId, t.packId],
      foreignColumns: [packs.darkroomId, packs.id],
    }),
    foreignKey({
      name: 'stock_movements_lot_fk',
      columns: [t.darkroomId, t.lotId],
      foreignColumns: [lots.darkroomId, lots.id],
    }),
    foreignKey({
      name: 'stock_movements_opened_fk',
      columns: [t.darkroomId, t.openedPackId],
      foreignColumns: [openedPacks.darkroomId, openedPacks.id],
    }),
    index('stock_movements_by_lot').on(t.darkroomId, t.lotId),
    index('stock_movements_by_opened').on(t.darkroomId, t.openedPackId),
    check('stock_movements_kind', oneOf('kind', stockMovementKinds)),
    check(
      'stock_movements_amount',
      sql`(${t.openedPackId} is not null) = (num_nonnulls(${t.deltaUl}, ${t.deltaMg}) = 1)`,
    ),
    ownDarkroomOnly('stock_movements'),
  ],
);
