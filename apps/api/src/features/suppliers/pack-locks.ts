import { Injectable } from '@nestjs/common';
import { packs } from '@wetside/db';
import { and, asc, eq, inArray } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';

/**
 * Whatever moves what is on the shelf or on order locks the packs that it is about, before their lots: two mixes from
 * two lots of one pack would otherwise each miss that the other took the shelf to its reorder point.
 */
@Injectable()
export class PackLocks {
  /** Locks these packs in the order of their ids. Unknown ids are left out of the answer. */
  async lock(tx: Tx, darkroomId: string, packIds: readonly string[]) {
    if (packIds.length === 0) return [];
    return tx
      .select()
      .from(packs)
      .where(and(eq(packs.darkroomId, darkroomId), inArray(packs.id, [...packIds])))
      .orderBy(asc(packs.id))
      .for('no key update');
  }
}
