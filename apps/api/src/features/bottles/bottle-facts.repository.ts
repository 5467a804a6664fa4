import { Injectable } from '@nestjs/common';
import type { BottleFact, Container } from '@wetside/chemistry';
import { actions, bottles, discards, holds, loadSteps, mixDraws, mixes, voids } from '@wetside/db';
import { and, eq, inArray, isNull, type SQL } from 'drizzle-orm';
import type { PgColumn } from 'drizzle-orm/pg-core';
import type { Tx } from '../../platform/database/database.js';

type Of<K extends BottleFact['kind']> = Extract<BottleFact, { kind: K }>;

const base = {
  actionId: actions.id,
  seq: actions.seq,
  happenedAt: actions.happenedAt,
  happenedOn: actions.happenedOn,
};

interface Base {
  actionId: string;
  seq: number;
  happenedAt: Date;
  happenedOn: string;
}

const fact = (row: Base) => ({
  actionId: row.actionId,
  seq: row.seq,
  happenedAt: row.happenedAt.toISOString(),
  happenedOn: row.happenedOn,
});

/** The join from a table of details to its action. */
const onAction = (detail: { darkroomId: PgColumn; actionId: PgColumn }): SQL | undefined =>
  and(eq(actions.darkroomId, detail.darkroomId), eq(actions.id, detail.actionId));

const onVoid: SQL | undefined = and(
  eq(voids.darkroomId, actions.darkroomId),
  eq(voids.voidedActionId, actions.id),
);

/** Every fact of these bottles that still stands, out of the tables of details: what `fold` takes. */
@Injectable()
export class BottleFactsRepository {
  async standing(
    tx: Tx,
    darkroomId: string,
    bottleIds: readonly string[],
  ): Promise<Map<string, BottleFact[]>> {
    const found = new Map<string, BottleFact[]>(bottleIds.map((id) => [id, []]));
    const ids = [...bottleIds];
    for (const [bottleId, one] of await this.mixes(tx, darkroomId, ids)) found.get(bottleId)?.push(one);
    for (const [bottleId, one] of await this.loads(tx, darkroomId, ids)) found.get(bottleId)?.push(one);
    for (const [bottleId, one] of await this.holds(tx, darkroomId, ids)) found.get(bottleId)?.push(one);
    for (const [bottleId, one] of await this.discards(tx, darkroomId, ids)) found.get(bottleId)?.push(one);
    for (const [bottleId, one] of await this.draws(tx, darkroomId, ids)) found.get(bottleId)?.push(one);
    return found;
  }

  private async mixes(tx: Tx, darkroomId: string, ids: string[]): Promise<[string, Of<'mix'>][]> {
    const rows = await tx
      .select({ ...base, mix: mixes, material: bottles.material })
      .from(mixes)
      .innerJoin(actions, onAction(mixes))
      .innerJoin(bottles, and(eq(bottles.darkroomId, mixes.darkroomId), eq(bottles.id, mixes.bottleId)))
      .leftJoin(voids, onVoid)
      .where(and(eq(mixes.darkroomId, darkroomId), inArray(mixes.bottleId, ids), isNull(voids.actionId)));
    return rows.map((row) => [row.mix.bottleId, { ...fact(row), ...openingOf(row.mix, row.material) }]);
  }

  private async loads(tx: Tx, darkroomId: string, ids: string[]): Promise<[string, Of<'load'>][]> {
    const rows = await tx
      .select({ ...base, step: loadSteps })
      .from(loadSteps)
      .innerJoin(actions, onAction(loadSteps))
      .leftJoin(voids, onVoid)
      .where(
        and(eq(loadSteps.darkroomId, darkroomId), inArray(loadSteps.bottleId, ids), isNull(voids.actionId)),
      );
    return rows.map(({ step, ...row }) => [
      step.bottleId,
      {
        ...fact(row),
        kind: 'load',
        charges: [{ material: step.material, countedE4: step.countedE4, takenUl: step.takenUl }],
      },
    ]);
  }

  private async holds(
    tx: Tx,
    darkroomId: string,
    ids: string[],
  ): Promise<[string, Of<'hold'> | Of<'release'>][]> {
    const rows = await tx
      .select({ ...base, bottleId: holds.bottleId, change: holds.change, reason: holds.reason })
      .from(holds)
      .innerJoin(actions, onAction(holds))
      .leftJoin(voids, onVoid)
      .where(and(eq(holds.darkroomId, darkroomId), inArray(holds.bottleId, ids), isNull(voids.actionId)));
    return rows.map((row) => [
      row.bottleId,
      row.change === 'hold'
        ? { ...fact(row), kind: 'hold', reason: row.reason }
        : { ...fact(row), kind: 'release' },
    ]);
  }

  private async discards(tx: Tx, darkroomId: string, ids: string[]): Promise<[string, Of<'discard'>][]> {
    const rows = await tx
      .select({ ...base, bottleId: discards.bottleId })
      .from(discards)
      .innerJoin(actions, onAction(discards))
      .leftJoin(voids, onVoid)
      .where(
        and(eq(discards.darkroomId, darkroomId), inArray(discards.bottleId, ids), isNull(voids.actionId)),
      );
    return rows.map((row) => [row.bottleId, { ...fact(row), kind: 'discard' }]);
  }

  /** What was poured out of a stock bottle into mixes that stand. */
  private async draws(tx: Tx, darkroomId: string, ids: string[]): Promise<[string, Of<'draw'>][]> {
    const rows = await tx
      .select({ ...base, bottleId: mixDraws.parentBottleId, takenUl: mixDraws.volumeUl })
      .from(mixDraws)
      .innerJoin(actions, onAction(mixDraws))
      .leftJoin(voids, onVoid)
      .where(
        and(
          eq(mixDraws.darkroomId, darkroomId),
          inArray(mixDraws.parentBottleId, ids),
          isNull(voids.actionId),
        ),
      );
    return rows.map((row) => [row.bottleId ?? '', { ...fact(row), kind: 'draw', takenUl: row.takenUl ?? 0 }]);
  }
}

type MixRow = typeof mixes.$inferSelect;

/** A stored mix as the rules' package tells it. */
export function openingOf(
  mix: Pick<MixRow, 'volumeUl' | 'containerSizeUl' | 'containerKind' | 'containerMaterial' | 'readyAt'>,
  material: (typeof bottles.$inferSelect)['material'],
): Omit<Of<'mix'>, keyof Base | 'part' | 'voided'> {
  const container: Container = { sizeUl: mix.containerSizeUl, kind: mix.containerKind };
  if (mix.containerMaterial) container.material = mix.containerMaterial;
  return {
    kind: 'mix',
    volumeUl: mix.volumeUl,
    container,
    material,
    ...(mix.readyAt ? { readyAt: mix.readyAt.toISOString() } : {}),
  };
}
