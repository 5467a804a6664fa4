import { v7 } from 'uuid';
import { TestApp } from '../../testing/test-app.js';
import { StockHouse, told } from '../../testing/stock-house.js';

let t: TestApp;
let house: StockHouse;
let houses = 0;

beforeAll(async () => {
  t = await TestApp.start();
});
afterAll(() => t.close());
beforeEach(async () => {
  houses += 1;
  house = await StockHouse.open(t, `yard-${houses}`);
});

const suppliers = async () =>
  told('suppliers', await house.technician.get(house.url('suppliers')).expect(200)).suppliers;
const outUntil = async () => {
  const packs = (await suppliers()).flatMap((supplier) => supplier.packs);
  return packs.find((pack) => pack.supplierPackId === house.soldKit)?.outUntil;
};

const change = (value: string | null, actionId = v7(), browser = house.technician) =>
  house.act(
    browser,
    'setting-changes',
    { subject: 'supplier-pack', subjectId: house.soldKit, changes: [{ field: 'outUntil', value }] },
    actionId,
  );

it('lists the suppliers with what they sell', async () => {
  expect(await suppliers()).toMatchObject([
    {
      name: 'Bromide Street Supplies',
      currency: 'EUR',
      packs: [{ supplierName: 'Fix-1000' }, { packId: house.kit, priceMinor: 6100 }],
    },
  ]);
});

it('says until when a pack is sold out, and sets it back', async () => {
  const [first, second] = [v7(), v7()];
  await change('2027-01-12', first).expect(201);
  expect(await outUntil()).toBe('2027-01-12');
  await change('2027-02-01', second).expect(201);
  expect((await house.refused(house.void(first), 409)).code).toBe('leans-on-it');
  await house.void(second).expect(201);
  expect(await outUntil()).toBe('2027-01-12');
  await house.void(first).expect(201);
  expect(await outUntil()).toBeNull();
  expect((await house.refused(house.void(first), 409)).code).toBe('already-voided');
});

it('takes a date of the calendar from a technician of this darkroom', async () => {
  expect((await house.refused(change('2027-02-30'), 400)).errors?.[0]?.field).toBe('content.changes.0.value');
  const other = await StockHouse.open(t, `shed-${houses}`);
  await change('2027-01-12', v7(), other.technician).expect(404);
  await change('2027-01-12', v7(), await house.member(`Mo ${houses}`)).expect(403);
  const content = {
    subject: 'supplier-pack',
    subjectId: house.soldKit,
    changes: [{ field: 'outUntil', value: null }],
  };
  await other.act(other.technician, 'setting-changes', content).expect(404);
  expect(await outUntil()).toBeNull();
});
