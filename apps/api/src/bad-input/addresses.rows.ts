import { v7 } from 'uuid';
import type { Row } from './table.js';
import type { World } from './world.js';

/** What stands in an address where an id belongs. `%2F` and `%5C` are no separators once they are read. */
const NO_IDS = [
  ['a word', 'x'],
  ['a number', '1'],
  ['an id with a letter too many', '0190c8a0-0000-7000-8000-00000000000g'],
  ['an id without its dashes', '0190c8a0000070008000000000000001'],
  ['an id and a space', '0190c8a0-0000-7000-8000-000000000001%20'],
  ['a way up', '..%2F..%2Fme'],
  ['a quotation', '%27%20or%201=1--'],
  ['2,000 letters', 'a'.repeat(2000)],
  ['a zero character', '%00'],
  ['a picture', '%F0%9F%93%B7'],
] as const;

type Ask = (w: World, id: string) => PromiseLike<{ status: number; type: string; body: unknown }>;

const byId: [route: string, ask: Ask][] = [
  ['GET darkrooms/:id', (w, id) => w.member.get(`/api/darkrooms/${id}`)],
  ['GET darkrooms/:id/log', (w, id) => w.member.get(`/api/darkrooms/${id}/log`)],
  ['GET bottles/:id', (w, id) => w.member.get(w.url(`bottles/${id}`))],
  ['GET orders/:id', (w, id) => w.technician.get(w.url(`orders/${id}`))],
  ['PATCH orders/:id', (w, id) => w.technician.patch(w.url(`orders/${id}`)).send({ revision: 1, lines: [] })],
  ['PUT loads/:id', (w, id) => w.put(w.member, 'loads', w.load(), { id })],
  ['PUT mixes/:id', (w, id) => w.put(w.technician, 'mixes', w.mix(), { id })],
  ['PUT receipts/:id', (w, id) => w.put(w.technician, 'receipts', w.receipt(), { id })],
  ['PUT voids/:id', (w, id) => w.put(w.technician, 'voids', { voidedActionId: w.ids.load }, { id })],
  [
    'PUT holds/:id',
    (w, id) => w.put(w.member, 'holds', { bottleId: w.ids.bottleId, reason: 'cloudy' }, { id }),
  ],
  [
    'PUT releases/:id',
    (w, id) => w.put(w.technician, 'releases', { bottleId: w.ids.bottleId, reason: 'clear' }, { id }),
  ],
  [
    'PUT discards/:id',
    (w, id) =>
      w.put(w.technician, 'discards', { bottleId: w.ids.bottleId, wasteRoute: 'fixer-silver' }, { id }),
  ],
  [
    'PUT decisions/:id',
    (w, id) =>
      w.put(
        w.technician,
        'decisions',
        { loadActionId: w.ids.flaggedLoad, decision: 'accept', reason: 'looked' },
        { id },
      ),
  ],
  ['PUT order-drafts/:id', (w, id) => w.put(w.technician, 'order-drafts', w.draft(), { id })],
  [
    'PUT order-sendings/:id',
    (w, id) => w.put(w.manager, 'order-sendings', { orderId: w.ids.draftId, revision: 1 }, { id }),
  ],
  [
    'PUT order-cancellations/:id',
    (w, id) => w.put(w.manager, 'order-cancellations', { orderId: w.ids.draftId, reason: 'late' }, { id }),
  ],
  [
    'PUT setting-changes/:id',
    (w, id) =>
      w.put(
        w.technician,
        'setting-changes',
        {
          subject: 'supplier-pack',
          subjectId: w.ids.supplierPackId,
          changes: [{ field: 'outUntil', value: null }],
        },
        { id },
      ),
  ],
];

/** Every route takes its id the same way; a few are asked for all of them, the rest for the likeliest. */
const WHOLE = ['GET darkrooms/:id', 'GET bottles/:id', 'GET orders/:id', 'PUT loads/:id'];

const noIds = byId.flatMap(([route, ask]) =>
  NO_IDS.slice(WHOLE.includes(route) ? 0 : -3).map(([what, id]): Row => [
    `${route}: ${what}`,
    (w) => ask(w, id),
    404,
    'not-found',
    undefined,
    'nothing here',
  ]),
);

const brokenEscapes = byId
  .filter(([route]) => WHOLE.includes(route))
  .flatMap(([route, ask]) =>
    ['%ZZ', '%', '%C3%28'].map((id): Row => [
      `${route}: the broken escape ${id}`,
      (w) => ask(w, id),
      400,
      'malformed',
    ]),
  );

const nowhere: Row[] = [
  ['a route that is not', (w) => w.member.get('/api/nothing'), 404, 'not-found'],
  ['a route that is not, in a darkroom', (w) => w.member.get(w.url('nothing')), 404, 'not-found'],
  [
    'a route that is not, with a body',
    (w) => w.member.post(w.url('nothing')).send({ a: 1 }),
    404,
    'not-found',
  ],
  ['GET where PUT is', (w) => w.member.get(w.url(`loads/${v7()}`)), 404, 'not-found'],
  ['POST where PUT is', (w) => w.member.post(w.url('loads')).send(w.told(w.load())), 404, 'not-found'],
  ['DELETE of a load', (w) => w.technician.delete(w.url(`loads/${w.ids.load}`)), 404, 'not-found'],
  ['DELETE of an order', (w) => w.manager.delete(w.url(`orders/${w.ids.draftId}`)), 404, 'not-found'],
  ['PUT where GET is', (w) => w.member.put(w.url('people')).send({}), 404, 'not-found'],
  [
    'PATCH of a bottle',
    (w) => w.manager.patch(w.url(`bottles/${w.ids.bottleId}`)).send({ volumeUl: 1 }),
    404,
    'not-found',
  ],
  ['PROPFIND', (w) => w.member.propfind(w.url('people')), 404, 'not-found'],
  ['GET of the way in', (w) => w.member.get('/api/sign-in'), 404, 'not-found'],
  ['a bottle’s code that is not', (w) => w.member.get(w.url('bottles/FX-9999')), 404, 'not-found'],
];

export const addressRows: Row[] = [...noIds, ...brokenEscapes, ...nowhere];
