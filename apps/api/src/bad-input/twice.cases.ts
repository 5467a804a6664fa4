import { v7 } from 'uuid';
import type { Browser } from '../testing/test-app.js';
import { rowStamps, writtenTables } from './row-stamps.js';
import { expectRefusal } from './table.js';
import type { World } from './world.js';

type Content = Record<string, unknown>;

/** A kind of action: who tells it, who else may, what has to be there first, and something else that could be told. */
interface Kind {
  route: string;
  by: (world: World) => Browser;
  alsoBy: (world: World) => Browser;
  content: (world: World) => Content | Promise<Content>;
  other: Content;
}

const member = { by: (w: World) => w.member, alsoBy: (w: World) => w.other };
const technician = { by: (w: World) => w.technician, alsoBy: (w: World) => w.manager };

const kinds: Kind[] = [
  { ...member, route: 'loads', content: (w) => w.load(), other: { note: 'and wet it first' } },
  { ...technician, route: 'mixes', content: (w) => w.mix(), other: { volumeUl: 2_000_000 } },
  { ...technician, route: 'receipts', content: (w) => w.receipt(), other: { note: 'the box was open' } },
  { ...technician, route: 'order-drafts', content: (w) => w.draft(), other: { orderId: v7() } },
  {
    ...member,
    route: 'holds',
    content: async (w) => ({ bottleId: await w.bottle(), reason: 'cloudy' }),
    other: { reason: 'clear' },
  },
  {
    ...technician,
    route: 'releases',
    content: async (w) => {
      const bottleId = await w.bottle();
      await w.put(w.member, 'holds', { bottleId, reason: 'cloudy' }).expect(201);
      return { bottleId, reason: 'clear' };
    },
    other: { reason: 'cloudy' },
  },
  {
    ...technician,
    route: 'discards',
    content: async (w) => ({ bottleId: await w.bottle(), wasteRoute: 'fixer-silver' }),
    other: { note: 'down to the last drop' },
  },
  {
    ...member,
    route: 'voids',
    content: async (w) => {
      const id = v7();
      await w.put(w.member, 'loads', w.load(), { id }).expect(201);
      return { voidedActionId: id };
    },
    other: { reason: 'wrong bottle' },
  },
  {
    ...technician,
    route: 'decisions',
    content: async (w) => {
      const id = v7();
      await w.put(w.member, 'loads', w.load({ reported: true }), { id }).expect(201);
      return { loadActionId: id, decision: 'accept', reason: 'looked' };
    },
    other: { reason: 'looked twice' },
  },
  {
    route: 'order-sendings',
    by: (w) => w.manager,
    alsoBy: (w) => w.manager,
    content: async (w) => ({ orderId: (await w.house.draft()).orderId, revision: 1 }),
    other: { revision: 2 },
  },
  {
    route: 'order-cancellations',
    by: (w) => w.manager,
    alsoBy: (w) => w.manager,
    content: async (w) => ({ orderId: (await w.house.draft()).orderId, reason: 'late' }),
    other: { reason: 'too dear' },
  },
  {
    ...technician,
    route: 'setting-changes',
    content: (w) => ({
      subject: 'supplier-pack',
      subjectId: w.ids.supplierPackId,
      changes: [{ field: 'outUntil', value: '2031-02-03' }],
    }),
    other: { changes: [{ field: 'outUntil', value: null }] },
  },
];

/** An action's id makes it count once: what came before is answered again, and anything else under its name is refused. */
export function twiceTopic(world: () => World): void {
  describe(`the same id again (${kinds.length * 5} cases)`, () => {
    it.each(kinds.map((kind) => [kind.route, kind] as const))(
      '%s',
      async (route, { by, alsoBy, content, other }) => {
        const w = world();
        const id = v7();
        const body = w.told(await content(w));
        const send = (browser: Browser, what: string, told: object) =>
          browser.put(w.url(`${what}/${id}`)).send(told);
        const first = await send(by(w), route, body);
        expect(first.status).toBe(201);
        const before = await rowStamps(w.root);
        const again = await send(by(w), route, { ...body, envelope: { ...body.envelope, queued: true } });
        expect(again.status).toBe(200);
        expect(again.body).toEqual(first.body);
        const refused = (why: string, answer: Awaited<ReturnType<typeof send>>) =>
          expectRefusal(answer, [
            why,
            () => Promise.resolve(answer),
            409,
            'action-differs',
            undefined,
            'with other content',
          ]);
        refused(
          'other content',
          await send(by(w), route, { ...body, content: { ...body.content, ...other } }),
        );
        const elsewhere = route === 'holds' ? 'loads' : 'holds';
        const hold = { bottleId: w.ids.bottleId, reason: 'cloudy' };
        refused(
          'another kind',
          await send(by(w), elsewhere, w.told(elsewhere === 'holds' ? hold : w.load())),
        );
        if (alsoBy(w) !== by(w)) refused('another person', await send(alsoBy(w), route, body));
        expect(writtenTables(before, await rowStamps(w.root))).toEqual([]);
      },
    );
  });
}
