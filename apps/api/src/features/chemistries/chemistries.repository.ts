import { Injectable } from '@nestjs/common';
import {
  chemistries,
  chemistryVersions,
  counters,
  lots,
  makes,
  openedPacks,
  packParts,
  packs,
} from '@wetside/db';
import { and, asc, desc, eq, inArray, isNull } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';

export type ChemistryVersion = typeof chemistryVersions.$inferSelect;

@Injectable()
export class ChemistriesRepository {
  async version(tx: Tx, darkroomId: string, id: string): Promise<ChemistryVersion | null> {
    const [row] = await tx
      .select()
      .from(chemistryVersions)
      .where(and(eq(chemistryVersions.darkroomId, darkroomId), eq(chemistryVersions.id, id)));
    return row ?? null;
  }

  /** Of those versions that are here; in no order. */
  async documents(tx: Tx, darkroomId: string, ids: readonly string[]) {
    return tx
      .select({ id: chemistryVersions.id, document: chemistryVersions.document })
      .from(chemistryVersions)
      .where(and(eq(chemistryVersions.darkroomId, darkroomId), inArray(chemistryVersions.id, [...ids])));
  }

  /** The newest version of every chemistry that the darkroom uses. */
  async current(tx: Tx, darkroomId: string): Promise<ChemistryVersion[]> {
    const rows = await tx
      .selectDistinctOn([chemistryVersions.chemistryId], { version: chemistryVersions })
      .from(chemistryVersions)
      .innerJoin(
        chemistries,
        and(
          eq(chemistries.darkroomId, chemistryVersions.darkroomId),
          eq(chemistries.id, chemistryVersions.chemistryId),
        ),
      )
      .where(and(eq(chemistryVersions.darkroomId, darkroomId), isNull(chemistries.archivedAt)))
      .orderBy(asc(chemistryVersions.chemistryId), desc(chemistryVersions.number));
    return rows.map((row) => row.version);
  }

  /** What each pack makes. */
  async fromPacks(tx: Tx, darkroomId: string) {
    return tx
      .select({
        chemistryId: makes.chemistryId,
        packId: packs.id,
        packName: packs.name,
        form: packs.form,
        volumeUl: makes.volumeUl,
        wholeOnly: makes.wholeOnly,
      })
      .from(makes)
      .innerJoin(packs, and(eq(packs.darkroomId, makes.darkroomId), eq(packs.id, makes.packId)))
      .where(eq(makes.darkroomId, darkroomId))
      .orderBy(asc(packs.name), asc(packs.id));
  }

  async lastNumbers(tx: Tx, darkroomId: string, letters: readonly string[]): Promise<Map<string, number>> {
    if (letters.length === 0) return new Map();
    const rows = await tx
      .select({ name: counters.name, last: counters.last })
      .from(counters)
      .where(and(eq(counters.darkroomId, darkroomId), inArray(counters.name, [...letters])));
    return new Map(rows.map((row) => [row.name, row.last]));
  }

  /** What a lot's pack makes of that chemistry; null: nothing. */
  async makesFromLot(tx: Tx, darkroomId: string, lotId: string, chemistryId: string) {
    const [row] = await tx
      .select({ packId: lots.packId, volumeUl: makes.volumeUl, wholeOnly: makes.wholeOnly })
      .from(lots)
      .innerJoin(
        makes,
        and(
          eq(makes.darkroomId, lots.darkroomId),
          eq(makes.packId, lots.packId),
          eq(makes.chemistryId, chemistryId),
        ),
      )
      .where(and(eq(lots.darkroomId, darkroomId), eq(lots.id, lotId)));
    return row ?? null;
  }

  async lotOfOpened(tx: Tx, darkroomId: string, openedPackId: string): Promise<string | null> {
    const [row] = await tx
      .select({ lotId: openedPacks.lotId })
      .from(openedPacks)
      .where(and(eq(openedPacks.darkroomId, darkroomId), eq(openedPacks.id, openedPackId)));
    return row?.lotId ?? null;
  }

  /** Whether that stock solution makes that chemistry. */
  async makesFromStock(
    tx: Tx,
    darkroomId: string,
    stockChemistryId: string,
    chemistryId: string,
  ): Promise<boolean> {
    const found = await tx
      .select({ id: makes.id })
      .from(makes)
      .where(
        and(
          eq(makes.darkroomId, darkroomId),
          eq(makes.stockChemistryId, stockChemistryId),
          eq(makes.chemistryId, chemistryId),
        ),
      );
    return found.length > 0;
  }

  async insertChemistry(
    tx: Tx,
    row: typeof chemistries.$inferInsert,
    version: typeof chemistryVersions.$inferInsert,
  ): Promise<void> {
    await tx.insert(chemistries).values(row);
    await tx.insert(chemistryVersions).values(version);
  }

  async insertPack(
    tx: Tx,
    pack: typeof packs.$inferInsert,
    parts: (typeof packParts.$inferInsert)[],
    made: (typeof makes.$inferInsert)[],
  ): Promise<void> {
    await tx.insert(packs).values(pack);
    await tx.insert(packParts).values(parts);
    await tx.insert(makes).values(made);
  }
}
