import { v7 } from 'uuid';
import { StockHouse, told } from '../../testing/stock-house.js';
import { TestApp } from '../../testing/test-app.js';

let t: TestApp;
let house: StockHouse;
let houses = 0;

beforeAll(async () => {
  t = await TestApp.start();
});
afterAll(() => t.close());
beforeEach(async () => {
  houses += 1;
  house = await StockHouse.open(t, `desk-${houses}`);
});

const patch = (orderId: string, change: object, browser = house.technician) =>
  browser.patch(house.url(`orders/${orderId}`)).send(change);
const ask = (line: object, more: object = {}) =>
  house.act(house.technician, 'order-drafts', {
    orderId: v7(),
    supplierId: house.supplier,
    lines: [line],
    ...more,
  });

it('has the next number, the prices of its day and a mail to look at', async () => {
  const first = await house.draft();
  const second = await house.draft();
  const { order, mailText } = await house.order(first.orderId);
  expect(order).toMatchObject({
    numberText: '0001',
    state: 'draft',
    revision: 1,
    totalMinor: 8400,
    currency: 'EUR',
    mail: null,
  });
  expect(order.lines).toMatchObject([
    {
      id: first.concentrate,
      packName: 'Fixer concentrate 1 L',
      supplierName: 'Fix-1000',
      count: 2,
      priceMinor: 1150,
    },
    { id: first.kit, packName: 'Fixer kit 5 L', count: 1, priceMinor: 6100 },
  ]);
  expect(mailText).toContain('2 x Fix-1000 (we call it Fixer concentrate 1 L; EUR 11.50 each)');
  const { orders } = told('orders', await house.technician.get(house.url('orders?state=draft')).expect(200));
  expect(orders.map(({ id, numberText }) => [id, numberText])).toEqual([
    [second.orderId, '0002'],
    [first.orderId, '0001'],
  ]);
  expect(await house.pack(house.concentrate)).toMatchObject({ onOrder: 0 });
});

it('is changed by whoever saw it last', async () => {
  const { orderId, kit } = await house.draft();
  const change = {
    revision: 1,
    note: 'Ring twice.',
    lines: [{ id: kit, supplierPackId: house.soldKit, count: 0 }],
  };
  await patch(orderId, change).expect(200);
  const { order } = await house.order(orderId);
  expect(order).toMatchObject({
    revision: 2,
    note: 'Ring twice.',
    totalMinor: 2300,
    lines: [{ count: 2 }, { count: 0 }],
  });
  const late = await house.refused(patch(orderId, { ...change, note: 'Late.' }, house.manager), 409);
  expect(late.code).toBe('order-changed');
  expect((await house.refused(house.send(orderId, 1), 409)).code).toBe('order-changed');
  await patch(orderId, {
    revision: 2,
    lines: [{ id: v7(), supplierPackId: house.soldKit, count: 3 }],
  }).expect(200);
  expect((await house.order(orderId)).order).toMatchObject({
    revision: 3,
    note: 'Ring twice.',
    totalMinor: 2300 + 18_300,
  });
});

it('is changed by one of two who saw the same', async () => {
  const { orderId } = await house.draft();
  const both = await Promise.all(
    ['one', 'two'].map((note) => patch(orderId, { revision: 1, note, lines: [] })),
  );
  expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
});

it('names a line that its supplier does not sell', async () => {
  const { errors } = await house.refused(ask({ id: v7(), supplierPackId: v7(), count: 1 }), 400);
  expect(errors?.[0]?.field).toBe('content.lines.0.supplierPackId');
});

it('does not take a line of another order, nor the id of one', async () => {
  const { orderId, kit } = await house.draft();
  const line = { id: kit, supplierPackId: house.soldKit, count: 1 };
  expect((await house.refused(ask(line), 409)).code).toBe('order-exists');
  expect((await house.refused(ask({ ...line, id: v7() }, { orderId }), 409)).code).toBe('order-exists');
  const other = await house.draft();
  expect(told('orders', await house.technician.get(house.url('orders'))).orders).toHaveLength(2);
  const change = { revision: 1, lines: [{ ...line, id: other.concentrate }] };
  expect((await house.refused(patch(other.orderId, change), 400)).errors?.[0]?.field).toBe(
    'lines.0.supplierPackId',
  );
});

it('is taken back until it goes out', async () => {
  const actionId = v7();
  const { orderId } = await house.draft(2, actionId);
  await house.void(actionId).expect(201);
  expect((await house.order(orderId)).order).toMatchObject({
    state: 'cancelled',
    lines: [{ cancelled: 2 }, { cancelled: 1 }],
  });
  expect((await house.refused(house.send(orderId, 2), 422)).code).toBe('order-not-draft');
  const sent = v7();
  const other = await house.draft(1, sent);
  await house.send(other.orderId).expect(201);
  expect((await house.refused(house.void(sent), 409)).code).toBe('leans-on-it');
});

it('goes out with something on it', async () => {
  const { orderId, concentrate, kit } = await house.draft();
  const lines = [
    { id: concentrate, supplierPackId: house.soldConcentrate, count: 0 },
    { id: kit, supplierPackId: house.soldKit, count: 0 },
  ];
  await patch(orderId, { revision: 1, lines }).expect(200);
  expect((await house.refused(house.send(orderId, 2), 422)).code).toBe('order-empty');
});

it('stays out of the sight of another darkroom', async () => {
  const { orderId } = await house.draft();
  const other = await StockHouse.open(t, `loft-${houses}`);
  await other.technician.get(other.url(`orders/${orderId}`)).expect(404);
  await other.technician
    .patch(other.url(`orders/${orderId}`))
    .send({ revision: 1, lines: [] })
    .expect(404);
  await other.send(orderId).expect(404);
  await other.act(other.manager, 'order-cancellations', { orderId, reason: 'not ours' }).expect(404);
  const stolen = {
    orderId: v7(),
    supplierId: house.supplier,
    lines: [{ id: v7(), supplierPackId: house.soldKit, count: 1 }],
  };
  await other.act(other.technician, 'order-drafts', stolen).expect(404);
  expect((await house.order(orderId)).order).toMatchObject({ state: 'draft', revision: 1 });
});
