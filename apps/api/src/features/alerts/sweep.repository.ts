import { Injectable } from '@nestjs/common';
import { bottleTotals, darkrooms, mails } from '@wetside/db';
import { and, asc, eq, lte, sql } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';
import { isEntered } from '../../platform/jobs/next-check.js';
import { isDue } from '../../platform/mail/mails.repository.js';

/** Darkrooms that one claim takes at the most; the rest is for the next claim, or for another server. */
const CLAIM = 20;
/** A claim lasts so long: what dies at its work is taken up again after that. */
const CLAIM_MS = 5 * 60_000;

export interface Claimed {
  darkroomId: string;
  zone: string;
}

@Injectable()
export class SweepRepository {
  /** Takes darkrooms where something is due, passing over those that another server has in hand. */
  async claim(tx: Tx, now: Date): Promise<Claimed[]> {
    const due = tx
      .select({ id: darkrooms.id })
      .from(darkrooms)
      .where(lte(darkrooms.nextCheckAt, now))
      .orderBy(asc(darkrooms.nextCheckAt))
      .limit(CLAIM)
      .for('no key update', { skipLocked: true });
    return tx
      .update(darkrooms)
      .set({ nextCheckAt: new Date(now.getTime() + CLAIM_MS) })
      .where(sql`${darkrooms.id} in (${due})`)
      .returning({ darkroomId: darkrooms.id, zone: darkrooms.zone });
  }

  /** Bottles that time alone may have changed, their totals locked in the order of their ids. */
  async lockDueBottles(tx: Tx, darkroomId: string, now: Date): Promise<string[]> {
    const rows = await tx
      .select({ id: bottleTotals.bottleId })
      .from(bottleTotals)
      .where(and(eq(bottleTotals.darkroomId, darkroomId), lte(bottleTotals.nextLookAt, now)))
      .orderBy(asc(bottleTotals.bottleId))
      .for('no key update');
    return rows.map(({ id }) => id);
  }

  async writeNextLooks(
    tx: Tx,
    darkroomId: string,
    looks: readonly { id: string; nextLookAt: string | null }[],
  ): Promise<void> {
    if (looks.length === 0) return;
    await tx.execute(sql`
      update ${bottleTotals} t set next_look_at = d."nextLookAt"
      from jsonb_to_recordset(${JSON.stringify(looks)}::text::jsonb) as d(id uuid, "nextLookAt" timestamptz)
      where t.darkroom_id = ${darkroomId} and t.bottle_id = d.id`);
  }

  /** Mails whose time has come, or whose sender is gone. */
  async dueMails(tx: Tx, darkroomId: string, now: Date): Promise<string[]> {
    const rows = await tx
      .select({ id: mails.id })
      .from(mails)
      .where(and(eq(mails.darkroomId, darkroomId), isDue(now)));
    return rows.map(({ id }) => id);
  }

  /**
   * Says when to look again. The row is locked first and what is due is read by a later statement: an action that was
   * under way is then either seen, or comes after and lowers what was written. A mail that is due and in the queue
   * already is looked for again after the length of a claim.
   */
  async lookAgain(tx: Tx, darkroomId: string, now: Date): Promise<void> {
    await tx
      .select({ id: darkrooms.id })
      .from(darkrooms)
      .where(and(eq(darkrooms.id, darkroomId), isEntered))
      .for('no key update');
    const later = new Date(now.getTime() + CLAIM_MS).toISOString();
    const at = now.toISOString();
    await tx.execute(sql`
      update ${darkrooms} set next_check_at = least(
        (select min(next_look_at) from bottle_totals where darkroom_id = ${darkroomId}),
        (select min(case
            when state = 'leased' and lease_until > ${at}::timestamptz then lease_until
            when state = 'waiting' and due_at > ${at}::timestamptz then due_at
            else ${later}::timestamptz end)
          from mails where darkroom_id = ${darkroomId} and state in ('waiting', 'leased')))
      where id = ${darkroomId} and ${isEntered}`);
  }
}
