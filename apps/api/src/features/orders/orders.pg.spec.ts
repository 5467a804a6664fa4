import { mails } from '@wetside/db';
import { startMailCatcher, type CaughtMail, type MailCatcher } from '@wetside/mail-catcher';
import { eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import type { TestApp } from '../../testing/test-app.js';
import { startWithShelf, StockHouse, told } from '../../testing/stock-house.js';

let t: TestApp;
let catcher: MailCatcher;
let house: StockHouse;
let houses = 0;

beforeAll(async () => {
  catcher = await startMailCatcher({ smtpPort: 0, httpPort: 0 });
  t = await startWithShelf({ SMTP_URL: `smtp://127.0.0.1:${catcher.smtpPort}` });
});
afterAll(async () => {
  await t.close();
  await catcher.close();
});
beforeEach(async () => {
  houses += 1;
  house = await StockHouse.open(t, `office-${houses}`);
  await catcher.clear();
});

/** Waits until that many mails with this subject have come; the test's own time limit ends the wait. */
async function caught(subject: string, count: number): Promise<CaughtMail[]> {
  for (;;) {
    const found = catcher.messages({ subject });
    if (found.length >= count) return found;
    await new Promise((resolve) => setImmediate(resolve));
  }
}

const lines = { concentrate: '', kit: '' };

async function draft(count = 2): Promise<string> {
  const orderId = v7();
  lines.concentrate = v7();
  lines.kit = v7();
  const asked = [
    { id: lines.concentrate, supplierPackId: house.soldConcentrate, count },
    { id: lines.kit, supplierPackId: house.soldKit, count: 1 },
  ];
  await house
    .act(house.technician, 'order-drafts', { orderId, supplierId: house.supplier, lines: asked })
    .expect(201);
  return orderId;
}

const send = (orderId: string, revision = 1, actionId = v7()) =>
  house.act(house.manager, 'order-sendings', { orderId, revision }, actionId);

async function sent(count = 2): Promise<string> {
  const orderId = await draft(count);
  await send(orderId).expect(201);
  return orderId;
}

const came = (orderId: string, count: number, more: object = {}, actionId = v7()) => {
  const lot = { lotId: v7(), lotNumber: '0611', expiresOn: null };
  const line = { packId: house.concentrate, orderLineId: lines.concentrate, ...lot, count };
  return house.act(house.technician, 'receipts', { orderId, lines: [line], ...more }, actionId);
};

const order = async (id: string) => (await house.technician.get(house.url(`orders/${id}`)).expect(200)).body;

describe('a draft', () => {
  it('has the next number, the prices of its day and a mail to look at', async () => {
    const first = await draft();
    const second = await draft();
    const { order: view, mailText } = await order(first);
    expect(view).toMatchObject({
      numberText: '0001',
      state: 'draft',
      revision: 1,
      totalMinor: 8400,
      currency: 'EUR',
      mail: null,
    });
    expect(view.lines).toMatchObject([
      {
        id: expect.any(String),
        packName: 'Fixer concentrate 1 L',
        supplierName: 'Fix-1000',
        count: 2,
        priceMinor: 1150,
      },
      { packName: 'Fixer kit 5 L', count: 1, priceMinor: 6100 },
    ]);
    expect(mailText).toContain('2 x Fix-1000 (we call it Fixer concentrate 1 L; EUR 11.50 each)');
    expect((await order(second)).order.numberText).toBe('0002');
    const { body } = await house.technician.get(house.url('orders?state=draft')).expect(200);
    expect(body.orders.map((one: { number: number }) => one.number)).toEqual([2, 1]);
    expect(await house.pack(house.concentrate)).toMatchObject({ onOrder: 0 });
  });

  it('is changed by whoever saw it last', async () => {
    const orderId = await draft();
    const change = {
      revision: 1,
      note: 'Ring twice.',
      lines: [{ id: lines.kit, supplierPackId: house.soldKit, count: 0 }],
    };
    const { body } = await house.technician
      .patch(house.url(`orders/${orderId}`))
      .send(change)
      .expect(200);
    expect(body.order).toMatchObject({
      revision: 2,
      note: 'Ring twice.',
      totalMinor: 2300,
      lines: [{ count: 2 }, { count: 0 }],
    });
    const late = await house.manager
      .patch(house.url(`orders/${orderId}`))
      .send({ ...change, note: 'Late.' })
      .expect(409);
    expect(late.body.code).toBe('order-changed');
    expect((await send(orderId, 1).expect(409)).body.code).toBe('order-changed');
    const again = { revision: 2, lines: [{ id: v7(), supplierPackId: house.soldKit, count: 3 }] };
    const back = await house.technician
      .patch(house.url(`orders/${orderId}`))
      .send(again)
      .expect(200);
    expect(back.body.order).toMatchObject({ revision: 3, totalMinor: 2300 + 18_300 });
  });

  it('names a line that its supplier does not sell', async () => {
    const asked = [{ id: v7(), supplierPackId: v7(), count: 1 }];
    const content = { orderId: v7(), supplierId: house.supplier, lines: asked };
    const { body } = await house.act(house.technician, 'order-drafts', content).expect(400);
    expect(body.errors[0].field).toBe('content.lines.0.supplierPackId');
  });

  it('does not take a line of another order', async () => {
    await draft();
    const stolen = { id: lines.kit, supplierPackId: house.soldKit, count: 1 };
    const content = { orderId: v7(), supplierId: house.supplier, lines: [stolen] };
    expect((await house.act(house.technician, 'order-drafts', content).expect(409)).body.code).toBe(
      'order-exists',
    );
    const orderId = await draft();
    const other = await house.technician.get(house.url('orders')).expect(200);
    expect(other.body.orders).toHaveLength(2);
    const change = { revision: 1, lines: [{ ...stolen, supplierPackId: house.soldConcentrate }] };
    await house.technician
      .patch(house.url(`orders/${orderId}`))
      .send(change)
      .expect(400);
  });

  it('is taken back until it goes out', async () => {
    const [actionId, orderId] = [v7(), v7()];
    const content = {
      orderId,
      supplierId: house.supplier,
      lines: [{ id: v7(), supplierPackId: house.soldKit, count: 1 }],
    };
    await house.act(house.technician, 'order-drafts', content, actionId).expect(201);
    await house.void(actionId).expect(201);
    expect((await order(orderId)).order).toMatchObject({ state: 'cancelled', lines: [{ cancelled: 1 }] });
    expect((await send(orderId, 2).expect(422)).body.code).toBe('order-not-draft');
  });
});

describe('an order that goes out', () => {
  it('takes a manager, mails the supplier once and is on order', async () => {
    const orderId = await draft();
    await house.act(house.technician, 'order-sendings', { orderId, revision: 1 }).expect(403);
    const [actionId, content] = [v7(), { orderId, revision: 1, happenedAt: t.clock.nowIso() }];
    const { body } = await house.act(house.manager, 'order-sendings', content, actionId).expect(201);
    expect(body.order).toMatchObject({
      state: 'sent',
      sentBy: `Ines office-${houses}`,
      mail: { state: 'waiting' },
    });
    await house.act(house.manager, 'order-sendings', content, actionId).expect(200);
    const [mail] = await caught('Order 0001', 1);
    expect(mail).toMatchObject({
      to: ['orders@bromide-street.example'],
      subject: `Order 0001 from The office-${houses} darkroom`,
      text: expect.stringContaining(
        `Please answer to Ines office-${houses}, ines.office-${houses}@darkroom.example`,
      ),
    });
    expect(mail?.headers['reply-to']).toBe(`ines.office-${houses}@darkroom.example`);
    const kept = await t.database.inDarkroom({ darkroomId: house.id }, (tx) =>
      tx.select().from(mails).where(eq(mails.orderId, orderId)),
    );
    expect(kept).toMatchObject([{ dedupeKey: `order:${orderId}`, messageId: mail?.messageId }]);
    expect((await order(orderId)).mailText).toBe(kept[0]?.body);
    expect(await house.pack(house.concentrate)).toMatchObject({ onOrder: 2, advice: { due: false } });
  });

  it('cannot be taken back, only cancelled', async () => {
    const orderId = await draft();
    const actionId = v7();
    await send(orderId, 1, actionId).expect(201);
    const { body } = await house.void(actionId, house.manager).expect(422);
    expect(body).toMatchObject({
      code: 'cannot-be-voided',
      detail: 'The order has gone out. Cancel it instead.',
    });
  });

  it('ends the warning of a short shelf, and cancelling brings it back', async () => {
    const open = async () => {
      const { body } = await house.manager.get(house.url('needs-you')).expect(200);
      return body.open.filter((row: { pack?: { id: string } }) => row.pack?.id === house.concentrate);
    };
    const { actionId } = await house.receive(house.concentrate, 1);
    const short = await open();
    expect(short).toMatchObject([{ kind: 'reorder-point' }]);
    const orderId = await sent();
    expect(await open()).toEqual([]);
    await house
      .act(house.manager, 'order-cancellations', { orderId, reason: 'bought next door' })
      .expect(201);
    expect(await open()).toMatchObject([{ eventId: short[0].eventId }]);
    await house.void(actionId).expect(201);
  });
});

describe('what comes of an order', () => {
  it('is counted line by line until all of it is here', async () => {
    const orderId = await sent();
    const first = await came(orderId, 1).expect(201);
    expect(first.body.order).toMatchObject({ state: 'sent', lines: [{ received: 1 }, { received: 0 }] });
    expect(await house.pack(house.concentrate)).toMatchObject({ unopened: 1, onOrder: 1 });
    const over = await came(orderId, 2).expect(422);
    expect(over.body).toMatchObject({
      code: 'more-than-ordered',
      errors: [{ field: 'content.lines.0.count' }],
    });
    await came(orderId, 2, { overDeliveryOk: true }).expect(201);
    const kit = {
      packId: house.kit,
      orderLineId: lines.kit,
      lotId: v7(),
      lotNumber: 'K1',
      expiresOn: null,
      count: 1,
    };
    const actionId = v7();
    const last = await house
      .act(house.technician, 'receipts', { orderId, lines: [kit] }, actionId)
      .expect(201);
    expect(last.body.order).toMatchObject({ state: 'received' });
    expect((await came(orderId, 1).expect(422)).body.code).toBe('order-not-open');
    await house.void(actionId).expect(201);
    expect((await order(orderId)).order).toMatchObject({
      state: 'sent',
      lines: [{ received: 3 }, { received: 0 }],
    });
    expect(await house.pack(house.kit)).toMatchObject({ unopened: 0, onOrder: 1 });
    expect(await house.complaints()).toEqual([]);
  });

  it('is counted once when two receive it at once', async () => {
    const orderId = await sent();
    const both = await Promise.all([came(orderId, 2), came(orderId, 2)]);
    expect(both.map(({ status }) => status).sort()).toEqual([201, 422]);
    expect((await order(orderId)).order.lines[0].received).toBe(2);
  });

  it('leaves a rest that can be cancelled, and the supplier is told', async () => {
    const orderId = await sent(3);
    await came(orderId, 1).expect(201);
    const cancel = { orderId, reason: 'bought next door' };
    await house.act(house.technician, 'order-cancellations', cancel).expect(403);
    const { body } = await house.act(house.manager, 'order-cancellations', cancel).expect(201);
    expect(body.order).toMatchObject({
      state: 'received',
      lines: [{ received: 1, cancelled: 2 }, { cancelled: 1 }],
    });
    const [mail] = await caught('cancelled', 1);
    expect(mail?.text).toContain('Please do not send:\n\n  2 x Fix-1000\n  1 x Fix kit');
    expect(await house.pack(house.concentrate)).toMatchObject({ unopened: 1, onOrder: 0 });
    const again = await house.act(house.manager, 'order-cancellations', cancel).expect(422);
    expect(again.body.code).toBe('order-closed');
  });
});

it('keeps the orders of another darkroom out of sight', async () => {
  const orderId = await draft();
  const other = await StockHouse.open(t, `loft-${houses}`);
  await other.technician.get(other.url(`orders/${orderId}`)).expect(404);
  await other.technician
    .patch(other.url(`orders/${orderId}`))
    .send({ revision: 1, lines: [] })
    .expect(404);
  for (const what of ['order-sendings', 'order-cancellations']) {
    const content = what === 'order-sendings' ? { orderId, revision: 1 } : { orderId, reason: 'not ours' };
    await other.act(other.manager, what, content).expect(404);
  }
  const stolen = {
    orderId: v7(),
    supplierId: house.supplier,
    lines: [{ id: v7(), supplierPackId: house.soldKit, count: 1 }],
  };
  await other.act(other.technician, 'order-drafts', stolen).expect(404);
  expect((await order(orderId)).order).toMatchObject({ state: 'draft', revision: 1 });
});
