import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { Tx } from '../../platform/database/database.js';
import { isUniqueViolation } from '../../platform/database/sql-errors.js';
import { invalid, problem } from '../../platform/errors/problem.js';
import { ActionRecorder, type PutAction, type Recorded } from '../../platform/ledger/action-recorder.js';
import { ActionsRepository, type ActionRow } from '../../platform/ledger/actions.repository.js';
import { ActionViews } from '../../platform/ledger/action-views.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import type { Recording } from '../../platform/ledger/recording.js';
import {
  touched,
  VoidHandlers,
  type Touched,
  type VoidHandler,
} from '../../platform/ledger/void-handlers.js';
import { SuppliersService } from '../suppliers/suppliers.service.js';
import { draftComplaints } from './draft-rules.js';
import { numberText } from './order-lines.js';
import { OrderViews } from './order-views.js';
import type { OrderActionAnswer, OrderAnswer } from './order.view.js';
import type { ChangedLineDto, ChangeOrder, OrderDraftContent } from './orders.dto.js';
import { OrdersRepository, type OrderRow } from './orders.repository.js';

export type OrderDraftPut = PutAction & { content: OrderDraftContent };

/** Orders before they go out. A draft is on order with nobody, so no warning moves. */
@Injectable()
export class DraftsService implements OnModuleInit, VoidHandler {
  constructor(
    private readonly recorder: ActionRecorder,
    private readonly actions: ActionsRepository,
    private readonly actionViews: ActionViews,
    private readonly repository: OrdersRepository,
    private readonly suppliers: SuppliersService,
    private readonly views: OrderViews,
    private readonly voids: VoidHandlers,
  ) {}

  onModuleInit(): void {
    this.voids.register('order-draft', this);
  }

  /** @throws Problem 'not-found' for the supplier, 'invalid' naming lines, 'order-exists' */
  record(enter: Entrance, put: OrderDraftPut): Promise<Recorded<OrderActionAnswer>> {
    const recorded = this.recorder.record(
      enter,
      put,
      (tx, recording) => this.draft(tx, recording, put.content),
      async (tx, me) => ({
        action: await this.actionViews.one(tx, me, put.id),
        order: await this.views.one(tx, me.darkroomId, put.content.orderId),
      }),
    );
    return recorded.catch(refuseKnownLine);
  }

  /** @throws Problem 'not-found', 'order-not-draft', 'order-changed', 'order-exists', 'invalid' naming lines */
  change(enter: Entrance, id: string, { revision, note, lines }: ChangeOrder): Promise<OrderAnswer> {
    const changed = enter(async (tx, me) => {
      const { darkroomId } = me;
      const order = await this.repository.lock(tx, darkroomId, id);
      if (!order) throw problem('not-found');
      if (order.state !== 'draft') throw problem('order-not-draft', numberText(order.number));
      if (order.revision !== revision) throw problem('order-changed');
      await this.changeLines(tx, order, lines);
      await this.repository.update(tx, darkroomId, id, {
        revision: revision + 1,
        ...(note === undefined ? {} : { note }),
      });
      return { order: await this.views.one(tx, darkroomId, id) };
    });
    return changed.catch(refuseKnownLine);
  }

  private async draft(
    tx: Tx,
    recording: Recording,
    { orderId, supplierId, lines }: OrderDraftContent,
  ): Promise<void> {
    const { darkroomId, id: actionId, happenedAt } = recording;
    const supplier = await this.suppliers.find(tx, darkroomId, supplierId);
    if (!supplier || supplier.archivedAt) throw problem('not-found');
    const sold = await this.sold(tx, darkroomId, lines, supplierId, 'content.');
    const number = await this.repository.nextNumber(tx, darkroomId);
    // The counter's lock lets drafts through one by one, so what is not there now does not come between.
    if (await this.repository.lock(tx, darkroomId, orderId)) throw problem('order-exists');
    await recording.add(tx);
    await this.repository.insert(tx, {
      darkroomId,
      id: orderId,
      number,
      supplierId,
      state: 'draft',
      currency: supplier.currency,
      revision: 1,
      draftedBy: recording.me.membershipId,
      draftedAt: happenedAt,
    });
    await this.repository.insertLines(
      tx,
      lines.map((line, at) => newLine(darkroomId, orderId, line, at + 1, sold)),
    );
    await this.repository.addChange(tx, { darkroomId, actionId, orderId, change: 'drafted' });
  }

  private async changeLines(
    tx: Tx,
    { darkroomId, id, supplierId }: OrderRow,
    asked: readonly ChangedLineDto[],
  ): Promise<void> {
    const before = await this.repository.lines(tx, darkroomId, [id]);
    const kept = before.filter((line) => !asked.some((one) => one.id === line.id) && line.count > 0);
    const moved = asked.findIndex((one) =>
      before.some((line) => line.id === one.id && line.supplierPackId !== one.supplierPackId),
    );
    if (moved >= 0) {
      throw invalid([
        {
          field: `lines.${moved}.supplierPackId`,
          message: 'A line keeps its pack; take it out and add another.',
        },
      ]);
    }
    const sold = await this.sold(
      tx,
      darkroomId,
      [...asked.filter((line) => line.count > 0), ...kept],
      supplierId,
      '',
    );
    const old = asked.filter((one) => before.some((line) => line.id === one.id));
    await this.repository.writeLines(
      tx,
      darkroomId,
      old.map(({ id: line, count }) => ({ id: line, count, received: 0, cancelled: 0 })),
    );
    const last = Math.max(0, ...before.map((line) => line.position));
    const added = asked.filter((one) => !old.includes(one) && one.count > 0);
    await this.repository.insertLines(
      tx,
      added.map((line, at) => newLine(darkroomId, id, line, last + at + 1, sold)),
    );
  }

  private async sold(
    tx: Tx,
    darkroomId: string,
    lines: readonly ChangedLineDto[],
    supplierId: string,
    prefix: string,
  ) {
    const rows = await this.suppliers.soldPacks(
      tx,
      darkroomId,
      lines.map((line) => line.supplierPackId),
    );
    const sold = new Map(rows.map((row) => [row.supplierPackId, row]));
    const complaints = draftComplaints(lines, sold, supplierId);
    if (complaints.length > 0)
      throw invalid(complaints.map(({ field, message }) => ({ field: prefix + field, message })));
    return sold;
  }

  async prepare(tx: Tx, { darkroomId }: Recording, target: ActionRow): Promise<void> {
    const order = await this.drafted(tx, darkroomId, target);
    const number = numberText(order.number);
    // Taken back already: the void says so itself.
    if (await this.actions.isVoided(tx, darkroomId, target.id)) return;
    if (order.state === 'cancelled')
      throw problem('cannot-be-voided', `Order ${number} was cancelled already.`);
    if (order.state !== 'draft')
      throw problem('leans-on-it', `Order ${number} has gone out. Cancel it instead.`);
  }

  async undo(tx: Tx, { darkroomId, happenedAt }: Recording, target: ActionRow): Promise<Touched> {
    const { id, revision } = await this.drafted(tx, darkroomId, target);
    const lines = await this.repository.lines(tx, darkroomId, [id]);
    await this.repository.writeLines(
      tx,
      darkroomId,
      lines.map((line) => ({ ...line, cancelled: line.count })),
    );
    await this.repository.update(tx, darkroomId, id, {
      state: 'cancelled',
      closedAt: happenedAt,
      revision: revision + 1,
    });
    return touched({});
  }

  private async drafted(tx: Tx, darkroomId: string, target: ActionRow): Promise<OrderRow> {
    const id = await this.repository.changedOrder(tx, darkroomId, target.id);
    const order = id === null ? null : await this.repository.lock(tx, darkroomId, id);
    if (!order) throw new Error(`Action ${target.id} drafted no order.`);
    return order;
  }
}

/** A line's id that stands on another order. */
function refuseKnownLine(error: unknown): never {
  throw isUniqueViolation(error, 'order_lines_pk') ? problem('order-exists') : error;
}

function newLine(
  darkroomId: string,
  orderId: string,
  { id, supplierPackId, count }: ChangedLineDto,
  position: number,
  sold: ReadonlyMap<string, { priceMinor: number | null }>,
) {
  const priceMinor = sold.get(supplierPackId)?.priceMinor ?? null;
  return { darkroomId, id, orderId, supplierPackId, position, count, priceMinor, received: 0, cancelled: 0 };
}
