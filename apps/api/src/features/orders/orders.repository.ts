import { Injectable } from '@nestjs/common';
import {
  counters,
  mails,
  memberships,
  orderChanges,
  orderLines,
  orders,
  packs,
  supplierPacks,
  suppliers,
} from '@wetside/db';
import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { Tx } from '../../platform/database/database.js';
import type { OrderState } from './order.view.js';

export type OrderRow = typeof orders.$inferSelect;
export type OrderLineRow = typeof orderLines.$inferSelect;
export type OrderDetail = Awaited<ReturnType<OrdersRepository['details']>>[number];
export type OrderLineDetail = Awaited<ReturnType<OrdersRepository['lines']>>[number];

/** A line's counts as they are to be written. */
export type LineChange = Pick<OrderLineRow, 'id' | 'count' | 'received' | 'cancelled'>;

const drafters = alias(memberships, 'drafters');
const senders = alias(memberships, 'senders');

@Injectable()
export class OrdersRepository {
  /** Orders by their number, newest first: those named, those in one state, or all. */
  details(tx: Tx, darkroomId: string, which: { ids: readonly string[] } | { state: OrderState | undefined }) {
    const wanted =
      'ids' in which ? inArray(orders.id, [...which.ids]) : which.state && eq(orders.state, which.state);
    return tx
      .select({
        order: orders,
        supplierName: suppliers.name,
        supplierEmail: suppliers.email,
        draftedBy: drafters.displayName,
        sentBy: senders.displayName,
      })
      .from(orders)
      .innerJoin(
        suppliers,
        and(eq(suppliers.darkroomId, orders.darkroomId), eq(suppliers.id, orders.supplierId)),
      )
      .innerJoin(drafters, and(eq(drafters.darkroomId, orders.darkroomId), eq(drafters.id, orders.draftedBy)))
      .leftJoin(senders, and(eq(senders.darkroomId, orders.darkroomId), eq(senders.id, orders.sentBy)))
      .where(and(eq(orders.darkroomId, darkroomId), wanted))
      .orderBy(desc(orders.number));
  }

  /** The lines of these orders, in their order. */
  lines(tx: Tx, darkroomId: string, orderIds: readonly string[]) {
    return tx
      .select({
        orderId: orderLines.orderId,
        id: orderLines.id,
        supplierPackId: orderLines.supplierPackId,
        packId: supplierPacks.packId,
        packName: packs.name,
        supplierName: supplierPacks.supplierName,
        position: orderLines.position,
        count: orderLines.count,
        priceMinor: orderLines.priceMinor,
        received: orderLines.received,
        cancelled: orderLines.cancelled,
      })
      .from(orderLines)
      .innerJoin(
        supplierPacks,
        and(
          eq(supplierPacks.darkroomId, orderLines.darkroomId),
          eq(supplierPacks.id, orderLines.supplierPackId),
        ),
      )
      .innerJoin(
        packs,
        and(eq(packs.darkroomId, supplierPacks.darkroomId), eq(packs.id, supplierPacks.packId)),
      )
      .where(and(eq(orderLines.darkroomId, darkroomId), inArray(orderLines.orderId, [...orderIds])))
      .orderBy(asc(orderLines.orderId), asc(orderLines.position));
  }

  /** The newest mail to the supplier about each of these orders. */
  mails(tx: Tx, darkroomId: string, orderIds: readonly string[]) {
    return tx
      .selectDistinctOn([mails.orderId], {
        orderId: mails.orderId,
        state: mails.state,
        lastAnswer: mails.lastAnswer,
        unclearTries: mails.unclearTries,
        body: mails.body,
      })
      .from(mails)
      .where(and(eq(mails.darkroomId, darkroomId), inArray(mails.orderId, [...orderIds])))
      .orderBy(asc(mails.orderId), desc(mails.createdAt), desc(mails.id));
  }

  /** Locks the order, and its lines after it in the order of their ids. */
  async lock(tx: Tx, darkroomId: string, id: string): Promise<OrderRow | null> {
    const [row] = await tx
      .select()
      .from(orders)
      .where(and(eq(orders.darkroomId, darkroomId), eq(orders.id, id)))
      .for('no key update');
    if (!row) return null;
    await tx
      .select({ id: orderLines.id })
      .from(orderLines)
      .where(and(eq(orderLines.darkroomId, darkroomId), eq(orderLines.orderId, id)))
      .orderBy(asc(orderLines.id))
      .for('no key update');
    return row;
  }

  /** The next order's number; the counter's row stays locked until the end, so numbers have no gaps. */
  async nextNumber(tx: Tx, darkroomId: string): Promise<number> {
    const [row] = await tx
      .insert(counters)
      .values({ darkroomId, name: 'order', last: 1 })
      .onConflictDoUpdate({
        target: [counters.darkroomId, counters.name],
        set: { last: sql`${counters.last} + 1` },
      })
      .returning({ last: counters.last });
    if (!row) throw new Error('The counter of orders gave no number.');
    return row.last;
  }

  async insert(tx: Tx, row: typeof orders.$inferInsert): Promise<void> {
    await tx.insert(orders).values(row);
  }

  async insertLines(tx: Tx, rows: (typeof orderLines.$inferInsert)[]): Promise<void> {
    if (rows.length > 0) await tx.insert(orderLines).values(rows);
  }

  async update(tx: Tx, darkroomId: string, id: string, set: Partial<OrderRow>): Promise<void> {
    await tx
      .update(orders)
      .set(set)
      .where(and(eq(orders.darkroomId, darkroomId), eq(orders.id, id)));
  }

  /** Writes the counts of all these lines in one statement; they are locked already. */
  async writeLines(tx: Tx, darkroomId: string, lines: readonly LineChange[]): Promise<void> {
    if (lines.length === 0) return;
    const rows = JSON.stringify(
      lines.map(({ id, count, received, cancelled }) => ({ id, count, received, cancelled })),
    );
    await tx.execute(sql`
      update ${orderLines} as l set count = d.count, received = d.received, cancelled = d.cancelled
      from jsonb_to_recordset(${rows}::text::jsonb) as d(id uuid, count int, received int, cancelled int)
      where l.darkroom_id = ${darkroomId} and l.id = d.id`);
  }

  async addChange(tx: Tx, row: typeof orderChanges.$inferInsert): Promise<void> {
    await tx.insert(orderChanges).values(row);
  }

  async changedOrder(tx: Tx, darkroomId: string, actionId: string): Promise<string | null> {
    const [row] = await tx
      .select({ orderId: orderChanges.orderId })
      .from(orderChanges)
      .where(and(eq(orderChanges.darkroomId, darkroomId), eq(orderChanges.actionId, actionId)));
    return row?.orderId ?? null;
  }

  /** Packs that are sent for and not here yet. */
  onOrder(tx: Tx, darkroomId: string, packIds?: readonly string[]) {
    return tx
      .select({
        packId: supplierPacks.packId,
        count: sql<number>`sum(greatest(${orderLines.count} - ${orderLines.received} - ${orderLines.cancelled}, 0))::int`,
      })
      .from(orders)
      .innerJoin(
        orderLines,
        and(eq(orderLines.darkroomId, orders.darkroomId), eq(orderLines.orderId, orders.id)),
      )
      .innerJoin(
        supplierPacks,
        and(
          eq(supplierPacks.darkroomId, orderLines.darkroomId),
          eq(supplierPacks.id, orderLines.supplierPackId),
        ),
      )
      .where(
        and(
          eq(orders.darkroomId, darkroomId),
          eq(orders.state, 'sent'),
          packIds && inArray(supplierPacks.packId, [...packIds]),
        ),
      )
      .groupBy(supplierPacks.packId);
  }
}
