import { Injectable } from '@nestjs/common';
import { actions, packs, settingChanges, supplierPacks, suppliers, voids } from '@wetside/db';
import { and, asc, desc, eq, inArray, isNull, type SQL } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';

export type SupplierRow = typeof suppliers.$inferSelect;
export type SettingChangeRow = typeof settingChanges.$inferSelect;
/** A pack as a supplier sells it, with both names. */
export type SoldPack = Awaited<ReturnType<SuppliersRepository['sold']>>[number];

@Injectable()
export class SuppliersRepository {
  /** The suppliers that the house still orders from, by name. */
  current(tx: Tx, darkroomId: string): Promise<SupplierRow[]> {
    return tx
      .select()
      .from(suppliers)
      .where(and(eq(suppliers.darkroomId, darkroomId), isNull(suppliers.archivedAt)))
      .orderBy(asc(suppliers.name), asc(suppliers.id));
  }

  async find(tx: Tx, darkroomId: string, id: string): Promise<SupplierRow | null> {
    const [row] = await tx
      .select()
      .from(suppliers)
      .where(and(eq(suppliers.darkroomId, darkroomId), eq(suppliers.id, id)));
    return row ?? null;
  }

  /** What the suppliers in use sell, by the pack's name. */
  soldNow(tx: Tx, darkroomId: string) {
    return this.sold(tx, darkroomId, isNull(suppliers.archivedAt));
  }

  async soldPacks(tx: Tx, darkroomId: string, supplierPackIds: readonly string[]): Promise<SoldPack[]> {
    if (supplierPackIds.length === 0) return [];
    return this.sold(tx, darkroomId, inArray(supplierPacks.id, [...supplierPackIds]));
  }

  sold(tx: Tx, darkroomId: string, which: SQL) {
    return tx
      .select({
        supplierPackId: supplierPacks.id,
        supplierId: supplierPacks.supplierId,
        supplierTitle: suppliers.name,
        packId: supplierPacks.packId,
        packName: packs.name,
        supplierName: supplierPacks.supplierName,
        priceMinor: supplierPacks.priceMinor,
        currency: suppliers.currency,
        outUntil: supplierPacks.outUntil,
      })
      .from(supplierPacks)
      .innerJoin(
        suppliers,
        and(eq(suppliers.darkroomId, supplierPacks.darkroomId), eq(suppliers.id, supplierPacks.supplierId)),
      )
      .innerJoin(
        packs,
        and(eq(packs.darkroomId, supplierPacks.darkroomId), eq(packs.id, supplierPacks.packId)),
      )
      .where(and(eq(supplierPacks.darkroomId, darkroomId), which))
      .orderBy(asc(packs.name), asc(suppliers.name), asc(supplierPacks.id));
  }

  async lockSupplierPack(tx: Tx, darkroomId: string, id: string) {
    const [row] = await tx
      .select()
      .from(supplierPacks)
      .where(and(eq(supplierPacks.darkroomId, darkroomId), eq(supplierPacks.id, id)))
      .for('no key update');
    return row ?? null;
  }

  async setOutUntil(tx: Tx, darkroomId: string, id: string, outUntil: string | null): Promise<void> {
    await tx
      .update(supplierPacks)
      .set({ outUntil })
      .where(and(eq(supplierPacks.darkroomId, darkroomId), eq(supplierPacks.id, id)));
  }

  async addChanges(tx: Tx, rows: SettingChangeRow[]): Promise<void> {
    await tx.insert(settingChanges).values(rows);
  }

  changes(tx: Tx, darkroomId: string, actionId: string): Promise<SettingChangeRow[]> {
    return tx
      .select()
      .from(settingChanges)
      .where(and(eq(settingChanges.darkroomId, darkroomId), eq(settingChanges.actionId, actionId)))
      .orderBy(asc(settingChanges.field));
  }

  /** The action that changed this field last and was not taken back; last by the server's order, for that is how values followed. */
  async newestChange(tx: Tx, darkroomId: string, change: SettingChangeRow): Promise<string | null> {
    const [row] = await tx
      .select({ actionId: settingChanges.actionId })
      .from(settingChanges)
      .innerJoin(
        actions,
        and(eq(actions.darkroomId, settingChanges.darkroomId), eq(actions.id, settingChanges.actionId)),
      )
      .leftJoin(
        voids,
        and(
          eq(voids.darkroomId, settingChanges.darkroomId),
          eq(voids.voidedActionId, settingChanges.actionId),
        ),
      )
      .where(
        and(
          eq(settingChanges.darkroomId, darkroomId),
          eq(settingChanges.subject, change.subject),
          eq(settingChanges.subjectId, change.subjectId),
          eq(settingChanges.field, change.field),
          isNull(voids.actionId),
        ),
      )
      .orderBy(desc(actions.seq))
      .limit(1);
    return row?.actionId ?? null;
  }
}
