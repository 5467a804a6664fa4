import { Injectable } from '@nestjs/common';
import type { Tx } from '../../platform/database/database.js';
import { isDone } from './order-lines.js';
import { OrdersRepository, type OrderLineDetail, type OrderRow } from './orders.repository.js';

/** An order and its lines, locked. */
export interface LockedOrder {
  order: OrderRow;
  lines: OrderLineDetail[];
}

/** What came of an order, by its line's id. */
export type CameByLine = ReadonlyMap<string, number>;

/** Keeps the orders' running counts while packs arrive. */
@Injectable()
export class OrderDeliveries {
  constructor(private readonly repository: OrdersRepository) {}

  /** Locks the order and its lines; packs and lots are locked before. */
  async lock(tx: Tx, darkroomId: string, orderId: string): Promise<LockedOrder | null> {
    const order = await this.repository.lock(tx, darkroomId, orderId);
    return order && { order, lines: await this.repository.lines(tx, darkroomId, [orderId]) };
  }

  /** Counts what came and closes the order at `at` when nothing of it is still to come. */
  async receive(tx: Tx, { order, lines }: LockedOrder, came: CameByLine, at: Date): Promise<void> {
    const moved = await this.move(tx, order, lines, came, 1);
    const done = isDone(moved);
    await this.repository.update(tx, order.darkroomId, order.id, {
      revision: order.revision + 1,
      ...(done ? { state: 'received' as const, closedAt: at } : {}),
    });
  }

  /** Takes a delivery off again; an order that waits for something opens anew. */
  async takeBack(tx: Tx, { order, lines }: LockedOrder, came: CameByLine): Promise<void> {
    const moved = await this.move(tx, order, lines, came, -1);
    const done = isDone(moved);
    await this.repository.update(tx, order.darkroomId, order.id, {
      revision: order.revision + 1,
      ...(done ? {} : { state: 'sent' as const, closedAt: null }),
    });
  }

  private async move(tx: Tx, order: OrderRow, lines: OrderLineDetail[], came: CameByLine, sign: 1 | -1) {
    const moved = lines.map((line) => ({
      ...line,
      received: line.received + sign * (came.get(line.id) ?? 0),
    }));
    await this.repository.writeLines(
      tx,
      order.darkroomId,
      moved.filter((line) => came.has(line.id)),
    );
    return moved;
  }
}
