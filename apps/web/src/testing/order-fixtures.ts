import type { OrderView, ShelfPack } from '../shared/api/types.js';
import type { Handler } from './fake-api.js';
import { darkroom, me } from './fixtures.js';

/** An answer that is always the same. */
export const body = (value: unknown) => () => ({ body: value });

/** A pack of the shelf that nobody has a single one of. */
export const pack: ShelfPack = {
  id: 'p-1',
  name: 'Rapid fixer concentrate, 1 L',
  form: 'concentrate',
  reorderPoint: 1,
  reorderUpTo: 2,
  unopened: 0,
  onOrder: 0,
  advice: { due: false, quantity: 0, reason: '' },
  firstExpiry: null,
  parts: [],
  makes: [],
  lots: [],
  soldBy: [],
};

/** What every page of a darkroom asks for, as its manager. */
export const inside = { 'GET /me': body(me('manager')), 'GET /darkrooms/harbour': body(darkroom('manager')) };

export const order = (state: OrderView['state'], more: Partial<OrderView> = {}): OrderView => ({
  id: 'o-2',
  number: 2,
  numberText: '0002',
  supplier: { id: 's-1', name: 'Low Quay Supplies', email: 'orders@lowquay.example' },
  state,
  currency: 'EUR',
  note: null,
  revision: 1,
  draftedBy: 'Tomas',
  draftedAt: '2026-12-01T09:00:00.000Z',
  sentBy: null,
  sentAt: null,
  totalMinor: 3_450,
  lines: [
    {
      id: 'l-1',
      supplierPackId: 'sp-1',
      packId: 'p-1',
      packName: 'Rapid fixer concentrate, 1 L',
      supplierName: 'LQ 17 rapid fixer, litre',
      count: 3,
      priceMinor: 1_150,
      received: 0,
      cancelled: 0,
    },
  ],
  mail: null,
  ...more,
});
export const orderPage = (shown: OrderView): Record<string, Handler> => ({
  ...inside,
  'GET /darkrooms/harbour/suppliers': body({ suppliers: [] }),
  'GET /darkrooms/harbour/orders/o-2': body({ order: shown, mailText: 'Please send' }),
});
