import { Injectable } from '@nestjs/common';
import { events, mails, notices, packs } from '@wetside/db';
import { and, asc, eq, inArray, isNull } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';
import type { Cause } from './crossing.js';
import type { Told } from './mail-plan.js';

export type NewEvent = Omit<typeof events.$inferInsert, 'subjectId'>;

@Injectable()
export class EventsRepository {
  /** What is on the shelf and on order moves under these locks, so that two actions do not each miss the other's half. */
  async lockPacks(tx: Tx, darkroomId: string, ids: readonly string[]): Promise<void> {
    if (ids.length === 0) return;
    await tx
      .select({ id: packs.id })
      .from(packs)
      .where(and(eq(packs.darkroomId, darkroomId), inArray(packs.id, [...ids])))
      .orderBy(asc(packs.id))
      .for('no key update');
  }

  async lock(tx: Tx, darkroomId: string, subjectIds: readonly string[]): Promise<void> {
    await tx
      .select({ id: events.id })
      .from(events)
      .where(and(eq(events.darkroomId, darkroomId), inArray(events.subjectId, [...subjectIds])))
      .orderBy(asc(events.id))
      .for('no key update');
  }

  /** @returns the ids of those that nobody else had opened meanwhile */
  async open(tx: Tx, rows: readonly NewEvent[]): Promise<Set<string>> {
    if (rows.length === 0) return new Set();
    const opened = await tx
      .insert(events)
      .values([...rows])
      .onConflictDoNothing()
      .returning({ id: events.id });
    return new Set(opened.map(({ id }) => id));
  }

  async reopen(tx: Tx, darkroomId: string, ids: readonly string[]): Promise<void> {
    await this.set(tx, darkroomId, ids, { endedAt: null, endedBy: null });
  }

  async end(
    tx: Tx,
    darkroomId: string,
    ids: readonly string[],
    endedAt: Date,
    endedBy: Cause,
  ): Promise<void> {
    await this.set(tx, darkroomId, ids, { endedAt, endedBy });
  }

  /** Who was told of these events, in which mail, and how far it has come. */
  async told(tx: Tx, darkroomId: string, eventIds: readonly string[]): Promise<Told[]> {
    if (eventIds.length === 0) return [];
    return tx
      .select({
        eventId: notices.eventId,
        membershipId: notices.membershipId,
        mailId: notices.mailId,
        mailState: mails.state,
        unclearTries: mails.unclearTries,
      })
      .from(notices)
      .innerJoin(mails, and(eq(mails.darkroomId, notices.darkroomId), eq(mails.id, notices.mailId)))
      .where(and(eq(notices.darkroomId, darkroomId), inArray(notices.eventId, [...eventIds])));
  }

  /** Everything that is open in a darkroom, oldest first. */
  async allOpen(tx: Tx, darkroomId: string) {
    return tx
      .select()
      .from(events)
      .where(and(eq(events.darkroomId, darkroomId), isNull(events.endedAt)))
      .orderBy(asc(events.openedAt), asc(events.id));
  }

  private async set(
    tx: Tx,
    darkroomId: string,
    ids: readonly string[],
    values: Pick<typeof events.$inferInsert, 'endedAt' | 'endedBy'>,
  ): Promise<void> {
    if (ids.length === 0) return;
    await tx
      .update(events)
      .set(values)
      .where(and(eq(events.darkroomId, darkroomId), inArray(events.id, [...ids])));
  }
}
