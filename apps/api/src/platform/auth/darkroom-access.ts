import { Injectable } from '@nestjs/common';
import { darkrooms, memberships, people, sessions } from '@wetside/db';
import { and, eq, gt, isNull, sql } from 'drizzle-orm';
import { validate } from 'uuid';
import { Clock } from '../clock/clock.js';
import { Database, type TransactionOptions, type Tx } from '../database/database.js';
import { hotQuery } from '../database/hot-query.js';
import { problem } from '../errors/problem.js';
import type { CallerInfo } from './caller.js';
import type { Me } from './me.js';
import { reaches } from './roles.js';
import { aliveSince } from './sessions.repository.js';

/** Every request of a darkroom begins with it. */
const enterDarkroom = hotQuery('enter_darkroom', (db) =>
  db
    .select({
      darkroomId: darkrooms.id,
      darkroomName: darkrooms.name,
      shortName: darkrooms.shortName,
      zone: darkrooms.zone,
      membershipId: memberships.id,
      role: memberships.role,
      displayName: memberships.displayName,
    })
    .from(sessions)
    .innerJoin(people, and(eq(people.id, sessions.personId), isNull(people.deletedAt)))
    .leftJoin(
      memberships,
      and(
        eq(memberships.darkroomId, sql.placeholder('darkroomId')),
        eq(memberships.personId, sessions.personId),
        isNull(memberships.leftAt),
      ),
    )
    .leftJoin(darkrooms, eq(darkrooms.id, memberships.darkroomId))
    .where(
      and(
        eq(sessions.id, sql.placeholder('sessionId')),
        eq(sessions.personId, sql.placeholder('personId')),
        isNull(sessions.endedAt),
        gt(sessions.lastUsedAt, sql.param(sql.placeholder('usedAfter'), sessions.lastUsedAt)),
        gt(sessions.createdAt, sql.param(sql.placeholder('madeAfter'), sessions.createdAt)),
      ),
    ),
);

/** The one door to a darkroom's rows for a signed-in person. */
@Injectable()
export class DarkroomAccess {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
  ) {}

  /**
   * Runs the work in a transaction of the darkroom (its id or its short name), once the caller was found to be a member
   * with the route's least role; the check and the work see the same state. A GET's transaction is read-only.
   * The work may be run again from its start (Database.inDarkroom).
   * @throws Problem 'session-ended'; 'not-found' for a stranger as for a darkroom that is not; 'not-allowed'.
   */
  async enter<T>(
    caller: CallerInfo,
    darkroom: string,
    work: (tx: Tx, me: Me) => Promise<T>,
    options: TransactionOptions = {},
  ): Promise<T> {
    const { least, personId } = caller;
    if (least === null) throw new Error('Only a route with a least role leads into a darkroom.');
    const darkroomId = validate(darkroom) ? darkroom : await this.idOf(darkroom);
    return this.database.inDarkroom(
      { darkroomId, personId },
      async (tx) => {
        const me = await this.membership(tx, caller, darkroomId);
        if (!reaches(me.role, least)) throw problem('not-allowed', least);
        caller.entered = true;
        return work(tx, me);
      },
      { readOnly: options.readOnly ?? caller.readsOnly },
    );
  }

  private async membership(tx: Tx, caller: CallerInfo, darkroomId: string): Promise<Me> {
    const { sessionId, personId } = caller;
    const [row] = await enterDarkroom(tx, {
      darkroomId,
      sessionId,
      personId,
      ...aliveSince(this.clock.now()),
    });
    if (!row) throw problem('session-ended');
    const { membershipId, role, displayName, darkroomName, shortName, zone } = row;
    // As it is stored: in an address an id may stand in capitals.
    const darkroomIdOf = row.darkroomId;
    if (membershipId === null || role === null || displayName === null) throw problem('not-found');
    if (darkroomIdOf === null || darkroomName === null || shortName === null || zone === null)
      throw problem('not-found');
    return {
      membershipId,
      personId: caller.personId,
      role,
      displayName,
      darkroomId: darkroomIdOf,
      darkroomName,
      shortName,
      zone,
    };
  }

  private async idOf(shortName: string): Promise<string> {
    const [row] = await this.database.asIdentity(
      (tx) => tx.select({ id: darkrooms.id }).from(darkrooms).where(eq(darkrooms.shortName, shortName)),
      { readOnly: true },
    );
    if (!row) throw problem('not-found');
    return row.id;
  }
}
