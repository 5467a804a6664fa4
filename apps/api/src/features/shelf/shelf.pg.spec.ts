import { v7 } from 'uuid';
import { TestApp } from '../../testing/test-app.js';
import { StockHouse, told } from '../../testing/stock-house.js';
import type { PackView } from './shelf.view.js';

let t: TestApp;
let house: StockHouse;
let houses = 0;

beforeAll(async () => {
  t = await TestApp.start();
});
afterAll(() => t.close());
beforeEach(async () => {
  houses += 1;
  house = await StockHouse.open(t, `cellar-${houses}`);
});
afterEach(async () => {
  expect(await house.complaints()).toEqual([]);
});

const openedOf = (pack: PackView) => pack.lots.flatMap((lot) => lot.opened);

describe('a receipt', () => {
  it('puts a new lot on the shelf, once, with a guessed expiry where none is printed', async () => {
    const id = v7();
    const line = { packId: house.concentrate, lotId: v7(), lotNumber: '0611', expiresOn: null, count: 2 };
    const content = { happenedAt: t.clock.nowIso(), lines: [line] };
    const first = await house.act(house.technician, 'receipts', content, id).expect(201);
    const again = await house.act(house.technician, 'receipts', content, id).expect(200);
    expect(told('receipt', again).action).toEqual(told('receipt', first).action);
    expect(await house.pack(house.concentrate)).toMatchObject({
      unopened: 2,
      onOrder: 0,
      advice: { due: false },
      lots: [{ id: line.lotId, lotNumber: '0611', expiryIsGuess: true, unopened: 2, opened: [] }],
      soldBy: [{ supplierPackId: house.soldConcentrate, priceMinor: 1150, currency: 'EUR' }],
    });
    const other = { ...content, lines: [{ ...line, count: 3 }] };
    const body = await house.refused(house.act(house.technician, 'receipts', other, id), 409);
    expect(body.code).toBe('action-differs');
  });

  it('adds to a lot that is here and names what does not fit', async () => {
    const { lotId } = await house.receive(house.concentrate, 1);
    await house.receive(house.concentrate, 2, { lotId });
    expect(await house.pack(house.concentrate)).toMatchObject({
      unopened: 3,
      lots: [{ id: lotId, unopened: 3 }],
    });
    const line = { packId: house.kit, lotId, lotNumber: '0611', expiresOn: null, count: 1 };
    const body = await house.refused(house.act(house.technician, 'receipts', { lines: [line] }), 400);
    expect(body.errors).toEqual([
      { field: 'content.lines.0.lotId', message: 'That lot is of another pack.' },
    ]);
  });

  it('is taken back while all of it is there', async () => {
    const { actionId } = await house.receive(house.concentrate, 2);
    await house.void(actionId).expect(201);
    expect(await house.pack(house.concentrate)).toMatchObject({
      unopened: 0,
      lots: [],
      advice: { due: true, quantity: 2 },
    });
    const body = await house.refused(house.void(actionId), 409);
    expect(body.code).toBe('already-voided');
  });

  it('stays when a bottle was mixed from it', async () => {
    const { actionId, lotId } = await house.receive(house.concentrate, 2);
    const mixId = v7();
    const mixed = await house.mix({ kind: 'lot', lotId }, 1_000_000, mixId).expect(201);
    const body = await house.refused(house.void(actionId), 409);
    expect(body).toMatchObject({
      code: 'leans-on-it',
      detail: `Fewer of lot 0611 are left unopened than came: ${told('mix', mixed).bottle.code} was mixed from it.`,
    });
    await house.void(mixId).expect(201);
    await house.void(actionId).expect(201);
  });

  it('takes a technician of this darkroom', async () => {
    const other = await StockHouse.open(t, `attic-${houses}`);
    const line = { packId: house.concentrate, lotId: v7(), lotNumber: '1', expiresOn: null, count: 1 };
    await house.act(other.technician, 'receipts', { lines: [line] }).expect(404);
    await house.act(await house.member(`Mo ${houses}`), 'receipts', { lines: [line] }).expect(403);
    await other.act(other.technician, 'receipts', { lines: [line] }).expect(400);
    expect(await house.pack(house.concentrate)).toMatchObject({ unopened: 0 });
  });
});

describe('mixing from the shelf', () => {
  it('opens a pack and keeps the rest of every part, rounded up once', async () => {
    const { lotId } = await house.receive(house.kit, 2, { priceMinor: 1000 });
    const mixed = await house.mix({ kind: 'lot', lotId }, 1_000_000).expect(201);
    expect(told('mix', mixed).bottle).toMatchObject({ costMinor: 333, currency: 'EUR' });
    const pack = await house.pack(house.kit);
    expect(pack).toMatchObject({ unopened: 1 });
    // A third of 500 mL and of 100 g.
    const left = openedOf(pack).map(({ partName, leftUl, leftMg }) => [partName, leftUl, leftMg]);
    expect(left.sort()).toEqual([
      ['part A', 500_000 - 166_667, null],
      ['part B', null, 100_000 - 33_334],
    ]);
  });

  it('draws from what is opened until too little is left', async () => {
    const { lotId } = await house.receive(house.kit, 1);
    await house.mix({ kind: 'lot', lotId }, 1_000_000).expect(201);
    const openedPackIds = openedOf(await house.pack(house.kit)).map(({ id }) => id);
    await house.mix({ kind: 'opened', openedPackIds }, 1_900_000).expect(201);
    const body = await house.refused(house.mix({ kind: 'opened', openedPackIds }, 1_000_000), 422);
    expect(body.code).toBe('opened-too-little');
    const one = openedPackIds.slice(0, 1);
    await house.mix({ kind: 'opened', openedPackIds: one }, 50_000).expect(400);
    expect(await house.pack(house.kit)).toMatchObject({ unopened: 0 });
  });

  it('leaves nothing of a pack that is used whole, and takes a powder no other way', async () => {
    const { lotId } = await house.receive(house.powder, 1);
    const half = await house.refused(house.mix({ kind: 'lot', lotId }, 500_000), 422);
    expect(half.code).toBe('whole-only');
    const more = await house.refused(house.mix({ kind: 'lot', lotId }, 1_500_000), 422);
    expect(more.code).toBe('more-than-pack-makes');
    await house.mix({ kind: 'lot', lotId }, 1_000_000).expect(201);
    expect(await house.pack(house.powder)).toMatchObject({ unopened: 0, lots: [] });
  });

  it('gives the last pack of a lot to one of two who take it at once', async () => {
    const { lotId } = await house.receive(house.concentrate, 1);
    const both = await Promise.all([1, 2].map(() => house.mix({ kind: 'lot', lotId }, 1_000_000)));
    expect(both.map(({ status }) => status).sort()).toEqual([201, 422]);
    const codes = both.flatMap((answer) => (answer.status === 422 ? [told('problem', answer).code] : []));
    expect(codes).toEqual(['lot-empty']);
    expect(await house.pack(house.concentrate)).toMatchObject({ unopened: 0 });
  });

  it('raises the warning when two lots of one pack lose one each at once', async () => {
    const first = await house.receive(house.concentrate, 2);
    const second = await house.receive(house.concentrate, 1, { lotNumber: '0712' });
    const both = await Promise.all(
      [first, second].map(({ lotId }) => house.mix({ kind: 'lot', lotId }, 1_000_000)),
    );
    expect(both.map(({ status }) => status)).toEqual([201, 201]);
    expect(await house.warnings(house.concentrate)).toMatchObject([{ kind: 'reorder-point' }]);
  });

  it('is taken back in the order in which it leans', async () => {
    const { lotId } = await house.receive(house.concentrate, 1);
    const [opening, drawing] = [v7(), v7()];
    await house.mix({ kind: 'lot', lotId }, 1_000_000, opening).expect(201);
    const openedPackIds = openedOf(await house.pack(house.concentrate)).map(({ id }) => id);
    const second = await house.mix({ kind: 'opened', openedPackIds }, 1_000_000, drawing).expect(201);
    const body = await house.refused(house.void(opening), 409);
    expect(body.code).toBe('leans-on-it');
    expect(body.detail).toContain(told('mix', second).bottle.code);
    await house.void(drawing).expect(201);
    expect(openedOf(await house.pack(house.concentrate))).toMatchObject([{ leftUl: 800_000 }]);
    await house.void(opening).expect(201);
    expect(await house.pack(house.concentrate)).toMatchObject({ unopened: 1, lots: [{ opened: [] }] });
    await house.mix({ kind: 'opened', openedPackIds }, 1_000_000).expect(400);
  });
});
