import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { Tx } from '../../platform/database/database.js';
import { problem } from '../../platform/errors/problem.js';
import { ActionsRepository, type ActionRow } from '../../platform/ledger/actions.repository.js';
import type { Recording } from '../../platform/ledger/recording.js';
import {
  touched,
  VoidHandlers,
  type Touched,
  type VoidHandler,
} from '../../platform/ledger/void-handlers.js';
import { OrderDeliveries, type LockedOrder } from '../orders/order-deliveries.js';
import { PackLocks } from '../suppliers/pack-locks.js';
import { sumBy } from './receipt-rules.js';
import type { LotRow } from './shelf.repository.js';
import { StockHistoryRepository, type DeliveryLineRow } from './stock-history.repository.js';
import { StockRepository } from './stock.repository.js';

interface LockedReceipt {
  lines: DeliveryLineRow[];
  lots: LotRow[];
  packIds: string[];
  order: LockedOrder | null;
}

/** Takes a receipt back while all that it brought is still there unopened. */
@Injectable()
export class ReceiptVoids implements OnModuleInit, VoidHandler {
  constructor(
    private readonly actions: ActionsRepository,
    private readonly stock: StockRepository,
    private readonly history: StockHistoryRepository,
    private readonly packs: PackLocks,
    private readonly deliveries: OrderDeliveries,
    private readonly voids: VoidHandlers,
  ) {}

  onModuleInit(): void {
    this.voids.register('receipt', this);
  }

  async prepare(tx: Tx, { darkroomId }: Recording, target: ActionRow): Promise<void> {
    const { lines, lots } = await this.lock(tx, darkroomId, target.id);
    // Taken back already: the void says so itself.
    if (await this.actions.isVoided(tx, darkroomId, target.id)) return;
    const came = sumBy(lines, (line) => line.lotId);
    for (const { id, lotNumber, unopened } of lots) {
      if (unopened >= (came.get(id) ?? 0)) continue;
      const codes = await this.history.codesOpenedFrom(tx, darkroomId, id);
      const why =
        codes.length > 0
          ? `${codes.join(', ')} ${codes.length === 1 ? 'was' : 'were'} mixed from it.`
          : 'It was counted since.';
      throw problem('leans-on-it', `Fewer of lot ${lotNumber} are left unopened than came: ${why}`);
    }
  }

  async undo(tx: Tx, { darkroomId }: Recording, target: ActionRow): Promise<Touched> {
    const { lines, packIds, order } = await this.lock(tx, darkroomId, target.id);
    const came = sumBy(lines, (line) => line.lotId);
    await this.stock.moveLots(
      tx,
      darkroomId,
      [...came].map(([lotId, count]) => ({ lotId, unopened: -count })),
    );
    if (order)
      await this.deliveries.takeBack(
        tx,
        order,
        sumBy(lines, (line) => line.orderLineId),
      );
    return touched({ packIds });
  }

  private async lock(tx: Tx, darkroomId: string, actionId: string): Promise<LockedReceipt> {
    const delivery = await this.history.delivery(tx, darkroomId, actionId);
    const lines = await this.history.deliveryLines(tx, darkroomId, actionId);
    const lotIds = [...new Set(lines.map((line) => line.lotId))];
    const packIds = await this.stock.packIds(tx, darkroomId, lotIds, []);
    await this.packs.lock(tx, darkroomId, packIds);
    const lots = await this.stock.lockLots(tx, darkroomId, lotIds);
    const order = delivery?.orderId ? await this.deliveries.lock(tx, darkroomId, delivery.orderId) : null;
    return { lines, lots, packIds, order };
  }
}
