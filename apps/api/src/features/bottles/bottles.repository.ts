import { Injectable } from '@nestjs/common';
import type { BottleTotals } from '@wetside/chemistry';
import { actions, bottles, bottleTotals, chemistryVersions, counters, memberships } from '@wetside/db';
import { and, asc, eq, sql, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { validate } from 'uuid';
import type { Tx } from '../../platform/database/database.js';
import { hotQuery, isAnyOf } from '../../platform/database/hot-query.js';
import { ActionsRepository } from '../../platform/ledger/actions.repository.js';
import { withHolders } from '../../platform/ledger/holders.js';
import { ChemistryDocuments } from '../chemistries/chemistry-documents.js';
import type { LockedBottle } from './bottle-row.js';

/** Totals as they are to be written. */
export interface TotalsRow {
  bottleId: string;
  totals: BottleTotals | null;
  nextLookAt: string | null;
}

const mixers = alias(memberships, 'mixers');

export type BottleDetail = Awaited<ReturnType<BottlesRepository['details']>>[number];

const isInUse = (totals: BottleTotals | null): boolean => totals !== null && totals.discardedAt === null;

const lockBottles = hotQuery('lock_bottles', (db) =>
  db
    .select({
      id: bottles.id,
      code: bottles.code,
      material: bottles.material,
      chemistryVersionId: bottles.chemistryVersionId,
      chemistryId: chemistryVersions.chemistryId,
      madeByActionId: bottles.madeByActionId,
      madeAt: actions.happenedAt,
      totals: bottleTotals.totals,
    })
    .from(bottleTotals)
    .innerJoin(
      bottles,
      and(eq(bottles.darkroomId, bottleTotals.darkroomId), eq(bottles.id, bottleTotals.bottleId)),
    )
    .innerJoin(
      chemistryVersions,
      and(
        eq(chemistryVersions.darkroomId, bottles.darkroomId),
        eq(chemistryVersions.id, bottles.chemistryVersionId),
      ),
    )
    .innerJoin(
      actions,
      and(eq(actions.darkroomId, bottles.darkroomId), eq(actions.id, bottles.madeByActionId)),
    )
    .where(
      and(eq(bottleTotals.darkroomId, sql.placeholder('darkroomId')), isAnyOf(bottleTotals.bottleId, 'ids')),
    )
    .orderBy(asc(bottleTotals.bottleId))
    .for('no key update', { of: bottleTotals }),
);

/** The bottles' pages, by which of them are wanted. */
const details = (name: string, wanted: SQL) =>
  hotQuery(name, (db) =>
    db
      .select({
        id: bottles.id,
        code: bottles.code,
        chemistryVersionId: bottles.chemistryVersionId,
        material: bottles.material,
        totals: bottleTotals.totals,
        costMinor: bottles.costMinor,
        currency: bottles.currency,
        mixedBy: mixers.displayName,
      })
      .from(bottles)
      .innerJoin(
        bottleTotals,
        and(eq(bottleTotals.darkroomId, bottles.darkroomId), eq(bottleTotals.bottleId, bottles.id)),
      )
      .innerJoin(
        actions,
        and(eq(actions.darkroomId, bottles.darkroomId), eq(actions.id, bottles.madeByActionId)),
      )
      .innerJoin(mixers, and(eq(mixers.darkroomId, actions.darkroomId), eq(mixers.id, actions.membershipId)))
      .where(and(eq(bottles.darkroomId, sql.placeholder('darkroomId')), wanted))
      .orderBy(asc(bottles.code)),
  );
const detailsOf = {
  'in-use': details('bottles_in_use', sql`${bottleTotals.inUse}`),
  all: details('bottles_all', sql`${bottleTotals.totals} is not null`),
};
const detailsNamed = details('bottles_named', isAnyOf(bottles.id, 'ids'));

@Injectable()
export class BottlesRepository {
  constructor(
    private readonly documents: ChemistryDocuments,
    private readonly actions: ActionsRepository,
  ) {}

  /** Locks the totals of these bottles, in the order of their ids, and reads what their rules need. Unknown ids are left out. */
  async lock(tx: Tx, darkroomId: string, ids: readonly string[]): Promise<LockedBottle[]> {
    const rows = await lockBottles(tx, { darkroomId, ids: [...ids] });
    return this.documents.with(tx, darkroomId, rows);
  }

  async insert(tx: Tx, row: typeof bottles.$inferInsert): Promise<void> {
    await tx.insert(bottles).values(row);
  }

  async insertTotals(tx: Tx, darkroomId: string, row: TotalsRow): Promise<void> {
    await tx.insert(bottleTotals).values({
      darkroomId,
      bottleId: row.bottleId,
      totals: row.totals,
      inUse: isInUse(row.totals),
      volumeUl: row.totals?.volumeUl ?? 0,
      nextLookAt: row.nextLookAt === null ? null : new Date(row.nextLookAt),
    });
  }

  /** Writes all of them in one statement; their rows are locked already. */
  async writeTotals(tx: Tx, darkroomId: string, rows: readonly TotalsRow[]): Promise<void> {
    const written = rows.map(({ bottleId, totals, nextLookAt }) => ({
      bottle_id: bottleId,
      totals,
      in_use: isInUse(totals),
      volume_ul: totals?.volumeUl ?? 0,
      next_look_at: nextLookAt,
    }));
    await tx.execute(sql`
      update ${bottleTotals} as t
      set totals = d.totals, in_use = d.in_use, volume_ul = d.volume_ul, next_look_at = d.next_look_at
      from jsonb_to_recordset(${JSON.stringify(written)}::text::jsonb)
        as d(bottle_id uuid, totals jsonb, in_use boolean, volume_ul bigint, next_look_at timestamptz)
      where t.darkroom_id = ${darkroomId} and t.bottle_id = d.bottle_id`);
  }

  /** The next number of a counter that starts at 1; the counter's row stays locked until the end. */
  async nextNumber(tx: Tx, darkroomId: string, name: string): Promise<number> {
    const [row] = await tx
      .insert(counters)
      .values({ darkroomId, name, last: 1 })
      .onConflictDoUpdate({
        target: [counters.darkroomId, counters.name],
        set: { last: sql`${counters.last} + 1` },
      })
      .returning({ last: counters.last });
    if (!row) throw new Error(`The counter ${name} gave no number.`);
    return row.last;
  }

  /** All bottles in use, or all there ever were, or those named. Bottles whose mix was voided only when named. */
  async details(tx: Tx, darkroomId: string, which: { ids: readonly string[] } | 'in-use' | 'all') {
    const rows =
      typeof which === 'string'
        ? await detailsOf[which](tx, { darkroomId })
        : await detailsNamed(tx, { darkroomId, ids: [...which.ids] });
    const named = await withHolders(this.actions, tx, darkroomId, rows);
    return this.documents.with(tx, darkroomId, named);
  }

  async findId(tx: Tx, darkroomId: string, idOrCode: string): Promise<string | null> {
    const named = validate(idOrCode) ? eq(bottles.id, idOrCode) : eq(bottles.code, idOrCode.toUpperCase());
    const [row] = await tx
      .select({ id: bottles.id })
      .from(bottles)
      .where(and(eq(bottles.darkroomId, darkroomId), named));
    return row?.id ?? null;
  }
}
