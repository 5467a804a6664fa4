import { Injectable } from '@nestjs/common';
import { discards, holds } from '@wetside/db';
import { and, eq } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';

@Injectable()
export class HoldsRepository {
  async insertHold(tx: Tx, row: typeof holds.$inferInsert): Promise<void> {
    await tx.insert(holds).values(row);
  }

  async insertDiscard(tx: Tx, row: typeof discards.$inferInsert): Promise<void> {
    await tx.insert(discards).values(row);
  }

  async bottlesOf(tx: Tx, darkroomId: string, actionId: string): Promise<string[]> {
    const held = await tx
      .select({ id: holds.bottleId })
      .from(holds)
      .where(and(eq(holds.darkroomId, darkroomId), eq(holds.actionId, actionId)));
    const discarded = await tx
      .select({ id: discards.bottleId })
      .from(discards)
      .where(and(eq(discards.darkroomId, darkroomId), eq(discards.actionId, actionId)));
    return [...held, ...discarded].map((row) => row.id);
  }
}
