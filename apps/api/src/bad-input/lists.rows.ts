import { v7 } from 'uuid';
import type { Row } from './table.js';

/** How many may stand in a list, and which figures go together. */
export const listRows: Row[] = [
  [
    'a load: eight films of 99 are the most',
    (w) => w.put(w.member, 'loads', w.load({ film: Array.from({ length: 8 }, () => w.film({ count: 99 })) })),
    201,
  ],
  [
    'a load: nine films are too many',
    (w) => w.put(w.member, 'loads', w.load({ film: Array.from({ length: 9 }, () => w.film()) })),
    400,
    'invalid',
    'content.film',
    '1 to 8',
  ],
  ['a load: no film', (w) => w.put(w.member, 'loads', w.load({ film: [] })), 400, 'invalid', 'content.film'],
  [
    'a load: no bottle',
    (w) => w.put(w.member, 'loads', w.load({ bottleIds: [] })),
    400,
    'invalid',
    'content.bottleIds',
  ],
  [
    'a load: thirteen bottles',
    (w) => w.put(w.member, 'loads', w.load({ bottleIds: Array.from({ length: 13 }, () => v7()) })),
    400,
    'invalid',
    'content.bottleIds',
  ],
  [
    'a sheet: no size',
    (w) => w.put(w.member, 'loads', w.load({ film: [w.film({ format: 'sheet' })] })),
    422,
    'not-a-format',
  ],
  [
    'a sheet: one side alone',
    (w) => w.put(w.member, 'loads', w.load({ film: [w.film({ format: 'sheet', widthMm: 102 })] })),
    422,
    'not-a-format',
  ],
  [
    'a roll with a size',
    (w) => w.put(w.member, 'loads', w.load({ film: [w.film({ widthMm: 102, heightMm: 127 })] })),
    422,
    'not-a-format',
  ],
  [
    'a draft: forty-one lines',
    (w) =>
      w.put(w.technician, 'order-drafts', {
        ...w.draft(),
        lines: Array.from({ length: 41 }, () => ({ id: v7(), supplierPackId: v7(), count: 1 })),
      }),
    400,
    'invalid',
    'content.lines',
  ],
  [
    'a draft: no line',
    (w) => w.put(w.technician, 'order-drafts', { ...w.draft(), lines: [] }),
    400,
    'invalid',
    'content.lines',
  ],
  [
    'a receipt: no line',
    (w) => w.put(w.technician, 'receipts', { lines: [] }),
    400,
    'invalid',
    'content.lines',
  ],
  [
    'a receipt: forty lines are the most',
    (w) => w.put(w.technician, 'receipts', { lines: Array.from({ length: 40 }, () => w.receiptLine()) }),
    201,
  ],
  [
    'a receipt: forty-one lines',
    (w) => w.put(w.technician, 'receipts', { lines: Array.from({ length: 41 }, () => w.receiptLine()) }),
    400,
    'invalid',
    'content.lines',
  ],
];
