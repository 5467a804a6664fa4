import { Injectable } from '@nestjs/common';
import { memberships } from '@wetside/db';
import { and, asc, eq, isNull } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';

@Injectable()
export class PeopleRepository {
  /** Everybody who belongs to the darkroom now, by name. */
  current(tx: Tx, darkroomId: string) {
    return tx
      .select({
        membershipId: memberships.id,
        displayName: memberships.displayName,
        role: memberships.role,
        joinedAt: memberships.joinedAt,
      })
      .from(memberships)
      .where(and(eq(memberships.darkroomId, darkroomId), isNull(memberships.leftAt)))
      .orderBy(asc(memberships.displayName), asc(memberships.id));
  }
}
