import { Injectable } from '@nestjs/common';
import { events, mails, memberships, notices, orders } from '@wetside/db';
import { and, eq, isNull, lte, or, sql } from 'drizzle-orm';
import type { Tx } from '../database/database.js';

export type MailRow = typeof mails.$inferSelect;

/** One mail in one darkroom. */
export interface MailKey {
  darkroomId: string;
  mailId: string;
}

const isIt = ({ darkroomId, mailId }: MailKey) => and(eq(mails.darkroomId, darkroomId), eq(mails.id, mailId));

/** What came of a try. */
export type Outcome = Partial<Pick<MailRow, 'state' | 'dueAt' | 'sentAt' | 'lastAnswer'>> & {
  /** The mail may have arrived though no answer said so. */
  unclear?: boolean;
};

/** Waiting and due, or leased by somebody who is gone. */
export const isDue = (now: Date) =>
  or(
    and(eq(mails.state, 'waiting'), lte(mails.dueAt, now)),
    and(eq(mails.state, 'leased'), lte(mails.leaseUntil, now)),
  );

@Injectable()
export class MailsRepository {
  /** The mail when it can be sent now, locked; null when another is at it or it is not due. */
  async takeDue(tx: Tx, key: MailKey, now: Date): Promise<MailRow | null> {
    const [row] = await tx
      .select()
      .from(mails)
      .where(and(isIt(key), isDue(now)))
      .for('update', { skipLocked: true });
    return row ?? null;
  }

  /** When it falls due, for a mail that waits; null for any other. */
  async waitsUntil(tx: Tx, key: MailKey): Promise<Date | null> {
    const [row] = await tx
      .select({ dueAt: mails.dueAt })
      .from(mails)
      .where(and(isIt(key), eq(mails.state, 'waiting')));
    return row?.dueAt ?? null;
  }

  /** Why a warning is not to be sent after all: nothing that it tells of holds, or its reader has left; null: send it. */
  async whyNot(tx: Tx, { darkroomId, mailId }: MailKey): Promise<string | null> {
    const [open] = await tx
      .select({ leftAt: memberships.leftAt })
      .from(notices)
      .innerJoin(events, and(eq(events.darkroomId, notices.darkroomId), eq(events.id, notices.eventId)))
      .innerJoin(
        memberships,
        and(eq(memberships.darkroomId, notices.darkroomId), eq(memberships.id, notices.membershipId)),
      )
      .where(and(eq(notices.darkroomId, darkroomId), eq(notices.mailId, mailId), isNull(events.endedAt)))
      .limit(1);
    if (!open) return 'the condition had ended';
    return open.leftAt === null ? null : 'its reader had left the darkroom';
  }

  /** How the order stands that the mail is about; null for a mail about none. */
  async orderState(tx: Tx, key: MailKey): Promise<(typeof orders.$inferSelect)['state'] | null> {
    const [row] = await tx
      .select({ state: orders.state })
      .from(mails)
      .innerJoin(orders, and(eq(orders.darkroomId, mails.darkroomId), eq(orders.id, mails.orderId)))
      .where(isIt(key));
    return row?.state ?? null;
  }

  async withdraw(tx: Tx, key: MailKey, because: string): Promise<void> {
    await tx
      .update(mails)
      .set({ state: 'withdrawn', withdrawnBecause: because, leaseId: null, leaseUntil: null })
      .where(isIt(key));
  }

  /** A lease that is taken over was never marked: how far its holder came is not known, and is counted. */
  async lease(tx: Tx, key: MailKey, lease: { leaseId: string; leaseUntil: Date }): Promise<void> {
    await tx
      .update(mails)
      .set({
        state: 'leased',
        ...lease,
        attempts: sql`${mails.attempts} + 1`,
        unclearTries: sql`${mails.unclearTries} + case when ${mails.state} = 'leased' then 1 else 0 end`,
      })
      .where(isIt(key));
  }

  /**
   * What came of a try, if the lease is still one's own.
   * @returns false when another has taken the mail over
   */
  async settle(tx: Tx, key: MailKey, leaseId: string, { unclear, ...outcome }: Outcome): Promise<boolean> {
    const changed = await tx
      .update(mails)
      .set({
        ...outcome,
        unclearTries: sql`${mails.unclearTries} + ${unclear ? 1 : 0}`,
        leaseId: null,
        leaseUntil: null,
      })
      .where(and(isIt(key), eq(mails.state, 'leased'), eq(mails.leaseId, leaseId)))
      .returning({ id: mails.id });
    return changed.length > 0;
  }
}
