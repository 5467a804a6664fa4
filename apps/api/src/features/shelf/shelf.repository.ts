import { Injectable } from '@nestjs/common';
import { chemistryVersions, lots, makes, openedPacks, packParts, packs } from '@wetside/db';
import { and, asc, desc, eq, isNotNull, isNull, or, sql } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';

export type PackRow = typeof packs.$inferSelect;
export type PackPartRow = typeof packParts.$inferSelect;
export type LotRow = typeof lots.$inferSelect;
export type OpenedPackRow = typeof openedPacks.$inferSelect;
export type MakesRow = Awaited<ReturnType<ShelfRepository['makes']>>[number];

const somethingLeft = sql`coalesce(${openedPacks.leftUl}, ${openedPacks.leftMg}) > 0`;

/** The whole shelf, table by table; what is used up stays out. */
@Injectable()
export class ShelfRepository {
  packs(tx: Tx, darkroomId: string): Promise<PackRow[]> {
    return tx
      .select()
      .from(packs)
      .where(eq(packs.darkroomId, darkroomId))
      .orderBy(asc(packs.name), asc(packs.id));
  }

  parts(tx: Tx, darkroomId: string): Promise<PackPartRow[]> {
    return tx
      .select()
      .from(packParts)
      .where(eq(packParts.darkroomId, darkroomId))
      .orderBy(asc(packParts.packId), asc(packParts.position));
  }

  /** What each pack makes, under the name of the chemistry's newest version. */
  makes(tx: Tx, darkroomId: string) {
    const newest = tx
      .selectDistinctOn([chemistryVersions.chemistryId], {
        chemistryId: chemistryVersions.chemistryId,
        name: sql<string>`${chemistryVersions.document} ->> 'name'`.as('name'),
      })
      .from(chemistryVersions)
      .where(eq(chemistryVersions.darkroomId, darkroomId))
      .orderBy(asc(chemistryVersions.chemistryId), desc(chemistryVersions.number))
      .as('newest');
    return tx
      .select({
        packId: makes.packId,
        chemistryId: makes.chemistryId,
        chemistryName: newest.name,
        volumeUl: makes.volumeUl,
        wholeOnly: makes.wholeOnly,
      })
      .from(makes)
      .innerJoin(newest, eq(newest.chemistryId, makes.chemistryId))
      .where(and(eq(makes.darkroomId, darkroomId), isNotNull(makes.packId)))
      .orderBy(asc(newest.name), asc(makes.id));
  }

  /** Lots with an unopened pack, or with something left in an opened one; the first to expire first. */
  lots(tx: Tx, darkroomId: string): Promise<LotRow[]> {
    const opened = sql`exists (select 1 from ${openedPacks} where ${openedPacks.darkroomId} = ${darkroomId}
      and ${openedPacks.lotId} = ${lots.id} and ${openedPacks.voidedAt} is null and ${somethingLeft})`;
    return tx
      .select()
      .from(lots)
      .where(and(eq(lots.darkroomId, darkroomId), or(sql`${lots.unopened} > 0`, opened)))
      .orderBy(sql`${lots.expiresOn} nulls last`, asc(lots.lotNumber), asc(lots.id));
  }

  opened(tx: Tx, darkroomId: string): Promise<OpenedPackRow[]> {
    return tx
      .select()
      .from(openedPacks)
      .where(and(eq(openedPacks.darkroomId, darkroomId), isNull(openedPacks.voidedAt), somethingLeft))
      .orderBy(asc(openedPacks.openedOn), asc(openedPacks.id));
  }
}
