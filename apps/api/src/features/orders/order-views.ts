import { Injectable } from '@nestjs/common';
import type { Tx } from '../../platform/database/database.js';
import { problem } from '../../platform/errors/problem.js';
import { numberText, totalMinor } from './order-lines.js';
import type { MailOrder } from './order-mail.js';
import type { OrderState, OrderView } from './order.view.js';
import { OrdersRepository, type OrderDetail, type OrderLineDetail } from './orders.repository.js';

type OrderMailRow = Awaited<ReturnType<OrdersRepository['mails']>>[number];

/** An order with everything that is said of it. */
export interface WholeOrder {
  detail: OrderDetail;
  lines: OrderLineDetail[];
  mail: OrderMailRow | null;
}

/** Orders as they are read: three statements, however many. */
@Injectable()
export class OrderViews {
  constructor(private readonly repository: OrdersRepository) {}

  async list(tx: Tx, darkroomId: string, state: OrderState | undefined): Promise<OrderView[]> {
    return (await this.read(tx, darkroomId, { state })).map(toOrderView);
  }

  /** @throws Problem 'not-found' */
  async whole(tx: Tx, darkroomId: string, id: string): Promise<WholeOrder> {
    const [found] = await this.read(tx, darkroomId, { ids: [id] });
    if (!found) throw problem('not-found');
    return found;
  }

  async one(tx: Tx, darkroomId: string, id: string): Promise<OrderView> {
    return toOrderView(await this.whole(tx, darkroomId, id));
  }

  private async read(
    tx: Tx,
    darkroomId: string,
    which: { ids: readonly string[] } | { state: OrderState | undefined },
  ): Promise<WholeOrder[]> {
    const details = await this.repository.details(tx, darkroomId, which);
    const ids = details.map(({ order }) => order.id);
    if (ids.length === 0) return [];
    const lines = await this.repository.lines(tx, darkroomId, ids);
    const mails = await this.repository.mails(tx, darkroomId, ids);
    return details.map((detail) => ({
      detail,
      lines: lines.filter((line) => line.orderId === detail.order.id),
      mail: mails.find((mail) => mail.orderId === detail.order.id) ?? null,
    }));
  }
}

export function toOrderView({ detail, lines, mail }: WholeOrder): OrderView {
  const { order } = detail;
  return {
    id: order.id,
    number: order.number,
    numberText: numberText(order.number),
    supplier: { id: order.supplierId, name: detail.supplierName, email: detail.supplierEmail },
    state: order.state,
    currency: order.currency,
    note: order.note,
    revision: order.revision,
    draftedBy: detail.draftedBy,
    draftedAt: order.draftedAt.toISOString(),
    sentBy: detail.sentBy,
    sentAt: order.sentAt?.toISOString() ?? null,
    totalMinor: totalMinor(lines),
    lines: lines.map(({ orderId: _order, position: _position, ...line }) => line),
    mail: mail && { state: mail.state, lastAnswer: mail.lastAnswer, unclearTries: mail.unclearTries },
  };
}

/** The same order as its mail names it. */
export function toMailOrder(
  { detail, lines }: WholeOrder,
  darkroomName: string,
  sender: MailOrder['sender'],
): MailOrder {
  const { number, currency, note } = detail.order;
  return { number, currency, note, darkroomName, supplierName: detail.supplierName, lines, sender };
}
