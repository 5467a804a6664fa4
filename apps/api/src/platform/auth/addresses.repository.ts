import { Injectable } from '@nestjs/common';
import { memberships, people } from '@wetside/db';
import { and, asc, eq, inArray, isNotNull, isNull } from 'drizzle-orm';
import type { Tx } from '../database/database.js';
import type { Role } from './roles.js';

/** A member whom mail reaches. */
export interface Recipient {
  membershipId: string;
  address: string;
}

/** Where mail reaches the members of a darkroom: the only way from a membership to a person's address. */
@Injectable()
export class AddressesRepository {
  /** Members with one of these roles who have not left and whose account stands. */
  async withRoles(tx: Tx, darkroomId: string, roles: readonly Role[]): Promise<Recipient[]> {
    const rows = await tx
      .select({ membershipId: memberships.id, address: people.email })
      .from(memberships)
      .innerJoin(
        people,
        and(eq(people.id, memberships.personId), isNull(people.deletedAt), isNotNull(people.email)),
      )
      .where(
        and(
          eq(memberships.darkroomId, darkroomId),
          isNull(memberships.leftAt),
          inArray(memberships.role, [...roles]),
        ),
      )
      .orderBy(asc(memberships.id));
    return rows.flatMap(({ membershipId, address }) => (address === null ? [] : [{ membershipId, address }]));
  }

  /** Null once the account is gone. */
  async ofMember(tx: Tx, darkroomId: string, membershipId: string): Promise<string | null> {
    const [row] = await tx
      .select({ email: people.email })
      .from(memberships)
      .innerJoin(people, eq(people.id, memberships.personId))
      .where(and(eq(memberships.darkroomId, darkroomId), eq(memberships.id, membershipId)));
    return row?.email ?? null;
  }
}
