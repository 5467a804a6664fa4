import { Injectable } from '@nestjs/common';
import { mails, notices } from '@wetside/db';
import { and, eq, inArray } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';
import type { NewNotice } from './mail-plan.js';

const isWaiting = (darkroomId: string, ids: readonly string[]) =>
  and(eq(mails.darkroomId, darkroomId), inArray(mails.id, [...ids]), eq(mails.state, 'waiting'));

@Injectable()
export class WarningMailsRepository {
  async note(tx: Tx, darkroomId: string, list: readonly NewNotice[]): Promise<void> {
    if (list.length === 0) return;
    await tx
      .insert(notices)
      .values(list.map((notice) => ({ darkroomId, ...notice })))
      .onConflictDoNothing();
  }

  /** Takes back mails that still wait; one that is on its way goes. */
  async withdraw(tx: Tx, darkroomId: string, ids: readonly string[], because: string): Promise<void> {
    if (ids.length === 0) return;
    await tx
      .update(mails)
      .set({ state: 'withdrawn', withdrawnBecause: because })
      .where(isWaiting(darkroomId, ids));
  }

  async reword(
    tx: Tx,
    darkroomId: string,
    ids: readonly string[],
    words: { subject: string; body: string },
  ): Promise<void> {
    if (ids.length === 0) return;
    await tx.update(mails).set(words).where(isWaiting(darkroomId, ids));
  }

  /** Lets withdrawn mails wait again, with new words. */
  async wake(
    tx: Tx,
    darkroomId: string,
    ids: readonly string[],
    change: { subject: string; body: string; dueAt: Date },
  ): Promise<void> {
    if (ids.length === 0) return;
    await tx
      .update(mails)
      .set({ ...change, state: 'waiting', withdrawnBecause: null, attempts: 0 })
      .where(
        and(eq(mails.darkroomId, darkroomId), inArray(mails.id, [...ids]), eq(mails.state, 'withdrawn')),
      );
  }
}
