import { v7 } from 'uuid';
import { allCame, came, cancel, drafted, send } from './draft-steps.js';
import type { Row } from './table.js';

const receiving: Row[] = [
  ['what was ordered', drafted(came(2), [send(1)]), 201],
  [
    'one more than was ordered',
    drafted(came(3), [send(1)]),
    422,
    'more-than-ordered',
    'content.lines.0.count',
    'say that it is right',
  ],
  ['one more than was ordered, which is right', drafted(came(3, { overDeliveryOk: true }), [send(1)]), 201],
  [
    'one more than is still to come',
    drafted(came(2), [send(1), came(1)]),
    422,
    'more-than-ordered',
    'content.lines.0.count',
  ],
  [
    'the order in two boxes, too many together',
    drafted(
      (w, draft) => {
        const box = () => w.receiptLine({ orderLineId: draft.concentrate, count: 2 });
        return w.put(w.technician, 'receipts', { orderId: draft.orderId, lines: [box(), box()] });
      },
      [send(1)],
    ),
    422,
    'more-than-ordered',
    'content.lines.1.count',
  ],
  ['something of a draft', drafted(came(1)), 422, 'order-not-open', undefined, 'without the order'],
  ['something of a cancelled order', drafted(came(1), [send(1), cancel]), 422, 'order-not-open'],
  ['something of an order that has all come', drafted(came(1), [send(1), allCame]), 422, 'order-not-open'],
  [
    'the same, though it is right',
    drafted(came(1, { overDeliveryOk: true }), [send(1), allCame]),
    422,
    'order-not-open',
  ],
  [
    'another pack than the line’s',
    drafted(came(1, {}, { packId: '' }), [send(1)]),
    400,
    'invalid',
    'content.lines.0.packId',
  ],
  [
    'a kit on the line of the concentrate',
    drafted(
      (w, { orderId, concentrate }) =>
        w.put(w.technician, 'receipts', {
          orderId,
          lines: [w.receiptLine({ packId: w.house.kit, orderLineId: concentrate })],
        }),
      [send(1)],
    ),
    400,
    'invalid',
    'content.lines.0.orderLineId',
    'another pack',
  ],
  [
    'a line of an order without the order',
    drafted(
      (w, { concentrate }) => w.put(w.technician, 'receipts', w.receipt({ orderLineId: concentrate })),
      [send(1)],
    ),
    400,
    'invalid',
    'content.lines.0.orderLineId',
  ],
  [
    'a price in a currency of its own',
    drafted(came(1, {}, { priceMinor: 1, currency: 'USD' }), [send(1)]),
    400,
    'invalid',
    'content.lines.0.currency',
    'leave it out',
  ],
  [
    'a price below nothing',
    drafted(came(1, {}, { priceMinor: -1 }), [send(1)]),
    400,
    'invalid',
    'content.lines.0.priceMinor',
  ],
  [
    'a lot that is of another pack',
    (w) =>
      w.put(
        w.technician,
        'receipts',
        w.receipt({ packId: w.house.kit, lotId: w.ids.lotId, lotNumber: '0611' }),
      ),
    400,
    'invalid',
    'content.lines.0.lotId',
    'another pack',
  ],
  [
    'a lot under another number',
    (w) => w.put(w.technician, 'receipts', w.receipt({ lotId: w.ids.lotId, lotNumber: '0612' })),
    400,
    'invalid',
    'content.lines.0.lotNumber',
    '0611',
  ],
  [
    'a lot with another date',
    (w) =>
      w.put(
        w.technician,
        'receipts',
        w.receipt({ lotId: w.ids.lotId, lotNumber: '0611', expiresOn: '2029-01-13' }),
      ),
    400,
    'invalid',
    'content.lines.0.expiresOn',
    'of its own',
  ],
  [
    'more of a lot that is here, its id in capitals',
    (w) =>
      w.put(w.technician, 'receipts', w.receipt({ lotId: w.ids.lotId.toUpperCase(), lotNumber: '0611' })),
    201,
  ],
  [
    'a new lot on two lines, one in capitals',
    (w) => {
      const lotId = v7();
      return w.put(w.technician, 'receipts', {
        lines: [w.receiptLine({ lotId }), w.receiptLine({ lotId: lotId.toUpperCase() })],
      });
    },
    201,
  ],
];

export const receivingRows = receiving.map(([what, ...rest]): Row => [`receiving ${what}`, ...rest]);
