import { AddressesRepository } from '../../platform/auth/addresses.repository.js';
import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { Tx } from '../../platform/database/database.js';
import { problem } from '../../platform/errors/problem.js';
import { ActionRecorder, type PutAction, type Recorded } from '../../platform/ledger/action-recorder.js';
import { ActionViews } from '../../platform/ledger/action-views.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import type { Recording } from '../../platform/ledger/recording.js';
import { touched, VoidHandlers, type VoidHandler } from '../../platform/ledger/void-handlers.js';
import { OutgoingMail } from '../../platform/mail/outgoing-mail.service.js';
import { WarningsService } from '../alerts/warnings.service.js';
import { PackLocks } from '../suppliers/pack-locks.js';
import { numberText, openOf } from './order-lines.js';
import { cancelMail, orderMail, type MailText } from './order-mail.js';
import { OrderViews, toMailOrder, type WholeOrder } from './order-views.js';
import type { OrderActionAnswer } from './order.view.js';
import type { OrderCancellationContent, OrderSendingContent } from './orders.dto.js';
import { OrdersRepository } from './orders.repository.js';

export type OrderSendingPut = PutAction & { content: OrderSendingContent };
export type OrderCancellationPut = PutAction & { content: OrderCancellationContent };

/** An order goes out to its supplier, or is called off; neither can be taken back, for the supplier has been told. */
@Injectable()
export class SendingService implements OnModuleInit {
  constructor(
    private readonly recorder: ActionRecorder,
    private readonly actionViews: ActionViews,
    private readonly addresses: AddressesRepository,
    private readonly repository: OrdersRepository,
    private readonly views: OrderViews,
    private readonly packs: PackLocks,
    private readonly warnings: WarningsService,
    private readonly outgoing: OutgoingMail,
    private readonly voids: VoidHandlers,
  ) {}

  onModuleInit(): void {
    this.voids.register('order-send', never('The order has gone out. Cancel it instead.'));
    this.voids.register('order-cancel', never('A cancelled order stays cancelled. Draft it anew.'));
  }

  /** @throws Problem 'not-found', 'order-not-draft', 'order-changed', 'order-empty' */
  send(enter: Entrance, put: OrderSendingPut): Promise<Recorded<OrderActionAnswer>> {
    return this.record(enter, put, async (tx, recording) => {
      const { darkroomId, happenedAt, me } = recording;
      const { orderId: id, revision } = put.content;
      const whole = await this.lock(tx, darkroomId, id);
      const { order } = whole.detail;
      if (order.state !== 'draft') throw problem('order-not-draft', numberText(order.number));
      if (order.revision !== revision) throw problem('order-changed');
      if (whole.lines.every((line) => line.count === 0))
        throw problem('order-empty', numberText(order.number));
      await recording.add(tx);
      await this.repository.addChange(tx, {
        darkroomId,
        actionId: recording.id,
        orderId: id,
        change: 'sent',
      });
      const sent = {
        state: 'sent' as const,
        sentBy: me.membershipId,
        sentAt: happenedAt,
        revision: revision + 1,
      };
      await this.repository.update(tx, darkroomId, id, sent);
      await this.settle(tx, recording, whole, 'action');
      await this.mail(tx, recording, whole, 'order', orderMail);
    });
  }

  /** A draft, or what of a sent order is still to come. @throws Problem 'not-found', 'order-closed' */
  cancel(enter: Entrance, put: OrderCancellationPut): Promise<Recorded<OrderActionAnswer>> {
    return this.record(enter, put, async (tx, recording) => {
      const { darkroomId, happenedAt } = recording;
      const { orderId: id, reason } = put.content;
      const whole = await this.lock(tx, darkroomId, id);
      const { order } = whole.detail;
      if (order.state !== 'draft' && order.state !== 'sent')
        throw problem('order-closed', numberText(order.number));
      await recording.add(tx);
      await this.repository.addChange(tx, {
        darkroomId,
        actionId: recording.id,
        orderId: id,
        change: 'cancelled',
        reason,
      });
      const lines = whole.lines.map((line) => ({ ...line, cancelled: line.cancelled + openOf(line) }));
      await this.repository.writeLines(tx, darkroomId, lines);
      const state = whole.lines.some((line) => line.received > 0) ? 'received' : 'cancelled';
      await this.repository.update(tx, darkroomId, id, {
        state,
        closedAt: happenedAt,
        revision: order.revision + 1,
      });
      await this.settle(tx, recording, whole, 'retraction');
      const waited = await this.outgoing.withdraw(tx, darkroomId, `order:${id}`, 'the order was cancelled');
      if (order.state === 'sent' && waited !== 'unheard') {
        await this.mail(tx, recording, whole, 'order-cancelled', (mail) => cancelMail(mail, reason));
      }
    });
  }

  private record(
    enter: Entrance,
    put: OrderSendingPut | OrderCancellationPut,
    work: (tx: Tx, recording: Recording) => Promise<void>,
  ): Promise<Recorded<OrderActionAnswer>> {
    return this.recorder.record(enter, put, work, async (tx, me) => ({
      action: await this.actionViews.one(tx, me, put.id),
      order: await this.views.one(tx, me.darkroomId, put.content.orderId),
    }));
  }

  /** Packs first, then the order; a line that a draft gained in between makes the packs' lock incomplete, so its revision tells. */
  private async lock(tx: Tx, darkroomId: string, id: string): Promise<WholeOrder> {
    const lines = await this.repository.lines(tx, darkroomId, [id]);
    await this.packs.lock(
      tx,
      darkroomId,
      lines.map((line) => line.packId),
    );
    if (!(await this.repository.lock(tx, darkroomId, id))) throw problem('not-found');
    return this.views.whole(tx, darkroomId, id);
  }

  private settle(
    tx: Tx,
    recording: Recording,
    { lines }: WholeOrder,
    cause: 'action' | 'retraction',
  ): Promise<void> {
    const { darkroomId, now, me } = recording;
    const packIds = [...new Set(lines.map((line) => line.packId))];
    return this.warnings.settle(tx, { darkroomId, zone: me.zone, now, cause }, touched({ packIds }));
  }

  /** Last of all, for it moves the darkroom's next check. */
  private async mail(
    tx: Tx,
    { darkroomId, me, now }: Recording,
    whole: WholeOrder,
    kind: 'order' | 'order-cancelled',
    write: (order: ReturnType<typeof toMailOrder>) => MailText,
  ): Promise<void> {
    const { id } = whole.detail.order;
    const address = await this.addresses.ofMember(tx, darkroomId, me.membershipId);
    const { subject, body } = write(toMailOrder(whole, me.darkroomName, { name: me.displayName, address }));
    await this.outgoing.post(tx, {
      darkroomId,
      kind,
      orderId: id,
      toAddress: whole.detail.supplierEmail,
      ...(address === null ? {} : { replyTo: address }),
      subject,
      body,
      dedupeKey: `${kind}:${id}`,
      dueAt: now,
    });
  }
}

const never = (why: string): VoidHandler => ({
  prepare: () => Promise.reject(problem('cannot-be-voided', why)),
  undo: () => Promise.reject(new Error(why)),
});
