import { Injectable } from '@nestjs/common';
import { darkrooms } from '@wetside/db';
import { and, eq, sql } from 'drizzle-orm';
import type { Tx } from '../database/database.js';
import { hotQuery } from '../database/hot-query.js';

/** The directory has no row security: it is held by hand to the darkroom that the transaction is in. */
export const isEntered = sql`${darkrooms.id} = nullif(current_setting('app.darkroom', true), '')::uuid`;

const lowerNextCheck = hotQuery('lower_next_check', (db) =>
  db
    .update(darkrooms)
    .set({ nextCheckAt: sql`least(${darkrooms.nextCheckAt}, ${sql.placeholder('due')}::timestamptz)` })
    .where(and(eq(darkrooms.id, sql.placeholder('darkroomId')), isEntered)),
);

/** When the sweep must look at a darkroom again. Its row is the last lock of every transaction. */
@Injectable()
export class NextCheck {
  /**
   * Says that something falls due at that time. Always written, even where the sweep would look sooner: only then does
   * a sweep that is at work wait for this transaction instead of passing over what it has not seen.
   */
  async lower(tx: Tx, darkroomId: string, due: Date | null): Promise<void> {
    if (due === null) return;
    await lowerNextCheck(tx, { darkroomId, due: due.toISOString() });
  }
}
