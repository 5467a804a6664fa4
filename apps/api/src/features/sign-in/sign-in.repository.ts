import { Injectable } from '@nestjs/common';
import { darkrooms, memberships } from '@wetside/db';
import { and, asc, eq, isNull } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';

@Injectable()
export class SignInRepository {
  /** The darkrooms a person belongs to now, by name; the transaction must be that person's (Database.asPerson). */
  ownDarkrooms(tx: Tx, personId: string) {
    return tx
      .select({
        id: darkrooms.id,
        shortName: darkrooms.shortName,
        name: darkrooms.name,
        role: memberships.role,
      })
      .from(memberships)
      .innerJoin(darkrooms, eq(darkrooms.id, memberships.darkroomId))
      .where(and(eq(memberships.personId, personId), isNull(memberships.leftAt)))
      .orderBy(asc(darkrooms.name), asc(darkrooms.id));
  }
}
