import { v7 } from 'uuid';
import { signedCookie } from '../testing/signed-cookie.js';
import { PASSPHRASE } from '../testing/test-app.js';
import type { FilledHouse } from '../testing/filled-house.js';

/** A request that is right in all things: live ids, a fitting body. Who sends it decides what comes of it. */
export interface Attempt {
  url: string;
  body?: object;
  /** It names rows of its darkroom, so that in another darkroom there is nothing to be found. */
  names: boolean;
  /** The sender's cookies, where sending it spends them. */
  cookie?: string;
}

export type Attempts = Readonly<Record<string, (house: FilledHouse) => Attempt | Promise<Attempt>>>;

const look =
  (path: string, names = false) =>
  ({ house }: FilledHouse): Attempt => ({ url: house.url(path).replace(/\/$/, ''), names });

/** An action that happens now, under an id of its own. */
export function put({ house }: FilledHouse, what: string, content: object, names = true): Attempt {
  const now = house.t.clock.nowIso();
  const body = {
    content: { v: 1, happenedAt: now, ...content },
    envelope: { sentAt: now, deviceNow: now, queued: false },
  };
  return { url: house.url(`${what}/${v7()}`), body, names };
}

export const film = (owner?: object) => [
  { format: '135-36', count: 1, filmClass: 'conventional', ...(owner ? { owner } : {}) },
];

async function flaggedLoad({ house, member, ids }: FilledHouse): Promise<string> {
  const id = v7();
  const { bottleId } = ids;
  await house.act(member, 'holds', { bottleId, reason: 'cloudy' }).expect(201);
  const load = { bottleIds: [bottleId], material: 'film', film: film(), reported: true };
  await house.act(member, 'loads', load, id).expect(201);
  return id;
}

export const mixOf = ({ house }: FilledHouse, from: object) => ({
  bottleId: v7(),
  chemistryVersionId: house.version,
  volumeUl: 500_000,
  container: { sizeUl: 1_000_000, kind: 'bottle' },
  material: 'film',
  from,
});

const receipt = (packId: string) => ({
  lines: [{ packId, lotId: v7(), lotNumber: '0611', expiresOn: '2029-01-12', count: 1 }],
});

const sinkActions: Attempts = {
  'PUT /darkrooms/:darkroomId/mixes/:actionId': (h) =>
    put(h, 'mixes', mixOf(h, { kind: 'lot', lotId: h.ids.lotId })),
  'PUT /darkrooms/:darkroomId/loads/:actionId': (h) =>
    put(h, 'loads', { bottleIds: [h.ids.bottleId], material: 'film', film: film() }),
  'PUT /darkrooms/:darkroomId/decisions/:actionId': async (h) => {
    const loadActionId = await flaggedLoad(h);
    return put(h, 'decisions', { loadActionId, decision: 'accept', reason: 'tested' });
  },
  'PUT /darkrooms/:darkroomId/holds/:actionId': (h) =>
    put(h, 'holds', { bottleId: h.ids.bottleId, reason: 'cloudy' }),
  'PUT /darkrooms/:darkroomId/releases/:actionId': async (h) => {
    await flaggedLoad(h);
    return put(h, 'releases', { bottleId: h.ids.bottleId, reason: 'clear again' });
  },
  'PUT /darkrooms/:darkroomId/discards/:actionId': async (h) => {
    const mix = mixOf(h, { kind: 'hand' });
    await h.house.act(h.house.technician, 'mixes', mix).expect(201);
    return put(h, 'discards', { bottleId: mix.bottleId, wasteRoute: 'fixer-silver' });
  },
  'PUT /darkrooms/:darkroomId/voids/:actionId': async (h) => {
    const load = { bottleIds: [h.ids.bottleId], material: 'film', film: film() };
    const id = v7();
    await h.house.act(h.member, 'loads', load, id).expect(201);
    return put(h, 'voids', { voidedActionId: id, reason: 'wrong bottle' });
  },
};

const shelfActions: Attempts = {
  'PUT /darkrooms/:darkroomId/receipts/:actionId': (h) => put(h, 'receipts', receipt(h.ids.packId)),
  'PUT /darkrooms/:darkroomId/setting-changes/:actionId': (h) =>
    put(h, 'setting-changes', {
      subject: 'supplier-pack',
      subjectId: h.ids.supplierPackId,
      changes: [{ field: 'outUntil', value: '2031-03-01' }],
    }),
  'PUT /darkrooms/:darkroomId/order-drafts/:actionId': (h) =>
    put(h, 'order-drafts', {
      orderId: v7(),
      supplierId: h.ids.supplierId,
      lines: [{ id: v7(), supplierPackId: h.ids.supplierPackId, count: 1 }],
    }),
  'PUT /darkrooms/:darkroomId/order-sendings/:actionId': async (h) =>
    put(h, 'order-sendings', { orderId: (await h.house.draft()).orderId, revision: 1 }),
  'PUT /darkrooms/:darkroomId/order-cancellations/:actionId': async (h) =>
    put(h, 'order-cancellations', { orderId: (await h.house.draft()).orderId, reason: 'not needed' }),
  'PATCH /darkrooms/:darkroomId/orders/:orderId': async (h) => ({
    url: h.house.url(`orders/${(await h.house.draft()).orderId}`),
    body: { revision: 1, note: 'ring the bell twice', lines: [] },
    names: true,
  }),
};

const looks: Attempts = {
  'GET /darkrooms/:darkroomId': look(''),
  'GET /darkrooms/:darkroomId/people': look('people'),
  'GET /darkrooms/:darkroomId/chemistries': look('chemistries'),
  'GET /darkrooms/:darkroomId/bottles': look('bottles?state=all'),
  'GET /darkrooms/:darkroomId/bottles/:bottle': (h) => look(`bottles/${h.ids.bottleId}`, true)(h),
  'GET /darkrooms/:darkroomId/log': look('log'),
  'GET /darkrooms/:darkroomId/needs-you': look('needs-you'),
  'GET /darkrooms/:darkroomId/shelf': look('shelf'),
  'GET /darkrooms/:darkroomId/suppliers': look('suppliers'),
  'GET /darkrooms/:darkroomId/orders': look('orders'),
  'GET /darkrooms/:darkroomId/orders/:orderId': (h) => look(`orders/${h.ids.draftId}`, true)(h),
};

const doors: Attempts = {
  'GET /health': () => ({ url: '/api/health', names: false }),
  'GET /ready': () => ({ url: '/api/ready', names: false }),
  'GET /me': () => ({ url: '/api/me', names: false }),
  'POST /sign-in': async (h) => ({
    ...(await spending(h, '/api/sign-in')),
    body: { email: h.emails.manager, passphrase: PASSPHRASE },
  }),
  'POST /sign-in/refresh': (h) => spending(h, '/api/sign-in/refresh'),
  'POST /sign-out': (h) => spending(h, '/api/sign-out'),
};

async function spending({ house, emails }: FilledHouse, url: string): Promise<Attempt> {
  return { url, names: false, cookie: await signedCookie(house.t, emails.manager) };
}

/** One right request for every route. A route without one fails the walk. */
export const attempts: Attempts = { ...sinkActions, ...shelfActions, ...looks, ...doors };
