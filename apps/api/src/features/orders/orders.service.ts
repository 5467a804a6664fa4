import { AddressesRepository } from '../../platform/auth/addresses.repository.js';
import { Injectable } from '@nestjs/common';
import type { Me } from '../../platform/auth/me.js';
import type { Tx } from '../../platform/database/database.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import { orderMail } from './order-mail.js';
import { OrderViews, toMailOrder, toOrderView, type WholeOrder } from './order-views.js';
import type { OneOrderAnswer, OrdersAnswer, OrderState, OrderView } from './order.view.js';
import { OrdersRepository } from './orders.repository.js';

@Injectable()
export class OrdersService {
  constructor(
    private readonly addresses: AddressesRepository,
    private readonly repository: OrdersRepository,
    private readonly views: OrderViews,
  ) {}

  list(enter: Entrance, state: OrderState | undefined): Promise<OrdersAnswer> {
    return enter(async (tx, me) => ({ orders: await this.views.list(tx, me.darkroomId, state) }));
  }

  /** @throws Problem 'not-found' */
  one(enter: Entrance, id: string): Promise<OneOrderAnswer> {
    return enter(async (tx, me) => {
      const whole = await this.views.whole(tx, me.darkroomId, id);
      return { order: toOrderView(whole), mailText: await this.mailText(tx, me, whole) };
    });
  }

  view(tx: Tx, darkroomId: string, id: string): Promise<OrderView> {
    return this.views.one(tx, darkroomId, id);
  }

  /** Packs that are sent for and not here yet, by the pack's id; a pack without any is left out. */
  async onOrder(tx: Tx, darkroomId: string, packIds?: readonly string[]): Promise<Map<string, number>> {
    const rows = await this.repository.onOrder(tx, darkroomId, packIds);
    return new Map(rows.map(({ packId, count }) => [packId, count]));
  }

  private async mailText(tx: Tx, me: Me, whole: WholeOrder): Promise<string | null> {
    if (whole.detail.order.state !== 'draft') return whole.mail?.body ?? null;
    const address = await this.addresses.ofMember(tx, me.darkroomId, me.membershipId);
    return orderMail(toMailOrder(whole, me.darkroomName, { name: me.displayName, address })).body;
  }
}
