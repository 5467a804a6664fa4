import { v7 } from 'uuid';
import { allCame, both, cancel, change, concentrates, drafted, none, send } from './draft-steps.js';
import type { Row } from './table.js';

const changed = ['order-changed', undefined, 'as it is now'] as const;

export const orderRows: Row[] = [
  ['a draft changed', drafted(change(1, concentrates(3))), 200],
  [
    'a draft changed that somebody changed since',
    drafted(change(1, concentrates(4)), [change(1, concentrates(3))]),
    409,
    ...changed,
  ],
  ['a draft changed as it is now', drafted(change(2, concentrates(4)), [change(1, concentrates(3))]), 200],
  [
    'a line changed that somebody took out',
    drafted(change(1, concentrates(4)), [change(1, concentrates(0))]),
    409,
    ...changed,
  ],
  [
    'a draft noted that somebody changed since',
    drafted(change(1, none, { note: 'ring first' }), [change(1, concentrates(3))]),
    409,
    ...changed,
  ],
  ['a draft changed to a revision that is yet to come', drafted(change(2, concentrates(4))), 409, ...changed],
  [
    'a draft changed that somebody sent',
    drafted(change(1, concentrates(4)), [send(1)]),
    422,
    'order-not-draft',
  ],
  [
    'an order changed that went out, as it is now',
    drafted(change(2, concentrates(4)), [send(1)]),
    422,
    'order-not-draft',
  ],
  [
    'a draft changed that was cancelled',
    drafted(change(2, concentrates(4)), [cancel]),
    422,
    'order-not-draft',
  ],
  ['a draft sent', drafted(send(1)), 201],
  [
    'a draft sent that somebody changed since it was seen',
    drafted(send(1), [change(1, concentrates(3))]),
    409,
    ...changed,
  ],
  ['a draft sent as it is now', drafted(send(2), [change(1, concentrates(3))]), 201],
  ['a draft sent twice, by two', drafted(send(1), [send(1)]), 422, 'order-not-draft'],
  [
    'a draft sent with no line left',
    drafted(send(2), [change(1, both)]),
    422,
    'order-empty',
    undefined,
    'at least one pack',
  ],
  ['a cancelled draft sent', drafted(send(2), [cancel]), 422, 'order-not-draft'],
  [
    'a draft cancelled twice',
    drafted(cancel, [cancel]),
    422,
    'order-closed',
    undefined,
    'nothing left to cancel',
  ],
  ['an order cancelled that has all come', drafted(cancel, [send(1), allCame]), 422, 'order-closed'],
  [
    'a line that is to be another pack',
    drafted(
      change(1, (w, { concentrate }) => [{ id: concentrate, supplierPackId: w.house.soldKit, count: 1 }]),
    ),
    400,
    'invalid',
    'lines.0.supplierPackId',
    'keeps its pack',
  ],
  [
    'a pack on two lines',
    drafted(change(1, (w) => [{ id: v7(), supplierPackId: w.house.soldKit, count: 1 }])),
    400,
    'invalid',
  ],
  [
    'a line named twice',
    drafted(change(1, (w, draft) => [...concentrates(1)(w, draft), ...concentrates(2)(w, draft)])),
    400,
    'invalid',
    'lines.1.id',
    'named twice',
  ],
  [
    'a line of another order',
    drafted(
      change(2, (w) => [{ id: w.ids.draftLineId, supplierPackId: w.house.soldConcentrate, count: 1 }]),
      [change(1, concentrates(0))],
    ),
    409,
    'order-exists',
  ],
  [
    'an order’s id a second time',
    (w) => w.put(w.technician, 'order-drafts', { ...w.draft(), orderId: w.ids.draftId }),
    409,
    'order-exists',
    undefined,
    'anew',
  ],
  [
    'a line’s id a second time',
    (w) => w.put(w.technician, 'order-drafts', w.draft({ id: w.ids.draftLineId })),
    409,
    'order-exists',
  ],
  [
    'a line named twice in a draft',
    (w) => {
      const line = { id: v7(), supplierPackId: w.house.soldConcentrate, count: 1 };
      return w.put(w.technician, 'order-drafts', { ...w.draft(), lines: [line, line] });
    },
    400,
    'invalid',
    'content.lines.1.id',
  ],
];
