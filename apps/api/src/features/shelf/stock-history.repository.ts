import { Injectable } from '@nestjs/common';
import { actions, bottles, deliveries, deliveryLines, mixDraws, stockMovements, voids } from '@wetside/db';
import { and, asc, desc, eq, inArray, isNotNull, isNull, ne } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';

export type MovementRow = typeof stockMovements.$inferSelect;
export type DeliveryLineRow = typeof deliveryLines.$inferSelect;

/** What happened on the shelf, read back. */
@Injectable()
export class StockHistoryRepository {
  movements(tx: Tx, darkroomId: string, actionId: string): Promise<MovementRow[]> {
    return tx
      .select()
      .from(stockMovements)
      .where(and(eq(stockMovements.darkroomId, darkroomId), eq(stockMovements.actionId, actionId)))
      .orderBy(asc(stockMovements.ordinal));
  }

  /** Codes of the bottles that other mixes, not taken back, made out of these opened packs. */
  async codesDrawnFrom(
    tx: Tx,
    darkroomId: string,
    openedPackIds: readonly string[],
    butFor: string,
  ): Promise<string[]> {
    if (openedPackIds.length === 0) return [];
    const rows = await tx
      .selectDistinct({ code: bottles.code })
      .from(mixDraws)
      .innerJoin(
        bottles,
        and(eq(bottles.darkroomId, mixDraws.darkroomId), eq(bottles.madeByActionId, mixDraws.actionId)),
      )
      .leftJoin(
        voids,
        and(eq(voids.darkroomId, mixDraws.darkroomId), eq(voids.voidedActionId, mixDraws.actionId)),
      )
      .where(
        and(
          eq(mixDraws.darkroomId, darkroomId),
          inArray(mixDraws.openedPackId, [...openedPackIds]),
          ne(mixDraws.actionId, butFor),
          isNull(voids.actionId),
        ),
      )
      .orderBy(asc(bottles.code));
    return rows.map((row) => row.code);
  }

  /** Codes of the bottles that mixes, not taken back, opened a pack of this lot for. */
  async codesOpenedFrom(tx: Tx, darkroomId: string, lotId: string): Promise<string[]> {
    const rows = await tx
      .selectDistinct({ code: bottles.code })
      .from(stockMovements)
      .innerJoin(
        bottles,
        and(
          eq(bottles.darkroomId, stockMovements.darkroomId),
          eq(bottles.madeByActionId, stockMovements.actionId),
        ),
      )
      .leftJoin(
        voids,
        and(
          eq(voids.darkroomId, stockMovements.darkroomId),
          eq(voids.voidedActionId, stockMovements.actionId),
        ),
      )
      .where(
        and(
          eq(stockMovements.darkroomId, darkroomId),
          eq(stockMovements.lotId, lotId),
          eq(stockMovements.kind, 'opened'),
          isNull(voids.actionId),
        ),
      )
      .orderBy(asc(bottles.code));
    return rows.map((row) => row.code);
  }

  /** The price of the lot's last delivery that has one and was not taken back, in minor units. */
  async lastPrice(
    tx: Tx,
    darkroomId: string,
    lotId: string,
  ): Promise<{ priceMinor: number; currency: string } | null> {
    const [row] = await tx
      .select({ priceMinor: deliveryLines.priceMinor, currency: deliveryLines.currency })
      .from(deliveryLines)
      .innerJoin(
        actions,
        and(eq(actions.darkroomId, deliveryLines.darkroomId), eq(actions.id, deliveryLines.actionId)),
      )
      .leftJoin(
        voids,
        and(eq(voids.darkroomId, deliveryLines.darkroomId), eq(voids.voidedActionId, deliveryLines.actionId)),
      )
      .where(
        and(
          eq(deliveryLines.darkroomId, darkroomId),
          eq(deliveryLines.lotId, lotId),
          isNotNull(deliveryLines.priceMinor),
          isNull(voids.actionId),
        ),
      )
      .orderBy(desc(actions.happenedAt), desc(actions.seq), desc(deliveryLines.ordinal))
      .limit(1);
    if (!row || row.priceMinor === null || row.currency === null) return null;
    return { priceMinor: row.priceMinor, currency: row.currency };
  }

  async delivery(tx: Tx, darkroomId: string, actionId: string) {
    const [row] = await tx
      .select()
      .from(deliveries)
      .where(and(eq(deliveries.darkroomId, darkroomId), eq(deliveries.actionId, actionId)));
    return row ?? null;
  }

  deliveryLines(tx: Tx, darkroomId: string, actionId: string): Promise<DeliveryLineRow[]> {
    return tx
      .select()
      .from(deliveryLines)
      .where(and(eq(deliveryLines.darkroomId, darkroomId), eq(deliveryLines.actionId, actionId)))
      .orderBy(asc(deliveryLines.ordinal));
  }

  async addDelivery(
    tx: Tx,
    delivery: typeof deliveries.$inferInsert,
    lines: (typeof deliveryLines.$inferInsert)[],
  ): Promise<void> {
    await tx.insert(deliveries).values(delivery);
    await tx.insert(deliveryLines).values(lines);
  }
}
