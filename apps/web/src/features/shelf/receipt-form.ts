import type { FieldPath } from 'react-hook-form';
import { newId } from '../../shared/actions/send-action.js';
import type { ReceiptLine } from '../../shared/api/types.js';

export interface ReceiptRow {
  packId: string;
  packName: string;
  orderLineId: string;
  lotId: string;
  lotNumber: string;
  expiresOn: string;
  count: string;
  /** Said where more came than was ordered: the count is right. */
  moreIsRight: boolean;
}
export interface ReceiptForm {
  rows: ReceiptRow[];
  note: string;
}

export const emptyRow = (packId: string, packName = ''): ReceiptRow => ({
  packId,
  packName,
  orderLineId: '',
  lotId: newId(),
  lotNumber: '',
  expiresOn: '',
  count: '1',
  moreIsRight: false,
});

/** A row that says nothing came is left out. */
export const hasCome = (row: ReceiptRow): boolean => row.count.trim() !== '' && Number(row.count) !== 0;

export function receiptLines(rows: readonly ReceiptRow[]): ReceiptLine[] {
  return rows.filter(hasCome).map((row) => ({
    packId: row.packId,
    ...(row.orderLineId && { orderLineId: row.orderLineId }),
    lotId: row.lotId,
    lotNumber: row.lotNumber.trim(),
    expiresOn: row.expiresOn === '' ? null : row.expiresOn,
    count: Number(row.count),
  }));
}

/** The rows that the server said are more than was ordered. */
export function rowsOverOrder(fields: readonly string[], rows: readonly ReceiptRow[]): number[] {
  return fields.flatMap((field) => {
    const [, row] = /^rows\.(\d+)\.count$/.exec(fieldOfReceipt(field, rows) ?? '') ?? [];
    return row === undefined ? [] : [Number(row)];
  });
}

const columns = ['packId', 'lotNumber', 'expiresOn', 'count'] as const;

/** The field of the form that the server's 'lines.1.count' stands for: rows that were left out are skipped. */
export function fieldOfReceipt(field: string, rows: readonly ReceiptRow[]): FieldPath<ReceiptForm> | null {
  const [, at, name] = /^lines\.(\d+)\.(\w+)$/.exec(field) ?? [];
  const column = columns.find((one) => one === name);
  if (at === undefined || !column) return field === 'note' ? 'note' : null;
  const sent = rows.flatMap((row, index) => (hasCome(row) ? [index] : []));
  const index = sent[Number(at)];
  return index === undefined ? null : `rows.${index}.${column}`;
}
