import { Injectable } from '@nestjs/common';
import { darkrooms, darkroomSettings, memberships } from '@wetside/db';
import { eq } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';

export type SettingsRow = typeof darkroomSettings.$inferSelect;

@Injectable()
export class DarkroomsRepository {
  async settings(tx: Tx, darkroomId: string): Promise<SettingsRow | null> {
    const [row] = await tx.select().from(darkroomSettings).where(eq(darkroomSettings.darkroomId, darkroomId));
    return row ?? null;
  }

  async add(tx: Tx, row: typeof darkrooms.$inferInsert): Promise<void> {
    await tx.insert(darkrooms).values(row);
  }

  async addSettings(tx: Tx, row: typeof darkroomSettings.$inferInsert): Promise<void> {
    await tx.insert(darkroomSettings).values(row);
  }

  async addMembership(tx: Tx, row: typeof memberships.$inferInsert): Promise<void> {
    await tx.insert(memberships).values(row);
  }
}
