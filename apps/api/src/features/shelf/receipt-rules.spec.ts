import {
  expiryOf,
  overDelivered,
  receiptComplaints,
  sumBy,
  type Known,
  type ReceivedLine,
} from './receipt-rules.js';

const line = (more: Partial<ReceivedLine> = {}): ReceivedLine => ({
  packId: 'fixer',
  lotId: 'new',
  lotNumber: '0611',
  expiresOn: null,
  count: 1,
  ...more,
});
const known: Known = {
  packs: new Map([
    ['fixer', {}],
    ['stop', {}],
  ]),
  lots: new Map([['here', { packId: 'fixer', lotNumber: '0512', expiresOn: '2027-05-12' }]]),
  orderLines: new Map([['ol', { packId: 'fixer', count: 3, received: 1, cancelled: 0 }]]),
};
const fields = (...lines: ReceivedLine[]) => receiptComplaints(lines, known).map(({ field }) => field);

describe('what a receipt may say', () => {
  it('takes new lots, known lots and lines of the order', () => {
    const again = line({ lotId: 'here', lotNumber: '0512' });
    expect(
      fields(line(), line(), again, { ...again, expiresOn: '2027-05-12' }, line({ orderLineId: 'ol' })),
    ).toEqual([]);
  });

  it('names what does not fit', () => {
    expect(fields(line({ packId: 'nothing' }))).toEqual(['content.lines.0.packId']);
    expect(fields(line({ packId: 'stop', lotId: 'here', lotNumber: '0512' }))).toEqual([
      'content.lines.0.lotId',
    ]);
    expect(fields(line(), line({ packId: 'stop' }))).toEqual(['content.lines.1.lotId']);
    expect(fields(line({ lotId: 'here' }))).toEqual(['content.lines.0.lotNumber']);
    expect(fields(line({ lotId: 'here', lotNumber: '0512', expiresOn: '2028-01-01' }))).toEqual([
      'content.lines.0.expiresOn',
    ]);
    expect(fields(line({ packId: 'stop', lotId: 'x', orderLineId: 'ol' }))).toEqual([
      'content.lines.0.orderLineId',
    ]);
    expect(fields(line({ orderLineId: 'none' }))).toEqual(['content.lines.0.orderLineId']);
  });
});

it('finds the line with which more came than is open', () => {
  const lines = [
    line({ orderLineId: 'ol' }),
    line({ orderLineId: 'ol', lotId: 'b' }),
    line({ orderLineId: 'ol', lotId: 'c' }),
    line({ count: 9 }),
  ];
  expect(overDelivered(lines, known.orderLines)).toEqual([2]);
});

it('adds up by key', () => {
  expect([...sumBy([line({ count: 2 }), line({ count: 3 })], (one) => one.lotId)]).toEqual([['new', 5]]);
  expect(sumBy([line()], (one) => one.orderLineId).size).toBe(0);
});

describe('the expiry of a lot', () => {
  it('is the date that is printed on it', () => {
    expect(expiryOf('2027-01-12', '2026-12-01', 24)).toEqual({
      expiresOn: '2027-01-12',
      expiryIsGuess: false,
    });
  });

  it('is guessed by the calendar where none is printed, to the end of a shorter month', () => {
    expect(expiryOf(null, '2026-08-31', 18)).toEqual({ expiresOn: '2028-02-29', expiryIsGuess: true });
  });

  it('is not known where nobody knows how long it keeps', () => {
    expect(expiryOf(null, '2026-08-31', null)).toEqual({ expiresOn: null, expiryIsGuess: false });
  });
});
