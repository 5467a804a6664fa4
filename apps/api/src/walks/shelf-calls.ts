import { supplierPacks } from '@wetside/db';
import { eq } from 'drizzle-orm';
import { OrdersRepository } from '../features/orders/orders.repository.js';
import { ShelfRepository } from '../features/shelf/shelf.repository.js';
import { StockHistoryRepository } from '../features/shelf/stock-history.repository.js';
import { StockRepository } from '../features/shelf/stock.repository.js';
import { SuppliersRepository } from '../features/suppliers/suppliers.repository.js';
import type { Ids } from '../testing/filled-house.js';
import { AT } from './bottle-calls.js';
import { callsOf, type RepositoryCalls } from './repository-calls.js';

const changeOf = ({ darkroomId, setting, supplierPackId }: Ids, actionId = setting) => ({
  ...{ darkroomId, actionId, subject: 'supplier-pack' as const, subjectId: supplierPackId },
  ...{ field: 'outUntil', oldValue: null, newValue: null },
});

export const aboutShelf: readonly RepositoryCalls[] = [
  callsOf(OrdersRepository)({
    details: (i) => [i.darkroomId, { ids: [i.draftId] }],
    lines: (i) => [i.darkroomId, [i.draftId]],
    mails: (i) => [i.darkroomId, [i.sentOrderId]],
    lock: (i) => [i.darkroomId, i.draftId],
    nextNumber: (i) => [i.darkroomId],
    insert: ({ darkroomId, newId: id, supplierId, managerId: draftedBy }) => [
      {
        ...{ darkroomId, id, number: 900, supplierId, state: 'draft', currency: 'EUR' },
        ...{ revision: 1, draftedBy, draftedAt: AT },
      },
    ],
    insertLines: ({ darkroomId, newId: id, draftId: orderId, supplierPackId }) => [
      [{ darkroomId, id, orderId, supplierPackId, position: 90, count: 1, received: 0, cancelled: 0 }],
    ],
    update: (i) => [i.darkroomId, i.draftId, { note: 'changed' }],
    writeLines: (i) => [i.darkroomId, [{ id: i.draftLineId, count: 7, received: 0, cancelled: 0 }]],
    addChange: ({ darkroomId, hold: actionId, draftId: orderId }) => [
      { darkroomId, actionId, orderId, change: 'drafted' },
    ],
    changedOrder: (i) => [i.darkroomId, i.draft],
    onOrder: (i) => [i.darkroomId, [i.packId]],
  }),
  callsOf(ShelfRepository)({
    packs: (i) => [i.darkroomId],
    parts: (i) => [i.darkroomId],
    makes: (i) => [i.darkroomId],
    lots: (i) => [i.darkroomId],
    opened: (i) => [i.darkroomId],
  }),
  callsOf(StockHistoryRepository)({
    movements: (i) => [i.darkroomId, i.receipt],
    codesDrawnFrom: (i) => [i.darkroomId, [i.openedPackId], i.load],
    codesOpenedFrom: (i) => [i.darkroomId, i.lotId],
    lastPrice: (i) => [i.darkroomId, i.lotId],
    delivery: (i) => [i.darkroomId, i.receipt],
    deliveryLines: (i) => [i.darkroomId, i.receipt],
    addDelivery: ({ darkroomId, hold: actionId, lotId }) => [
      { darkroomId, actionId },
      [{ darkroomId, actionId, ordinal: 0, lotId, count: 1 }],
    ],
  }),
  callsOf(StockRepository)({
    packIds: (i) => [i.darkroomId, [i.lotId], [i.openedPackId]],
    lockLots: (i) => [i.darkroomId, [i.lotId]],
    lockOpened: (i) => [i.darkroomId, [i.openedPackId]],
    parts: (i) => [i.darkroomId, i.packId],
    insertLots: ({ darkroomId, newId: id, packId }) => [
      [{ darkroomId, id, packId, lotNumber: '0900', expiryIsGuess: false, unopened: 0 }],
    ],
    moveLots: (i) => [i.darkroomId, [{ lotId: i.lotId, unopened: 1 }]],
    insertOpened: ({ darkroomId, newId: id, lotId, partId: packPartId }) => [
      [{ darkroomId, id, lotId, packPartId, openedOn: '2031-03-01', leftUl: 1 }],
    ],
    writeLeft: (i) => [i.darkroomId, [{ id: i.openedPackId, left: 1 }]],
    voidOpened: (i) => [i.darkroomId, [i.openedPackId], AT],
    insertMovements: ({ darkroomId, hold: actionId, packId, lotId }) => [
      [{ darkroomId, actionId, ordinal: 0, kind: 'counted', packId, lotId, unopenedDelta: 1 }],
    ],
  }),
  callsOf(SuppliersRepository)({
    current: (i) => [i.darkroomId],
    find: (i) => [i.darkroomId, i.supplierId],
    soldNow: (i) => [i.darkroomId],
    soldPacks: (i) => [i.darkroomId, [i.supplierPackId]],
    sold: (i) => [i.darkroomId, eq(supplierPacks.id, i.supplierPackId)],
    lockSupplierPack: (i) => [i.darkroomId, i.supplierPackId],
    setOutUntil: (i) => [i.darkroomId, i.supplierPackId, '2031-03-01'],
    addChanges: (i) => [[changeOf(i, i.hold)]],
    changes: (i) => [i.darkroomId, i.setting],
    newestChange: (i) => [i.darkroomId, changeOf(i)],
  }),
];
