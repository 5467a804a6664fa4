import { Injectable } from '@nestjs/common';
import { mails } from '@wetside/db';
import { and, eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import { Environment } from '../../config/environment.js';
import { Clock } from '../clock/clock.js';
import type { Tx } from '../database/database.js';
import { NextCheck } from '../jobs/next-check.js';
import { Queue } from '../jobs/queue.js';
import type { NewMail } from './new-mail.js';
import { SEND_MAIL } from './send-mail.job.js';

export type { NewMail } from './new-mail.js';

/** Where features leave their mail. It goes out once the transaction is committed and the mail is due. */
@Injectable()
export class OutgoingMail {
  private readonly host: string;

  constructor(
    environment: Environment,
    private readonly clock: Clock,
    private readonly queue: Queue,
    private readonly nextCheck: NextCheck,
  ) {
    this.host = new URL(environment.publicOrigin).hostname;
  }

  /** One mail, as the last thing of an action: it locks the darkroom's row, which nothing may follow. */
  async post(tx: Tx, mail: NewMail): Promise<void> {
    await this.add(tx, [mail]);
    await this.nextCheck.lower(tx, mail.darkroomId, mail.dueAt);
  }

  /**
   * Several mails, without the darkroom's row: whoever calls this lowers its next check itself, at the end.
   * @returns the ids of those that were not there yet, by their dedupe key
   */
  async add(tx: Tx, list: readonly NewMail[]): Promise<Map<string, string>> {
    if (list.length === 0) return new Map();
    const createdAt = this.clock.now();
    const rows = list.map((mail) => this.row(mail, createdAt));
    const added = await tx
      .insert(mails)
      .values(rows)
      .onConflictDoNothing({ target: [mails.darkroomId, mails.dedupeKey] })
      .returning({
        id: mails.id,
        dedupeKey: mails.dedupeKey,
        dueAt: mails.dueAt,
        darkroomId: mails.darkroomId,
      });
    await this.remind(tx, added);
    return new Map(added.map(({ dedupeKey, id }) => [dedupeKey, id]));
  }

  /**
   * Takes back a mail that still waits, if there is one.
   * @returns 'unheard' when nobody had tried to send it; 'tried' when it may have arrived, whatever was answered; null
   *   when none waited
   */
  async withdraw(
    tx: Tx,
    darkroomId: string,
    dedupeKey: string,
    because: string,
  ): Promise<'unheard' | 'tried' | null> {
    const [taken] = await tx
      .update(mails)
      .set({ state: 'withdrawn', withdrawnBecause: because })
      .where(
        and(eq(mails.darkroomId, darkroomId), eq(mails.dedupeKey, dedupeKey), eq(mails.state, 'waiting')),
      )
      .returning({ attempts: mails.attempts });
    if (!taken) return null;
    return taken.attempts === 0 ? 'unheard' : 'tried';
  }

  /** Puts mails that wait into the queue, each to be looked at when it is due. */
  async remind(tx: Tx, list: readonly { darkroomId: string; id: string; dueAt: Date }[]): Promise<void> {
    const now = this.clock.now().getTime();
    const byDelay = new Map<number, { darkroomId: string; mailId: string }[]>();
    for (const { darkroomId, id, dueAt } of list) {
      const delay = Math.max(0, dueAt.getTime() - now);
      byDelay.set(delay, [...(byDelay.get(delay) ?? []), { darkroomId, mailId: id }]);
    }
    for (const [delay, payloads] of byDelay) await this.queue.enqueueAll(tx, SEND_MAIL, payloads, delay);
  }

  private row(mail: NewMail, createdAt: Date): typeof mails.$inferInsert {
    const id = v7();
    return {
      ...mail,
      id,
      membershipId: mail.membershipId ?? null,
      orderId: mail.orderId ?? null,
      replyTo: mail.replyTo ?? null,
      messageId: `<${id}@${this.host}>`,
      state: 'waiting',
      attempts: 0,
      createdAt,
    };
  }
}
