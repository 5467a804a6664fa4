import { Injectable } from '@nestjs/common';
import type { Tx } from '../../platform/database/database.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import type { SuppliersAnswer } from './suppliers.dto.js';
import { SuppliersRepository, type SoldPack, type SupplierRow } from './suppliers.repository.js';

@Injectable()
export class SuppliersService {
  constructor(private readonly repository: SuppliersRepository) {}

  list(enter: Entrance): Promise<SuppliersAnswer> {
    return enter(async (tx, me) => {
      const rows = await this.repository.current(tx, me.darkroomId);
      const sold = await this.repository.soldNow(tx, me.darkroomId);
      return { suppliers: rows.map((row) => view(row, sold)) };
    });
  }

  find(tx: Tx, darkroomId: string, id: string): Promise<SupplierRow | null> {
    return this.repository.find(tx, darkroomId, id);
  }

  /** What the suppliers in use sell. */
  soldNow(tx: Tx, darkroomId: string): Promise<SoldPack[]> {
    return this.repository.soldNow(tx, darkroomId);
  }

  /** These packs as they are sold; ids that are not in this darkroom are left out. */
  soldPacks(tx: Tx, darkroomId: string, supplierPackIds: readonly string[]): Promise<SoldPack[]> {
    return this.repository.soldPacks(tx, darkroomId, supplierPackIds);
  }
}

function view({ id, name, email, currency, minimumMinor, leadDays }: SupplierRow, sold: readonly SoldPack[]) {
  const packs = sold
    .filter((pack) => pack.supplierId === id)
    .map(({ supplierPackId, packId, packName, supplierName, priceMinor, outUntil }) => ({
      supplierPackId,
      packId,
      packName,
      supplierName,
      priceMinor,
      outUntil,
    }));
  return { id, name, email, currency, minimumMinor, leadDays, packs };
}
