import { deliveryLines, lots, openedPacks, orderLines, orders, stockMovements, voids } from '@wetside/db';
import { and, asc, eq, isNotNull, isNull, sql } from 'drizzle-orm';
import type { PgColumn } from 'drizzle-orm/pg-core';
import type { Tx } from '../../platform/database/database.js';
import type { House } from '../../platform/house/house.repository.js';
import type { Found } from './found.js';

const voided = (detail: { darkroomId: PgColumn; actionId: PgColumn }) =>
  and(eq(voids.darkroomId, detail.darkroomId), eq(voids.voidedActionId, detail.actionId));

/** Sums of movements that stand: packs by lot, and microlitres or milligrams by opened pack. An opening is in both. */
async function movedSums(tx: Tx, darkroomId: string): Promise<Map<string, number>> {
  const { lotId, openedPackId, unopenedDelta, deltaUl, deltaMg } = stockMovements;
  const standing = and(eq(stockMovements.darkroomId, darkroomId), isNull(voids.actionId));
  const byLot = await tx
    .select({ id: lotId, sum: sql<number>`sum(${unopenedDelta})`.mapWith(Number) })
    .from(stockMovements)
    .leftJoin(voids, voided(stockMovements))
    .where(standing)
    .groupBy(lotId);
  const byOpened = await tx
    .select({ id: openedPackId, sum: sql<number>`sum(coalesce(${deltaUl}, ${deltaMg}))`.mapWith(Number) })
    .from(stockMovements)
    .leftJoin(voids, voided(stockMovements))
    .where(and(standing, isNotNull(openedPackId)))
    .groupBy(openedPackId);
  return new Map([...byLot, ...byOpened].map(({ id, sum }) => [id ?? '', sum]));
}

/** Every lot against the sum of its movements that stand, and every opened pack likewise. Opened packs are not counted. */
export async function checkLots(tx: Tx, { darkroomId, shortName }: House): Promise<Found> {
  const sums = await movedSums(tx, darkroomId);
  const lotRows = await tx
    .select({ id: lots.id, lotNumber: lots.lotNumber, unopened: lots.unopened })
    .from(lots)
    .where(eq(lots.darkroomId, darkroomId))
    .orderBy(asc(lots.id));
  const opened = await tx
    .select({ pack: openedPacks, lotNumber: lots.lotNumber })
    .from(openedPacks)
    .innerJoin(lots, and(eq(lots.darkroomId, openedPacks.darkroomId), eq(lots.id, openedPacks.lotId)))
    .where(eq(openedPacks.darkroomId, darkroomId))
    .orderBy(asc(openedPacks.id));
  const differences = [
    ...lotRows.map(({ id, lotNumber, unopened }) =>
      unlike(`lot ${lotNumber}: unopened packs`, unopened, sums.get(id) ?? 0),
    ),
    ...opened.map(({ pack, lotNumber }) =>
      unlike(
        `opened pack of ${pack.openedOn}, lot ${lotNumber}: ${pack.leftUl === null ? 'mg' : 'µL'} left`,
        pack.leftUl ?? pack.leftMg ?? 0,
        sums.get(pack.id) ?? 0,
      ),
    ),
  ].flatMap((text) => (text ? [`${shortName}, ${text}.`] : []));
  return { checked: lotRows.length, differences };
}

/** Every order line against what came of it. */
export async function checkOrderLines(tx: Tx, { darkroomId, shortName }: House): Promise<Found> {
  const came = await tx
    .select({ id: deliveryLines.orderLineId, sum: sql<number>`sum(${deliveryLines.count})`.mapWith(Number) })
    .from(deliveryLines)
    .leftJoin(voids, voided(deliveryLines))
    .where(and(eq(deliveryLines.darkroomId, darkroomId), isNull(voids.actionId)))
    .groupBy(deliveryLines.orderLineId);
  const sums = new Map(came.map(({ id, sum }) => [id, sum]));
  const rows = await tx
    .select({
      id: orderLines.id,
      position: orderLines.position,
      received: orderLines.received,
      number: orders.number,
    })
    .from(orderLines)
    .innerJoin(orders, and(eq(orders.darkroomId, orderLines.darkroomId), eq(orders.id, orderLines.orderId)))
    .where(eq(orderLines.darkroomId, darkroomId))
    .orderBy(asc(orders.number), asc(orderLines.position));
  const differences = rows.flatMap(({ id, number, position, received }) => {
    const text = unlike(`order ${number}, line ${position}: packs received`, received, sums.get(id) ?? 0);
    return text ? [`${shortName}, ${text}.`] : [];
  });
  return { checked: rows.length, differences };
}

const unlike = (what: string, stored: number, summed: number): string | null =>
  stored === summed ? null : `${what} are stored as ${stored}, and what happened adds up to ${summed}`;
