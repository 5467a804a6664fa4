import { Injectable } from '@nestjs/common';
import { bottles, decisions, guests, loadFilm, loads, loadSteps, memberships, voids } from '@wetside/db';
import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';
import { hotQuery } from '../../platform/database/hot-query.js';

export type NewFilm = typeof loadFilm.$inferInsert;
export type NewStep = typeof loadSteps.$inferInsert;

const oneLoad = hotQuery('one_load', (db) =>
  db
    .select()
    .from(loads)
    .where(
      and(
        eq(loads.darkroomId, sql.placeholder('darkroomId')),
        eq(loads.actionId, sql.placeholder('actionId')),
      ),
    ),
);

const filmOf = hotQuery('film_of_load', (db) =>
  db
    .select({
      format: loadFilm.format,
      widthMm: loadFilm.widthMm,
      heightMm: loadFilm.heightMm,
      count: loadFilm.count,
      filmClass: loadFilm.filmClass,
      ownerName: sql<string>`coalesce(${memberships.displayName}, ${guests.name})`,
    })
    .from(loadFilm)
    .leftJoin(
      memberships,
      and(eq(memberships.darkroomId, loadFilm.darkroomId), eq(memberships.id, loadFilm.ownerMembershipId)),
    )
    .leftJoin(guests, and(eq(guests.darkroomId, loadFilm.darkroomId), eq(guests.id, loadFilm.ownerGuestId)))
    .where(
      and(
        eq(loadFilm.darkroomId, sql.placeholder('darkroomId')),
        eq(loadFilm.actionId, sql.placeholder('actionId')),
      ),
    )
    .orderBy(asc(loadFilm.ordinal)),
);

const stepsOf = hotQuery('steps_of_load', (db) =>
  db
    .select({
      bottleId: loadSteps.bottleId,
      code: bottles.code,
      material: loadSteps.material,
      nominalE4: loadSteps.nominalE4,
      countedE4: loadSteps.countedE4,
      takenUl: loadSteps.takenUl,
      flags: loadSteps.flags,
    })
    .from(loadSteps)
    .innerJoin(bottles, and(eq(bottles.darkroomId, loadSteps.darkroomId), eq(bottles.id, loadSteps.bottleId)))
    .where(
      and(
        eq(loadSteps.darkroomId, sql.placeholder('darkroomId')),
        eq(loadSteps.actionId, sql.placeholder('actionId')),
      ),
    )
    .orderBy(asc(bottles.code)),
);

@Injectable()
export class LoadsRepository {
  async insert(tx: Tx, load: typeof loads.$inferInsert, film: NewFilm[], steps: NewStep[]): Promise<void> {
    // Sent together, carried out in this order.
    await Promise.all([
      tx.insert(loads).values(load),
      tx.insert(loadFilm).values(film),
      tx.insert(loadSteps).values(steps),
    ]);
  }

  /** A guest comes with the load that first names them; named again, what is known stays. */
  async insertGuests(tx: Tx, rows: (typeof guests.$inferInsert)[]): Promise<void> {
    if (rows.length > 0) await tx.insert(guests).values(rows).onConflictDoNothing();
  }

  async load(tx: Tx, darkroomId: string, actionId: string): Promise<typeof loads.$inferSelect | null> {
    const [row] = await oneLoad(tx, { darkroomId, actionId });
    return row ?? null;
  }

  async film(tx: Tx, darkroomId: string, actionId: string) {
    return filmOf(tx, { darkroomId, actionId });
  }

  async steps(tx: Tx, darkroomId: string, actionId: string) {
    return stepsOf(tx, { darkroomId, actionId });
  }

  async insertDecision(tx: Tx, row: typeof decisions.$inferInsert): Promise<void> {
    await tx.insert(decisions).values(row);
  }

  /** Whether a decision on the load still stands. */
  async isDecided(tx: Tx, darkroomId: string, loadActionId: string): Promise<boolean> {
    const found = await tx
      .select({ id: decisions.actionId })
      .from(decisions)
      .leftJoin(
        voids,
        and(eq(voids.darkroomId, decisions.darkroomId), eq(voids.voidedActionId, decisions.actionId)),
      )
      .where(
        and(
          eq(decisions.darkroomId, darkroomId),
          eq(decisions.loadActionId, loadActionId),
          isNull(voids.actionId),
        ),
      );
    return found.length > 0;
  }

  async decidedLoad(tx: Tx, darkroomId: string, decisionId: string): Promise<string | null> {
    const [row] = await tx
      .select({ id: decisions.loadActionId })
      .from(decisions)
      .where(and(eq(decisions.darkroomId, darkroomId), eq(decisions.actionId, decisionId)));
    return row?.id ?? null;
  }
}
