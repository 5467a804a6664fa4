import { mails } from '@wetside/db';
import { startMailCatcher, type CaughtMail, type MailCatcher } from '@wetside/mail-catcher';
import { eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import { StockHouse, told, type Draft } from '../../testing/stock-house.js';
import { TestApp } from '../../testing/test-app.js';
import { until } from '../../testing/until.js';

let t: TestApp;
let catcher: MailCatcher;
let house: StockHouse;
let houses = 0;

beforeAll(async () => {
  catcher = await startMailCatcher({ smtpPort: 0, httpPort: 0 });
  t = await TestApp.start({ SMTP_URL: `smtp://127.0.0.1:${catcher.smtpPort}` });
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

async function caught(subject: string): Promise<CaughtMail> {
  await until(() => catcher.messages({ subject }).length > 0);
  const [first, ...more] = catcher.messages({ subject });
  if (!first || more.length > 0) throw new Error('There is not one such mail.');
  return first;
}

async function sent(count = 2): Promise<Draft> {
  const draft = await house.draft(count);
  await house.send(draft.orderId).expect(201);
  return draft;
}

const came = ({ orderId, concentrate }: Draft, count: number, more: object = {}) => {
  const lot = { lotId: v7(), lotNumber: '0611', expiresOn: null };
  const line = { packId: house.concentrate, orderLineId: concentrate, ...lot, count };
  return house.act(house.technician, 'receipts', { orderId, lines: [line], ...more });
};
const cancel = (orderId: string, browser = house.manager) =>
  house.act(browser, 'order-cancellations', { orderId, reason: 'bought next door' });

describe('an order that goes out', () => {
  it('takes a manager, mails the supplier once and is on order', async () => {
    const { orderId } = await house.draft();
    await house.act(house.technician, 'order-sendings', { orderId, revision: 1 }).expect(403);
    const [actionId, content] = [v7(), { orderId, revision: 1, happenedAt: t.clock.nowIso() }];
    const first = await house.act(house.manager, 'order-sendings', content, actionId).expect(201);
    const sender = `Ines office-${houses}`;
    const address = `ines.office-${houses}@darkroom.example`;
    expect(told('order-action', first).order).toMatchObject({
      state: 'sent',
      sentBy: sender,
      mail: { state: 'waiting' },
    });
    await house.act(house.manager, 'order-sendings', content, actionId).expect(200);
    const mail = await caught('Order 0001');
    expect(mail.to).toEqual(['orders@bromide-street.example']);
    expect(mail.subject).toBe(`Order 0001 from The office-${houses} darkroom`);
    expect(mail.text).toContain(`Please answer to ${sender}, ${address}, and name order 0001.`);
    expect(mail.headers['reply-to']).toBe(address);
    const kept = await t.database.inDarkroom({ darkroomId: house.id }, (tx) =>
      tx.select().from(mails).where(eq(mails.orderId, orderId)),
    );
    expect(kept).toMatchObject([{ dedupeKey: `order:${orderId}`, messageId: mail.messageId }]);
    expect((await house.order(orderId)).mailText).toBe(kept[0]?.body);
    expect(await house.pack(house.concentrate)).toMatchObject({ onOrder: 2, advice: { due: false } });
  });

  it('is sent by one of two who send it at once', async () => {
    const { orderId } = await house.draft();
    const both = await Promise.all([house.send(orderId), house.send(orderId)]);
    expect(both.map(({ status }) => status).sort()).toEqual([201, 422]);
    await caught('Order 0001');
  });

  it('cannot be taken back, only cancelled', async () => {
    const { orderId } = await house.draft();
    const actionId = v7();
    await house.send(orderId, 1, actionId).expect(201);
    expect(await house.refused(house.void(actionId, house.manager), 422)).toMatchObject({
      code: 'cannot-be-voided',
      detail: 'The order has gone out. Cancel it instead.',
    });
  });

  it('ends the warning of a short shelf, and cancelling brings it back', async () => {
    await house.receive(house.concentrate, 1);
    const [short] = await house.warnings(house.concentrate);
    expect(short?.kind).toBe('reorder-point');
    const { orderId } = await sent();
    expect(await house.warnings(house.concentrate)).toEqual([]);
    await cancel(orderId).expect(201);
    expect(await house.warnings(house.concentrate)).toMatchObject([{ eventId: short?.eventId }]);
  });
});

describe('what comes of an order', () => {
  it('is counted line by line until all of it is here', async () => {
    const draft = await sent();
    const { orderId } = draft;
    const first = await came(draft, 1).expect(201);
    expect(told('receipt', first).order).toMatchObject({
      state: 'sent',
      lines: [{ received: 1 }, { received: 0 }],
    });
    expect(await house.pack(house.concentrate)).toMatchObject({ unopened: 1, onOrder: 1 });
    expect(await house.refused(came(draft, 2), 422)).toMatchObject({
      code: 'more-than-ordered',
      errors: [{ field: 'content.lines.0.count' }],
    });
    await came(draft, 2, { overDeliveryOk: true }).expect(201);
    const lot = { lotId: v7(), lotNumber: 'K1', expiresOn: null };
    const kit = { packId: house.kit, orderLineId: draft.kit, ...lot, count: 1 };
    const actionId = v7();
    const last = await house
      .act(house.technician, 'receipts', { orderId, lines: [kit] }, actionId)
      .expect(201);
    expect(told('receipt', last).order).toMatchObject({ state: 'received' });
    expect((await house.refused(came(draft, 1), 422)).code).toBe('order-not-open');
    await house.void(actionId).expect(201);
    const { order } = await house.order(orderId);
    expect(order).toMatchObject({ state: 'sent', lines: [{ received: 3 }, { received: 0 }] });
    expect(await house.pack(house.kit)).toMatchObject({ unopened: 0, onOrder: 1 });
    expect(await house.complaints()).toEqual([]);
  });

  it('costs what the order says', async () => {
    const draft = await sent();
    const { shelf } = told('receipt', await came(draft, 1).expect(201));
    const lotId = shelf.packs.find(({ id }) => id === house.concentrate)?.lots[0]?.id;
    const mixed = await house.mix({ kind: 'lot', lotId }, 1_000_000).expect(201);
    expect(told('mix', mixed).bottle).toMatchObject({ costMinor: 230, currency: 'EUR' });
  });

  it('is counted once when two receive it at once', async () => {
    const draft = await sent();
    const both = await Promise.all([came(draft, 2), came(draft, 2)]);
    expect(both.map(({ status }) => status).sort()).toEqual([201, 422]);
    expect((await house.order(draft.orderId)).order.lines[0]?.received).toBe(2);
  });

  it('leaves a rest that can be cancelled, and the supplier is told', async () => {
    const draft = await sent(3);
    await came(draft, 1).expect(201);
    await cancel(draft.orderId, house.technician).expect(403);
    const cancelled = await cancel(draft.orderId).expect(201);
    expect(told('order-action', cancelled).order).toMatchObject({
      state: 'received',
      lines: [{ received: 1, cancelled: 2 }, { cancelled: 1 }],
    });
    const mail = await caught('cancelled');
    expect(mail.text).toContain('Please do not send:\n\n  2 x Fix-1000\n  1 x Fix kit');
    expect(await house.pack(house.concentrate)).toMatchObject({ unopened: 1, onOrder: 0 });
    expect((await house.refused(cancel(draft.orderId), 422)).code).toBe('order-closed');
  });
});
