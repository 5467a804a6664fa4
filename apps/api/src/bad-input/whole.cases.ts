import { v7 } from 'uuid';
import type { Browser } from '../testing/test-app.js';
import { rowStamps, writtenTables } from './row-stamps.js';
import { expectRefusal } from './table.js';
import type { World } from './world.js';

type Case = readonly [
  table: string,
  route: string,
  by: (world: World) => Browser,
  content: (world: World) => Record<string, unknown> | Promise<Record<string, unknown>>,
];

const member = (w: World) => w.member;
const technician = (w: World) => w.technician;
const manager = (w: World) => w.manager;

/** The late statements of each action: what was written before them must be gone again. */
const cases: Case[] = [
  ['load_film', 'loads', member, (w) => w.load()],
  ['load_steps', 'loads', member, (w) => w.load()],
  ['bottle_totals', 'loads', member, (w) => w.load()],
  ['mixes', 'mixes', technician, (w) => w.mix()],
  ['mix_draws', 'mixes', technician, (w) => w.mix({ from: { kind: 'lot', lotId: w.ids.lotId } })],
  ['stock_movements', 'mixes', technician, (w) => w.mix({ from: { kind: 'lot', lotId: w.ids.lotId } })],
  ['stock_movements', 'receipts', technician, (w) => w.receipt()],
  ['delivery_lines', 'receipts', technician, (w) => w.receipt()],
  ['order_lines', 'order-drafts', technician, (w) => w.draft()],
  ['order_changes', 'order-drafts', technician, (w) => w.draft()],
  [
    'mails',
    'order-sendings',
    manager,
    async (w) => ({ orderId: (await w.house.draft()).orderId, revision: 1 }),
  ],
  [
    'order_changes',
    'order-cancellations',
    manager,
    async (w) => ({ orderId: (await w.house.draft()).orderId, reason: 'late' }),
  ],
  ['holds', 'holds', member, async (w) => ({ bottleId: await w.bottle(), reason: 'cloudy' })],
  ['events', 'holds', member, async (w) => ({ bottleId: await w.bottle(), reason: 'cloudy' })],
  [
    'discards',
    'discards',
    technician,
    async (w) => ({ bottleId: await w.bottle(), wasteRoute: 'fixer-silver' }),
  ],
  [
    'decisions',
    'decisions',
    technician,
    (w) => ({ loadActionId: w.ids.flaggedLoad, decision: 'accept', reason: 'looked' }),
  ],
  ['voids', 'voids', technician, toTakeBack],
  ['bottle_totals', 'voids', technician, toTakeBack],
  [
    'setting_changes',
    'setting-changes',
    technician,
    (w) => ({
      subject: 'supplier-pack',
      subjectId: w.ids.supplierPackId,
      changes: [{ field: 'outUntil', value: '2032-04-05' }],
    }),
  ],
];

async function toTakeBack(w: World) {
  const id = v7();
  await w.put(w.member, 'loads', w.load(), { id }).expect(201);
  return { voidedActionId: id };
}

/** Makes the database break whenever that table is written. Whatever was written before stands in the same transaction. */
async function breaking<T>(w: World, table: string, work: () => Promise<T>): Promise<T> {
  await w.root`
    create or replace function public.break_off() returns trigger language plpgsql as
      $$ begin raise exception 'the disk under % gave way', tg_table_name; end $$`;
  await w.root`
    create trigger break_off before insert or update on ${w.root(table)}
      for each row execute function public.break_off()`;
  try {
    return await work();
  } finally {
    await w.root`drop trigger break_off on ${w.root(table)}`;
  }
}

/** An action is written whole or not at all, and a failure of the inside shows nothing of the inside. */
export function wholeTopic(world: () => World): void {
  describe(`all or nothing (${cases.length * 2} cases)`, () => {
    afterAll(async () => {
      await world().root`drop function if exists public.break_off()`;
    });

    it.each(cases)('%s fails under %s', async (table, route, by, content) => {
      const w = world();
      const id = v7();
      const body = w.told(await content(w));
      const send = () =>
        by(w)
          .put(w.url(`${route}/${id}`))
          .send(body);
      const before = await rowStamps(w.root);
      const answer = await breaking(w, table, async () => send());
      expectRefusal(answer, [route, send, 500, 'broken', undefined, 'Try again']);
      expect(JSON.stringify(answer.body)).not.toContain('gave way');
      expect(writtenTables(before, await rowStamps(w.root))).toEqual([]);
      // The same action again, now that nothing breaks: it was not half there.
      expect((await send()).status).toBe(201);
      await takeAway(w, route, id);
    });
  });
}

/** So that the next case finds things as this one did. */
async function takeAway(w: World, route: string, id: string): Promise<void> {
  if (route !== 'decisions') return;
  await w.put(w.technician, 'voids', { voidedActionId: id }).expect(201);
}
