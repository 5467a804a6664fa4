import { Injectable } from '@nestjs/common';
import type { Tx } from '../../platform/database/database.js';
import { invalid, problem } from '../../platform/errors/problem.js';
import { HouseRepository } from '../../platform/house/house.repository.js';
import { ActionRecorder, type PutAction, type Recorded } from '../../platform/ledger/action-recorder.js';
import { ActionViews } from '../../platform/ledger/action-views.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import type { Recording } from '../../platform/ledger/recording.js';
import { touched } from '../../platform/ledger/void-handlers.js';
import { WarningsService } from '../alerts/warnings.service.js';
import { OrderDeliveries, type LockedOrder } from '../orders/order-deliveries.js';
import { numberText } from '../orders/order-lines.js';
import { OrdersService } from '../orders/orders.service.js';
import { PackLocks } from '../suppliers/pack-locks.js';
import { expiryOf, overDelivered, receiptComplaints, sumBy, type Known } from './receipt-rules.js';
import type { ReceiptAnswer, ReceiptContent } from './receipt.dto.js';
import type { LotRow, PackRow } from './shelf.repository.js';
import { ShelfService } from './shelf.service.js';
import { StockHistoryRepository } from './stock-history.repository.js';
import { StockRepository } from './stock.repository.js';

export type ReceiptPut = PutAction & { content: ReceiptContent };

const byId = <T extends { id: string }>(rows: readonly T[]) => new Map(rows.map((row) => [row.id, row]));

/** Packs that came, of an order or by hand. */
@Injectable()
export class ReceiptsService {
  constructor(
    private readonly recorder: ActionRecorder,
    private readonly actionViews: ActionViews,
    private readonly stock: StockRepository,
    private readonly history: StockHistoryRepository,
    private readonly packs: PackLocks,
    private readonly shelf: ShelfService,
    private readonly orders: OrdersService,
    private readonly deliveries: OrderDeliveries,
    private readonly houses: HouseRepository,
    private readonly warnings: WarningsService,
  ) {}

  /** @throws Problem 'not-found' and 'order-not-open' for the order, 'invalid' naming lines, 'more-than-ordered' */
  record(enter: Entrance, put: ReceiptPut): Promise<Recorded<ReceiptAnswer>> {
    const { orderId } = put.content;
    return this.recorder.record(
      enter,
      put,
      (tx, recording) => this.receive(tx, recording, put.content),
      async (tx, me) => ({
        action: await this.actionViews.one(tx, me, put.id),
        shelf: await this.shelf.shelf(tx, me),
        ...(orderId ? { order: await this.orders.view(tx, me.darkroomId, orderId) } : {}),
      }),
    );
  }

  private async receive(tx: Tx, recording: Recording, content: ReceiptContent): Promise<void> {
    const { darkroomId } = recording;
    const { lines, orderId } = content;
    const packIds = [...new Set(lines.map((line) => line.packId))];
    const packs = byId(await this.packs.lock(tx, darkroomId, packIds));
    const lots = byId(
      await this.stock.lockLots(
        tx,
        darkroomId,
        lines.map((line) => line.lotId),
      ),
    );
    const order = orderId === undefined ? null : await this.lockOrder(tx, darkroomId, orderId);
    refuse(content, { packs, lots, orderLines: byId(order?.lines ?? []) });
    await recording.add(tx);
    await this.stand(tx, recording, content, packs, lots);
    await this.deliver(tx, recording, content, order);
    const at = { darkroomId, zone: recording.me.zone, now: recording.now, cause: 'action' as const };
    await this.warnings.settle(tx, at, touched({ packIds }));
  }

  private async lockOrder(tx: Tx, darkroomId: string, orderId: string): Promise<LockedOrder> {
    const locked = await this.deliveries.lock(tx, darkroomId, orderId);
    if (!locked) throw problem('not-found');
    if (locked.order.state !== 'sent') throw problem('order-not-open', numberText(locked.order.number));
    return locked;
  }

  /** On the shelf: new lots, more of lots that are here, and a movement for each line. */
  private async stand(
    tx: Tx,
    { darkroomId, id: actionId, happenedOn }: Recording,
    { lines }: ReceiptContent,
    packs: ReadonlyMap<string, PackRow>,
    lots: ReadonlyMap<string, LotRow>,
  ): Promise<void> {
    const counts = sumBy(lines, (line) => line.lotId);
    const first = lines.filter((line, at) => lines.findIndex((one) => one.lotId === line.lotId) === at);
    const fresh = first.filter((line) => !lots.has(line.lotId));
    await this.stock.insertLots(
      tx,
      fresh.map(({ lotId, packId, lotNumber, expiresOn }) => ({
        darkroomId,
        id: lotId,
        packId,
        lotNumber,
        ...expiryOf(expiresOn, happenedOn, packs.get(packId)?.keepsUnopenedMonths ?? null),
        unopened: counts.get(lotId) ?? 0,
      })),
    );
    const more = [...lots.keys()].map((lotId) => ({ lotId, unopened: counts.get(lotId) ?? 0 }));
    await this.stock.moveLots(tx, darkroomId, more);
    await this.stock.insertMovements(
      tx,
      lines.map(({ packId, lotId, count }, ordinal) => ({
        darkroomId,
        actionId,
        ordinal,
        kind: 'received' as const,
        packId,
        lotId,
        unopenedDelta: count,
      })),
    );
  }

  /** On paper: what came with the price of its day, and what of the order is still to come. */
  private async deliver(
    tx: Tx,
    { darkroomId, id: actionId, happenedAt }: Recording,
    { lines, orderId, note }: ReceiptContent,
    order: LockedOrder | null,
  ): Promise<void> {
    const ordered = byId(order?.lines ?? []);
    const currency = order?.order.currency ?? (await this.houses.read(tx, darkroomId)).currency;
    await this.history.addDelivery(
      tx,
      { darkroomId, actionId, orderId: orderId ?? null, note: note ?? null },
      lines.map(({ orderLineId, lotId, count, priceMinor: told }, ordinal) => {
        const onOrder = orderLineId === undefined ? null : (ordered.get(orderLineId)?.priceMinor ?? null);
        const priceMinor = told === undefined ? onOrder : told;
        return {
          darkroomId,
          actionId,
          ordinal,
          orderLineId: orderLineId ?? null,
          lotId,
          count,
          priceMinor,
          currency: priceMinor === null ? null : currency,
        };
      }),
    );
    if (order)
      await this.deliveries.receive(
        tx,
        order,
        sumBy(lines, (line) => line.orderLineId),
        happenedAt,
      );
  }
}

function refuse({ lines, overDeliveryOk }: ReceiptContent, known: Known): void {
  const complaints = receiptComplaints(lines, known);
  if (complaints.length > 0) throw invalid(complaints);
  const over = overDelivered(lines, known.orderLines);
  if (over.length === 0 || overDeliveryOk) return;
  const errors = over.map((at) => ({
    field: `content.lines.${at}.count`,
    message: 'More than is open on the order.',
  }));
  throw problem('more-than-ordered').with({ errors });
}
