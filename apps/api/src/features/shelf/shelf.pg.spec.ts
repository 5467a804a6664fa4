import { v7 } from 'uuid';
import type { TestApp } from '../../testing/test-app.js';
import { startWithShelf, StockHouse, told } from '../../testing/stock-house.js';

let t: TestApp;
let house: StockHouse;
let houses = 0;

beforeAll(async () => {
  t = await startWithShelf();
});
afterAll(() => t.close());
beforeEach(async () => {
  houses += 1;
  house = await StockHouse.open(t, `cellar-${houses}`);
});
afterEach(async () => {
  expect(await house.complaints()).toEqual([]);
});

interface Opened {
  id: string;
  partName: string;
  leftUl: number | null;
  leftMg: number | null;
}
const openedOf = (pack: unknown): Opened[] =>
  (pack as { lots: { opened: Opened[] }[] }).lots.flatMap((lot) => lot.opened);

describe('a receipt', () => {
  it('puts a new lot on the shelf, once, with a guessed expiry where none is printed', async () => {
    const id = v7();
    const line = { packId: house.concentrate, lotId: v7(), lotNumber: '0611', expiresOn: null, count: 2 };
    const content = { happenedAt: t.clock.nowIso(), lines: [line] };
    const first = await house.act(house.technician, 'receipts', content, id).expect(201);
    const again = await house.act(house.technician, 'receipts', content, id).expect(200);
    expect(again.body.action).toEqual(first.body.action);
    expect(await house.pack(house.concentrate)).toMatchObject({
      unopened: 2,
      onOrder: 0,
      advice: { due: false },
      lots: [{ id: line.lotId, lotNumber: '0611', expiryIsGuess: true, unopened: 2, opened: [] }],
      soldBy: [{ supplierPackId: house.soldConcentrate, priceMinor: 1150, currency: 'EUR' }],
    });
    const other = { ...content, lines: [{ ...line, count: 3 }] };
    const { body } = await house.act(house.technician, 'receipts', other, id).expect(409);
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
    const { body } = await house.act(house.technician, 'receipts', { lines: [line] }).expect(400);
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
    const { body } = await house.void(actionId).expect(409);
    expect(body.code).toBe('already-voided');
  });

  it('stays when a bottle was mixed from it', async () => {
    const { actionId, lotId } = await house.receive(house.concentrate, 2);
    const mixId = v7();
    const mixed = await house.mix({ kind: 'lot', lotId }, 1_000_000, mixId).expect(201);
    const { body } = await house.void(actionId).expect(409);
    expect(body).toMatchObject({
      code: 'leans-on-it',
      detail: `Fewer of lot 0611 are left unopened than came: ${mixed.body.bottle.code} was mixed from it.`,
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
    const { body } = await house.mix({ kind: 'lot', lotId }, 1_000_000).expect(201);
    expect(body.bottle).toMatchObject({ costMinor: 333, currency: 'EUR' });
    const pack = await house.pack(house.kit);
    expect(pack).toMatchObject({ unopened: 1 });
    // A third of 500 mL and of 100 g.
    expect(openedOf(pack)).toEqual(
      expect.arrayContaining([
        expect.objectContaining({ partName: 'part A', leftUl: 500_000 - 166_667, leftMg: null }),
        expect.objectContaining({ partName: 'part B', leftUl: null, leftMg: 100_000 - 33_334 }),
      ]),
    );
  });

  it('draws from what is opened until too little is left', async () => {
    const { lotId } = await house.receive(house.kit, 1);
    await house.mix({ kind: 'lot', lotId }, 1_000_000).expect(201);
    const openedPackIds = openedOf(await house.pack(house.kit)).map(({ id }) => id);
    await house.mix({ kind: 'opened', openedPackIds }, 1_900_000).expect(201);
    const { body } = await house.mix({ kind: 'opened', openedPackIds }, 1_000_000).expect(422);
    expect(body.code).toBe('opened-too-little');
    const one = openedPackIds.slice(0, 1);
    await house.mix({ kind: 'opened', openedPackIds: one }, 50_000).expect(400);
    expect(await house.pack(house.kit)).toMatchObject({ unopened: 0 });
  });

  it('leaves nothing of a pack that is used whole, and takes a powder no other way', async () => {
    const { lotId } = await house.receive(house.powder, 1);
    const half = await house.mix({ kind: 'lot', lotId }, 500_000).expect(422);
    expect(half.body.code).toBe('whole-only');
    const more = await house.mix({ kind: 'lot', lotId }, 1_500_000).expect(422);
    expect(more.body.code).toBe('more-than-pack-makes');
    await house.mix({ kind: 'lot', lotId }, 1_000_000).expect(201);
    expect(await house.pack(house.powder)).toMatchObject({ unopened: 0, lots: [] });
  });

  it('gives the last pack of a lot to one of two who take it at once', async () => {
    const { lotId } = await house.receive(house.concentrate, 1);
    const both = await Promise.all([1, 2].map(() => house.mix({ kind: 'lot', lotId }, 1_000_000)));
    expect(both.map(({ status }) => status).sort()).toEqual([201, 422]);
    expect(both.find(({ status }) => status === 422)?.body.code).toBe('lot-empty');
    expect(await house.pack(house.concentrate)).toMatchObject({ unopened: 0 });
  });

  it('raises the warning when two lots of one pack lose one each at once', async () => {
    const first = await house.receive(house.concentrate, 2);
    const second = await house.receive(house.concentrate, 1, { lotNumber: '0712' });
    const both = await Promise.all(
      [first, second].map(({ lotId }) => house.mix({ kind: 'lot', lotId }, 1_000_000)),
    );
    expect(both.map(({ status }) => status)).toEqual([201, 201]);
    const { body } = await house.technician.get(house.url('needs-you')).expect(200);
    const open: { kind: string; pack?: { id: string } }[] = body.open;
    expect(open.filter(({ pack }) => pack?.id === house.concentrate)).toMatchObject([
      { kind: 'reorder-point' },
    ]);
  });

  it('is taken back in the order in which it leans', async () => {
    const { lotId } = await house.receive(house.concentrate, 1);
    const [opening, drawing] = [v7(), v7()];
    await house.mix({ kind: 'lot', lotId }, 1_000_000, opening).expect(201);
    const openedPackIds = openedOf(await house.pack(house.concentrate)).map(({ id }) => id);
    const second = await house.mix({ kind: 'opened', openedPackIds }, 1_000_000, drawing).expect(201);
    const { body } = await house.void(opening).expect(409);
    expect(body).toMatchObject({
      code: 'leans-on-it',
      detail: expect.stringContaining(second.body.bottle.code),
    });
    await house.void(drawing).expect(201);
    expect(openedOf(await house.pack(house.concentrate))).toMatchObject([{ leftUl: 800_000 }]);
    await house.void(opening).expect(201);
    expect(await house.pack(house.concentrate)).toMatchObject({ unopened: 1, lots: [{ opened: [] }] });
    await house.mix({ kind: 'opened', openedPackIds }, 1_000_000).expect(400);
  });
});
