import { Injectable } from '@nestjs/common';
import { lots, openedPacks, packParts, stockMovements } from '@wetside/db';
import { and, asc, eq, inArray, isNull, sql } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';
import type { LotRow, OpenedPackRow, PackPartRow } from './shelf.repository.js';

export type NewMovement = typeof stockMovements.$inferInsert;

/** How many unopened packs a lot gains, or loses where it is negative. */
export interface LotDelta {
  lotId: string;
  unopened: number;
}

/** What is to be left in an opened pack, in µL or mg. */
export interface OpenedLeft {
  id: string;
  left: number;
}

/** Lots, opened packs and their movements. */
@Injectable()
export class StockRepository {
  /** The packs that these lots, and the lots of these opened packs, are of. */
  async packIds(
    tx: Tx,
    darkroomId: string,
    lotIds: readonly string[],
    openedPackIds: readonly string[],
  ): Promise<string[]> {
    const opened = tx
      .select({ id: openedPacks.lotId })
      .from(openedPacks)
      .where(and(eq(openedPacks.darkroomId, darkroomId), inArray(openedPacks.id, [...openedPackIds])));
    const rows = await tx
      .selectDistinct({ packId: lots.packId })
      .from(lots)
      .where(
        and(
          eq(lots.darkroomId, darkroomId),
          sql`(${inArray(lots.id, [...lotIds])} or ${inArray(lots.id, opened)})`,
        ),
      );
    return rows.map((row) => row.packId);
  }

  /** Locks these lots in the order of their ids; their packs are locked before. */
  lockLots(tx: Tx, darkroomId: string, lotIds: readonly string[]): Promise<LotRow[]> {
    return tx
      .select()
      .from(lots)
      .where(and(eq(lots.darkroomId, darkroomId), inArray(lots.id, [...lotIds])))
      .orderBy(asc(lots.id))
      .for('no key update');
  }

  /** Locks these opened packs in the order of their ids; one whose opening was taken back is left out. */
  lockOpened(tx: Tx, darkroomId: string, ids: readonly string[]): Promise<OpenedPackRow[]> {
    return tx
      .select()
      .from(openedPacks)
      .where(
        and(
          eq(openedPacks.darkroomId, darkroomId),
          inArray(openedPacks.id, [...ids]),
          isNull(openedPacks.voidedAt),
        ),
      )
      .orderBy(asc(openedPacks.id))
      .for('no key update');
  }

  parts(tx: Tx, darkroomId: string, packId: string): Promise<PackPartRow[]> {
    return tx
      .select()
      .from(packParts)
      .where(and(eq(packParts.darkroomId, darkroomId), eq(packParts.packId, packId)))
      .orderBy(asc(packParts.position));
  }

  async insertLots(tx: Tx, rows: (typeof lots.$inferInsert)[]): Promise<void> {
    if (rows.length > 0) await tx.insert(lots).values(rows);
  }

  /** Moves all these lots in one statement; they are locked already. */
  async moveLots(tx: Tx, darkroomId: string, deltas: readonly LotDelta[]): Promise<void> {
    if (deltas.length === 0) return;
    const rows = JSON.stringify(deltas);
    await tx.execute(sql`
      update ${lots} as l set unopened = l.unopened + d.unopened
      from jsonb_to_recordset(${rows}::text::jsonb) as d("lotId" uuid, unopened int)
      where l.darkroom_id = ${darkroomId} and l.id = d."lotId"`);
  }

  async insertOpened(tx: Tx, rows: (typeof openedPacks.$inferInsert)[]): Promise<void> {
    await tx.insert(openedPacks).values(rows);
  }

  /** Writes what is left in each, in whichever of mL and g the part is kept; they are locked already. */
  async writeLeft(tx: Tx, darkroomId: string, rows: readonly OpenedLeft[]): Promise<void> {
    if (rows.length === 0) return;
    await tx.execute(sql`
      update ${openedPacks} as o
      set left_ul = case when o.left_ul is null then null else d."left" end,
          left_mg = case when o.left_mg is null then null else d."left" end
      from jsonb_to_recordset(${JSON.stringify(rows)}::text::jsonb) as d(id uuid, "left" bigint)
      where o.darkroom_id = ${darkroomId} and o.id = d.id`);
  }

  /** These were never opened after all. */
  async voidOpened(tx: Tx, darkroomId: string, ids: readonly string[], at: Date): Promise<void> {
    if (ids.length === 0) return;
    await this.writeLeft(
      tx,
      darkroomId,
      ids.map((id) => ({ id, left: 0 })),
    );
    await tx
      .update(openedPacks)
      .set({ voidedAt: at })
      .where(and(eq(openedPacks.darkroomId, darkroomId), inArray(openedPacks.id, [...ids])));
  }

  async insertMovements(tx: Tx, rows: NewMovement[]): Promise<void> {
    await tx.insert(stockMovements).values(rows);
  }
}
