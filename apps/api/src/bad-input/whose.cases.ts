import { v7 } from 'uuid';
import type { Ids } from '../testing/filled-house.js';
import type { ProblemCode } from '../platform/errors/problem.js';
import { rowStamps, writtenTables } from './row-stamps.js';
import { expectRefusal, type Answer } from './table.js';
import type { World } from './world.js';

type Case = readonly [
  what: string,
  id: keyof Ids,
  ask: (world: World, id: string) => PromiseLike<Answer>,
  status?: number,
  code?: ProblemCode,
];

const sale = (w: World, subjectId: string) => ({
  subject: 'supplier-pack',
  subjectId,
  changes: [{ field: 'outUntil', value: null }],
});

/** Every place that takes an id, asked for a thing that is another darkroom’s. */
const cases: Case[] = [
  ['a darkroom', 'darkroomId', (w, id) => w.member.get(`/api/darkrooms/${id}`)],
  ...['bottles', 'chemistries', 'log', 'people', 'shelf', 'orders', 'suppliers', 'needs-you'].map(
    (part): Case => [
      `a darkroom’s ${part}`,
      'darkroomId',
      (w, id) => w.manager.get(`/api/darkrooms/${id}/${part}`),
    ],
  ),
  [
    'a load into a darkroom',
    'darkroomId',
    (w, id) =>
      w.member
        .put(`/api/darkrooms/${id}/loads/${v7()}`)
        .send(w.told(w.load({ bottleIds: [w.there.ids.bottleId] }))),
  ],
  [
    'a receipt into a darkroom',
    'darkroomId',
    (w, id) =>
      w.technician
        .put(`/api/darkrooms/${id}/receipts/${v7()}`)
        .send(w.told(w.receipt({ packId: w.there.ids.packId }))),
  ],
  ['a bottle', 'bottleId', (w, id) => w.member.get(w.url(`bottles/${id}`))],
  ['an order', 'draftId', (w, id) => w.technician.get(w.url(`orders/${id}`))],
  [
    'an order, changed',
    'draftId',
    (w, id) => w.technician.patch(w.url(`orders/${id}`)).send({ revision: 1, lines: [] }),
  ],
  ['a bottle of a load', 'bottleId', (w, id) => w.put(w.member, 'loads', w.load({ bottleIds: [id] }))],
  [
    'one of two bottles of a load',
    'bottleId',
    (w, id) => w.put(w.member, 'loads', w.load({ bottleIds: [w.ids.bottleId, id] })),
  ],
  [
    'a member whose film it is',
    'memberId',
    (w, membershipId) => w.put(w.member, 'loads', w.load({ film: [w.film({ owner: { membershipId } })] })),
  ],
  [
    'a line’s version',
    'versionId',
    (w, lineVersionId) => w.put(w.member, 'loads', w.load({ lineVersionId })),
  ],
  ['a bottle held', 'bottleId', (w, bottleId) => w.put(w.member, 'holds', { bottleId, reason: 'cloudy' })],
  [
    'a bottle let go',
    'bottleId',
    (w, bottleId) => w.put(w.technician, 'releases', { bottleId, reason: 'clear' }),
  ],
  [
    'a bottle discarded',
    'bottleId',
    (w, bottleId) => w.put(w.technician, 'discards', { bottleId, wasteRoute: 'fixer-silver' }),
  ],
  [
    'a chemistry’s version',
    'versionId',
    (w, id) => w.put(w.technician, 'mixes', w.mix({ chemistryVersionId: id })),
  ],
  [
    'a lot mixed from',
    'lotId',
    (w, lotId) => w.put(w.technician, 'mixes', w.mix({ from: { kind: 'lot', lotId } })),
  ],
  [
    'an opened pack',
    'openedPackId',
    (w, id) => w.put(w.technician, 'mixes', w.mix({ from: { kind: 'opened', openedPackIds: [id] } })),
  ],
  [
    'a bottle of stock',
    'bottleId',
    (w, bottleId) => w.put(w.technician, 'mixes', w.mix({ from: { kind: 'stock', bottleId } })),
  ],
  ['an action taken back', 'load', (w, voidedActionId) => w.put(w.technician, 'voids', { voidedActionId })],
  [
    'a load decided on',
    'flaggedLoad',
    (w, loadActionId) =>
      w.put(w.technician, 'decisions', { loadActionId, decision: 'accept', reason: 'looked' }),
  ],
  [
    'a pack that came',
    'packId',
    (w, packId) => w.put(w.technician, 'receipts', w.receipt({ packId })),
    400,
    'invalid',
  ],
  [
    'the order of a receipt',
    'sentOrderId',
    (w, orderId) => w.put(w.technician, 'receipts', { orderId, ...w.receipt() }),
  ],
  [
    'the line of an order of a receipt',
    'draftLineId',
    (w, orderLineId) =>
      w.put(w.technician, 'receipts', { orderId: w.ids.sentOrderId, ...w.receipt({ orderLineId }) }),
    400,
    'invalid',
  ],
  [
    'a supplier',
    'supplierId',
    (w, supplierId) => w.put(w.technician, 'order-drafts', { ...w.draft(), supplierId }),
  ],
  [
    'what a supplier sells',
    'supplierPackId',
    (w, id) => w.put(w.technician, 'order-drafts', w.draft({ supplierPackId: id })),
    400,
    'invalid',
  ],
  ['an order sent', 'draftId', (w, orderId) => w.put(w.manager, 'order-sendings', { orderId, revision: 1 })],
  [
    'an order cancelled',
    'draftId',
    (w, orderId) => w.put(w.manager, 'order-cancellations', { orderId, reason: 'late' }),
  ],
  ['a setting’s subject', 'supplierPackId', (w, id) => w.put(w.technician, 'setting-changes', sale(w, id))],
];

/** What belongs to another darkroom is answered as what is nowhere: the same status and the same body, letter by letter. */
export function whoseTopic(world: () => World): void {
  describe(`what is another darkroom’s is nowhere (${cases.length * 2} cases)`, () => {
    it.each(cases.map((one) => [one[0], one] as const))(
      '%s',
      async (what, [, id, ask, status = 404, code = 'not-found']) => {
        const w = world();
        const before = await rowStamps(w.root);
        const theirs = await ask(w, w.there.ids[id]);
        const nobodys = await ask(w, v7());
        expectRefusal(theirs, [what, () => ask(w, ''), status, code]);
        expect(theirs.body).toEqual(nobodys.body);
        expect(theirs.status).toBe(nobodys.status);
        expect(writtenTables(before, await rowStamps(w.root))).toEqual([]);
      },
    );

    it('but a lot’s number of another darkroom may be this one’s, too: ids are the darkroom’s own', async () => {
      const w = world();
      const { lotId } = w.there.ids;
      await w.put(w.technician, 'receipts', w.receipt({ lotId })).expect(201);
      expect((await w.there.house.pack(w.there.house.concentrate)).lots.map((lot) => lot.id)).toContain(
        lotId,
      );
    });
  });
}
