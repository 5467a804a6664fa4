import { v7 } from 'uuid';
import type { LoadAnswer } from '../features/loads/load.view.js';
import { told } from '../testing/stock-house.js';
import { rowStamps, writtenTables } from './row-stamps.js';
import type { World } from './world.js';

/** Words as they are sent, and as they are kept where that is not the same. */
const words: [what: string, sent: string, kept?: string][] = [
  ['letters and pictures', 'Smells of fish 🐟 – “off”'],
  ['a family of seven code points', '👩‍👩‍👧‍👦'],
  ['right to left, with its marks', '\u202bריח\u202c'],
  ['a letter of two code points', 'Cafe\u0301'],
  ['the same letter as one', 'Caf\u00e9'],
  ['a quotation', "'; drop table holds; -- \\' OR 1=1--"],
  ['a page', '<b onclick="x()">&amp;</b>'],
  ['two lines', 'first\nsecond'],
  ['space around it, which is cut off', ' \t cloudy \n', 'cloudy'],
  ['space inside it', 'very  cloudy'],
  ['a zero-width space inside it', 'very\u200bcloudy'],
  ['something that looks like JSON', '{"reason": null}\\u0000'],
];

const reads = ['people', 'bottles', 'log', 'chemistries', 'shelf', 'orders', 'suppliers', 'needs-you'];

/** What goes well: words are kept as they were written, and reading by other methods changes nothing. */
export function answersTopic(world: () => World): void {
  describe(`words that come back (${words.length * 2} cases)`, () => {
    it.each(words)('%s', async (_what, sent, kept = sent) => {
      const w = world();
      const bottleId = await w.bottle();
      const hold = await w.put(w.member, 'holds', { bottleId, reason: sent }).expect(201);
      expect(hold.body).toMatchObject({ bottle: { totals: { hold: { reason: kept } } } });
      const load = await w.put(w.member, 'loads', w.load({ note: sent })).expect(201);
      expect((load.body as LoadAnswer).load.note).toBe(kept);
    });
  });

  describe(`HEAD and OPTIONS (${reads.length * 2 + 2} cases)`, () => {
    it.each(reads)('HEAD of %s tells what GET would, without its body', async (part) => {
      const w = world();
      const head = await w.manager.head(w.url(part));
      expect(head.status).toBe(200);
      expect(head.text ?? '').toBe('');
    });

    it.each(reads)('OPTIONS of %s opens nothing to another site', async (part) => {
      const w = world();
      const answer = await w.manager.options(w.url(part)).set('origin', 'https://elsewhere.example');
      expect(answer.status).toBeLessThan(500);
      expect(Object.keys(answer.headers).filter((name) => name.startsWith('access-control-'))).toEqual([]);
    });

    it('HEAD of nothing is 404, and HEAD of an action, too', async () => {
      const w = world();
      expect((await w.member.head(w.url('nothing'))).status).toBe(404);
      expect((await w.member.head(w.url(`loads/${w.ids.load}`))).status).toBe(404);
    });
  });

  describe('two people at one draft (4 cases)', () => {
    const lines = (w: World, id: string, count: number) => [
      { id, supplierPackId: w.house.soldConcentrate, count },
    ];
    const patch = (w: World, by: World['member'], orderId: string, change: object) =>
      by.patch(w.url(`orders/${orderId}`)).send({ revision: 1, ...change });

    it('who change it at once: one is taken, the other told', async () => {
      const w = world();
      const { orderId, concentrate } = await w.house.draft();
      const answers = await Promise.all([
        patch(w, w.technician, orderId, { lines: lines(w, concentrate, 5) }),
        patch(w, w.manager, orderId, { lines: lines(w, concentrate, 6) }),
      ]);
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
      const taken = answers[0].status === 200 ? 5 : 6;
      const { order } = await w.house.order(orderId);
      expect(order.lines.find(({ id }) => id === concentrate)?.count).toBe(taken);
    });

    it('of whom one sends it while the other changes a line: it goes out as one of them saw it', async () => {
      const w = world();
      const { orderId, concentrate } = await w.house.draft();
      const [sent, changed] = await Promise.all([
        w.put(w.manager, 'order-sendings', { orderId, revision: 1 }),
        patch(w, w.technician, orderId, { lines: lines(w, concentrate, 7) }),
      ]);
      const { order } = await w.house.order(orderId);
      const count = order.lines.find(({ id }) => id === concentrate)?.count;
      const wentOut = { sent: 201, changed: 422, state: 'sent', count: 2 };
      const held = { sent: 409, changed: 200, state: 'draft', count: 7 };
      expect([wentOut, held]).toContainEqual({
        sent: sent.status,
        changed: changed.status,
        state: order.state,
        count,
      });
    });

    it('who send it at once: it goes out once, in one mail', async () => {
      const w = world();
      const { orderId } = await w.house.draft();
      const send = () => w.put(w.manager, 'order-sendings', { orderId, revision: 1 });
      const answers = await Promise.all([send(), send()]);
      expect(answers.map(({ status }) => status).sort()).toEqual([201, 422]);
      const mails = await w.root`select 1 from mails where order_id = ${orderId}`;
      expect(mails).toHaveLength(1);
    });

    it('an over-delivery is asked about once, then stands as it came', async () => {
      const w = world();
      const { orderId, concentrate } = await w.house.draft();
      await w.house.send(orderId).expect(201);
      const content = { orderId, lines: [w.receiptLine({ orderLineId: concentrate, count: 5 })] };
      const id = v7();
      const before = await rowStamps(w.root);
      await w.put(w.technician, 'receipts', content, { id }).expect(422);
      expect(writtenTables(before, await rowStamps(w.root))).toEqual([]);
      const yes = await w
        .put(w.technician, 'receipts', { ...content, overDeliveryOk: true }, { id })
        .expect(201);
      const line = told('receipt', yes).order?.lines.find((one) => one.id === concentrate);
      expect(line).toMatchObject({ count: 2, received: 5 });
    });
  });
}
