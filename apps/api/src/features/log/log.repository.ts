import { Injectable } from '@nestjs/common';
import {
  actions,
  bottles,
  chemistryVersions,
  decisions,
  deliveryLines,
  discards,
  holds,
  loadFilm,
  loads,
  loadSteps,
  lots,
  memberships,
  guests,
  mixDraws,
  mixes,
  orderChanges,
  orders,
  packs,
  settingChanges,
  suppliers,
  voids,
} from '@wetside/db';
import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import { union } from 'drizzle-orm/pg-core';
import type { Tx } from '../../platform/database/database.js';

/** A place in the log's order. */
export interface Place {
  happenedAt: Date;
  seq: number;
}

/** The rows of details that the log's sentences are made of, for many actions at once. */
@Injectable()
export class LogRepository {
  /** Ids of actions, newest first, after that place. */
  async page(tx: Tx, darkroomId: string, after: Place | null, limit: number) {
    return tx
      .select({ id: actions.id, kind: actions.kind, happenedAt: actions.happenedAt, seq: actions.seq })
      .from(actions)
      .where(
        and(
          eq(actions.darkroomId, darkroomId),
          after
            ? sql`(${actions.happenedAt}, ${actions.seq}) < (${after.happenedAt.toISOString()}, ${after.seq})`
            : undefined,
        ),
      )
      .orderBy(desc(actions.happenedAt), desc(actions.seq))
      .limit(limit);
  }

  /** Every action that touched the bottle, and what took such a one back, newest first. */
  async ofBottle(tx: Tx, darkroomId: string, bottleId: string) {
    const direct = union(
      tx
        .select({ id: mixes.actionId })
        .from(mixes)
        .where(and(eq(mixes.darkroomId, darkroomId), eq(mixes.bottleId, bottleId))),
      tx
        .select({ id: loadSteps.actionId })
        .from(loadSteps)
        .where(and(eq(loadSteps.darkroomId, darkroomId), eq(loadSteps.bottleId, bottleId))),
      tx
        .select({ id: holds.actionId })
        .from(holds)
        .where(and(eq(holds.darkroomId, darkroomId), eq(holds.bottleId, bottleId))),
      tx
        .select({ id: discards.actionId })
        .from(discards)
        .where(and(eq(discards.darkroomId, darkroomId), eq(discards.bottleId, bottleId))),
      tx
        .select({ id: mixDraws.actionId })
        .from(mixDraws)
        .where(and(eq(mixDraws.darkroomId, darkroomId), eq(mixDraws.parentBottleId, bottleId))),
    );
    const ids = (await direct).map((row) => row.id);
    if (ids.length === 0) return [];
    const takenBack = await tx
      .select({ id: voids.actionId })
      .from(voids)
      .where(and(eq(voids.darkroomId, darkroomId), inArray(voids.voidedActionId, ids)));
    return tx
      .select({ id: actions.id, kind: actions.kind })
      .from(actions)
      .where(
        and(
          eq(actions.darkroomId, darkroomId),
          inArray(actions.id, [...ids, ...takenBack.map((row) => row.id)]),
        ),
      )
      .orderBy(desc(actions.happenedAt), desc(actions.seq));
  }

  async bottleIdsOf(tx: Tx, darkroomId: string, actionId: string): Promise<string[]> {
    const rows = await union(
      tx
        .select({ id: mixes.bottleId })
        .from(mixes)
        .where(and(eq(mixes.darkroomId, darkroomId), eq(mixes.actionId, actionId))),
      tx
        .select({ id: loadSteps.bottleId })
        .from(loadSteps)
        .where(and(eq(loadSteps.darkroomId, darkroomId), eq(loadSteps.actionId, actionId))),
      tx
        .select({ id: holds.bottleId })
        .from(holds)
        .where(and(eq(holds.darkroomId, darkroomId), eq(holds.actionId, actionId))),
      tx
        .select({ id: discards.bottleId })
        .from(discards)
        .where(and(eq(discards.darkroomId, darkroomId), eq(discards.actionId, actionId))),
    );
    return rows.map((row) => row.id);
  }

  async mixes(tx: Tx, darkroomId: string, ids: string[]) {
    return tx
      .select({
        actionId: mixes.actionId,
        code: bottles.code,
        volumeUl: mixes.volumeUl,
        name: sql<string>`${chemistryVersions.document} ->> 'name'`,
      })
      .from(mixes)
      .innerJoin(bottles, and(eq(bottles.darkroomId, mixes.darkroomId), eq(bottles.id, mixes.bottleId)))
      .innerJoin(
        chemistryVersions,
        and(
          eq(chemistryVersions.darkroomId, bottles.darkroomId),
          eq(chemistryVersions.id, bottles.chemistryVersionId),
        ),
      )
      .where(and(eq(mixes.darkroomId, darkroomId), inArray(mixes.actionId, ids)));
  }

  async film(tx: Tx, darkroomId: string, ids: string[]) {
    return tx
      .select({
        actionId: loadFilm.actionId,
        format: loadFilm.format,
        widthMm: loadFilm.widthMm,
        heightMm: loadFilm.heightMm,
        count: loadFilm.count,
        filmClass: loadFilm.filmClass,
        ownerMembershipId: loadFilm.ownerMembershipId,
        ownerName: sql<string>`coalesce(${memberships.displayName}, ${guests.name})`,
        flags: loads.flags,
      })
      .from(loadFilm)
      .innerJoin(loads, and(eq(loads.darkroomId, loadFilm.darkroomId), eq(loads.actionId, loadFilm.actionId)))
      .leftJoin(
        memberships,
        and(eq(memberships.darkroomId, loadFilm.darkroomId), eq(memberships.id, loadFilm.ownerMembershipId)),
      )
      .leftJoin(guests, and(eq(guests.darkroomId, loadFilm.darkroomId), eq(guests.id, loadFilm.ownerGuestId)))
      .where(and(eq(loadFilm.darkroomId, darkroomId), inArray(loadFilm.actionId, ids)))
      .orderBy(asc(loadFilm.actionId), asc(loadFilm.ordinal));
  }

  async steps(tx: Tx, darkroomId: string, ids: string[]) {
    return tx
      .select({ actionId: loadSteps.actionId, code: bottles.code, flags: loadSteps.flags })
      .from(loadSteps)
      .innerJoin(
        bottles,
        and(eq(bottles.darkroomId, loadSteps.darkroomId), eq(bottles.id, loadSteps.bottleId)),
      )
      .where(and(eq(loadSteps.darkroomId, darkroomId), inArray(loadSteps.actionId, ids)))
      .orderBy(asc(bottles.code));
  }

  async holds(tx: Tx, darkroomId: string, ids: string[]) {
    return tx
      .select({ actionId: holds.actionId, code: bottles.code, change: holds.change, reason: holds.reason })
      .from(holds)
      .innerJoin(bottles, and(eq(bottles.darkroomId, holds.darkroomId), eq(bottles.id, holds.bottleId)))
      .where(and(eq(holds.darkroomId, darkroomId), inArray(holds.actionId, ids)));
  }

  async discards(tx: Tx, darkroomId: string, ids: string[]) {
    return tx
      .select({ actionId: discards.actionId, code: bottles.code, wasteRoute: discards.wasteRoute })
      .from(discards)
      .innerJoin(bottles, and(eq(bottles.darkroomId, discards.darkroomId), eq(bottles.id, discards.bottleId)))
      .where(and(eq(discards.darkroomId, darkroomId), inArray(discards.actionId, ids)));
  }

  async deliveries(tx: Tx, darkroomId: string, ids: string[]) {
    return tx
      .select({
        actionId: deliveryLines.actionId,
        count: deliveryLines.count,
        lotNumber: lots.lotNumber,
        pack: packs.name,
      })
      .from(deliveryLines)
      .innerJoin(lots, and(eq(lots.darkroomId, deliveryLines.darkroomId), eq(lots.id, deliveryLines.lotId)))
      .innerJoin(packs, and(eq(packs.darkroomId, lots.darkroomId), eq(packs.id, lots.packId)))
      .where(and(eq(deliveryLines.darkroomId, darkroomId), inArray(deliveryLines.actionId, ids)))
      .orderBy(asc(deliveryLines.actionId), asc(deliveryLines.ordinal));
  }

  async decisions(tx: Tx, darkroomId: string, ids: string[]) {
    return tx
      .select({
        actionId: decisions.actionId,
        loadActionId: decisions.loadActionId,
        reason: decisions.reason,
      })
      .from(decisions)
      .where(and(eq(decisions.darkroomId, darkroomId), inArray(decisions.actionId, ids)));
  }

  async settingChanges(tx: Tx, darkroomId: string, ids: string[]) {
    return tx
      .select()
      .from(settingChanges)
      .where(and(eq(settingChanges.darkroomId, darkroomId), inArray(settingChanges.actionId, ids)));
  }

  async orderChanges(tx: Tx, darkroomId: string, ids: string[]) {
    return tx
      .select({
        actionId: orderChanges.actionId,
        change: orderChanges.change,
        reason: orderChanges.reason,
        number: orders.number,
        supplier: suppliers.name,
      })
      .from(orderChanges)
      .innerJoin(
        orders,
        and(eq(orders.darkroomId, orderChanges.darkroomId), eq(orders.id, orderChanges.orderId)),
      )
      .innerJoin(
        suppliers,
        and(eq(suppliers.darkroomId, orders.darkroomId), eq(suppliers.id, orders.supplierId)),
      )
      .where(and(eq(orderChanges.darkroomId, darkroomId), inArray(orderChanges.actionId, ids)));
  }

  async voids(tx: Tx, darkroomId: string, ids: string[]) {
    return tx
      .select({
        actionId: voids.actionId,
        voidedActionId: voids.voidedActionId,
        voidedKind: actions.kind,
        reason: voids.reason,
      })
      .from(voids)
      .innerJoin(actions, and(eq(actions.darkroomId, voids.darkroomId), eq(actions.id, voids.voidedActionId)))
      .where(and(eq(voids.darkroomId, darkroomId), inArray(voids.actionId, ids)));
  }
}
