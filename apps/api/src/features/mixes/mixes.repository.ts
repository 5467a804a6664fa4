import { Injectable } from '@nestjs/common';
import { actions, bottles, discards, holds, loadSteps, mixDraws, mixes, voids } from '@wetside/db';
import { and, eq, isNull, type SQL } from 'drizzle-orm';
import type { PgColumn } from 'drizzle-orm/pg-core';
import type { Tx } from '../../platform/database/database.js';

@Injectable()
export class MixesRepository {
  async insert(
    tx: Tx,
    mix: typeof mixes.$inferInsert,
    draws: (typeof mixDraws.$inferInsert)[],
  ): Promise<void> {
    await tx.insert(mixes).values(mix);
    if (draws.length > 0) await tx.insert(mixDraws).values(draws);
  }

  /** The bottle that it made and the bottles of stock that it drew from. */
  async bottlesOf(
    tx: Tx,
    darkroomId: string,
    actionId: string,
  ): Promise<{ made: string; parents: string[] } | null> {
    const [mix] = await tx
      .select({ id: mixes.bottleId })
      .from(mixes)
      .where(and(eq(mixes.darkroomId, darkroomId), eq(mixes.actionId, actionId)));
    if (!mix) return null;
    const draws = await tx
      .select({ id: mixDraws.parentBottleId })
      .from(mixDraws)
      .where(and(eq(mixDraws.darkroomId, darkroomId), eq(mixDraws.actionId, actionId)));
    return { made: mix.id, parents: [...new Set(draws.flatMap((draw) => draw.id ?? []))] };
  }

  /** How many loads, holds and discards, and mixes out of it, stand on that bottle. */
  async leaning(
    tx: Tx,
    darkroomId: string,
    bottleId: string,
  ): Promise<{ loads: number; others: number; drawnBy: string[] }> {
    const loads = await this.standing(
      tx,
      loadSteps,
      and(eq(loadSteps.darkroomId, darkroomId), eq(loadSteps.bottleId, bottleId)),
    );
    const held = await this.standing(
      tx,
      holds,
      and(eq(holds.darkroomId, darkroomId), eq(holds.bottleId, bottleId)),
    );
    const discarded = await this.standing(
      tx,
      discards,
      and(eq(discards.darkroomId, darkroomId), eq(discards.bottleId, bottleId)),
    );
    const drawn = await tx
      .select({ code: bottles.code })
      .from(mixDraws)
      .innerJoin(mixes, and(eq(mixes.darkroomId, mixDraws.darkroomId), eq(mixes.actionId, mixDraws.actionId)))
      .innerJoin(bottles, and(eq(bottles.darkroomId, mixes.darkroomId), eq(bottles.id, mixes.bottleId)))
      .leftJoin(
        voids,
        and(eq(voids.darkroomId, mixDraws.darkroomId), eq(voids.voidedActionId, mixDraws.actionId)),
      )
      .where(
        and(
          eq(mixDraws.darkroomId, darkroomId),
          eq(mixDraws.parentBottleId, bottleId),
          isNull(voids.actionId),
        ),
      );
    return { loads, others: held + discarded, drawnBy: drawn.map((row) => row.code) };
  }

  private async standing(
    tx: Tx,
    detail: (typeof loadSteps | typeof holds | typeof discards) & {
      darkroomId: PgColumn;
      actionId: PgColumn;
    },
    where: SQL | undefined,
  ): Promise<number> {
    const rows = await tx
      .select({ id: actions.id })
      .from(detail)
      .innerJoin(actions, and(eq(actions.darkroomId, detail.darkroomId), eq(actions.id, detail.actionId)))
      .leftJoin(voids, and(eq(voids.darkroomId, actions.darkroomId), eq(voids.voidedActionId, actions.id)))
      .where(and(where, isNull(voids.actionId)));
    return rows.length;
  }
}
