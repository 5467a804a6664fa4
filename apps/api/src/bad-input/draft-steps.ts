import type { Draft } from '../testing/stock-house.js';
import type { Answer } from './table.js';
import type { World } from './world.js';

type Then = (w: World, draft: Draft) => PromiseLike<Answer>;

/** What is done with a draft of two concentrates and a kit. */
export const drafted =
  (then: Then, before: Then[] = []) =>
  async (w: World) => {
    const draft = await w.house.draft(2);
    for (const first of before) expect((await first(w, draft)).status).toBeLessThan(300);
    return () => then(w, draft);
  };

export const change =
  (revision: number, lines: (w: World, draft: Draft) => object[], more: object = {}): Then =>
  (w, draft) =>
    w.technician.patch(w.url(`orders/${draft.orderId}`)).send({ revision, lines: lines(w, draft), ...more });

export const concentrates =
  (count: number) =>
  (w: World, { concentrate }: Draft) => [{ id: concentrate, supplierPackId: w.house.soldConcentrate, count }];
export const none = () => [];
export const both = (w: World, draft: Draft) => [
  ...concentrates(0)(w, draft),
  { id: draft.kit, supplierPackId: w.house.soldKit, count: 0 },
];

export const send =
  (revision: number): Then =>
  (w, { orderId }) =>
    w.put(w.manager, 'order-sendings', { orderId, revision });
export const cancel: Then = (w, { orderId }) =>
  w.put(w.manager, 'order-cancellations', { orderId, reason: 'late' });

/** So many concentrates came of that order. */
export const came =
  (count: number, more: object = {}, line: object = {}): Then =>
  (w, { orderId, concentrate }) =>
    w.put(w.technician, 'receipts', {
      orderId,
      lines: [w.receiptLine({ orderLineId: concentrate, count, ...line })],
      ...more,
    });
export const allCame: Then = (w, { orderId, concentrate, kit }) =>
  w.put(w.technician, 'receipts', {
    orderId,
    lines: [
      w.receiptLine({ orderLineId: concentrate, count: 2 }),
      w.receiptLine({ packId: w.house.kit, orderLineId: kit, count: 1 }),
    ],
  });
