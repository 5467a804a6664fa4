import { v7 } from 'uuid';
import type { Row } from './table.js';
import type { World } from './world.js';

export const takeBack = (w: World, voidedActionId: string, by = w.technician) =>
  w.put(by, 'voids', { voidedActionId });

/** A load of its own. @returns its id */
async function loaded(w: World, bottleId = w.ids.bottleId, by = w.member): Promise<string> {
  const id = v7();
  await w.put(by, 'loads', w.load({ bottleIds: [bottleId] }), { id }).expect(201);
  return id;
}

export async function mixed(
  w: World,
  change: Record<string, unknown> = {},
): Promise<{ bottleId: string; id: string }> {
  const id = v7();
  const bottleId = v7();
  await w.put(w.technician, 'mixes', w.mix({ bottleId, ...change }), { id }).expect(201);
  return { bottleId, id };
}

const takenBack: Row[] = [
  [
    'one’s own load',
    async (w) => {
      const id = await loaded(w);
      return () => takeBack(w, id, w.member);
    },
    201,
  ],
  [
    'one’s own load, a second time',
    async (w) => {
      const id = await loaded(w);
      await takeBack(w, id, w.member).expect(201);
      return () => takeBack(w, id, w.member);
    },
    409,
    'already-voided',
    undefined,
    'log',
  ],
  [
    'a void, by the one who made it',
    (w) => takeBack(w, w.ids.void, w.member),
    422,
    'void-of-void',
    undefined,
    'anew',
  ],
  ['a void, by a technician', (w) => takeBack(w, w.ids.void), 422, 'void-of-void'],
  [
    'itself',
    (w) => {
      const id = v7();
      return w.put(w.technician, 'voids', { voidedActionId: id }, { id });
    },
    404,
    'not-found',
  ],
  [
    'another member’s load',
    async (w) => {
      const id = await loaded(w, w.ids.bottleId, w.other);
      return () => takeBack(w, id, w.member);
    },
    403,
    'not-allowed',
    undefined,
    'technician',
  ],
  [
    'a member’s load, by a technician',
    async (w) => {
      const id = await loaded(w);
      return () => takeBack(w, id);
    },
    201,
  ],
  [
    'a technician’s mix, by a member',
    async (w) => {
      const { id } = await mixed(w);
      return () => takeBack(w, id, w.member);
    },
    403,
    'not-allowed',
  ],
  [
    'a mix with a load',
    async (w) => {
      const { id, bottleId } = await mixed(w);
      await loaded(w, bottleId);
      return () => takeBack(w, id);
    },
    409,
    'leans-on-it',
    undefined,
    'has 1 load on it',
  ],
  [
    'a mix with two loads',
    async (w) => {
      const { id, bottleId } = await mixed(w);
      await loaded(w, bottleId);
      await loaded(w, bottleId);
      return () => takeBack(w, id);
    },
    409,
    'leans-on-it',
    undefined,
    'has 2 loads on it',
  ],
  [
    'a mix whose load was taken back',
    async (w) => {
      const { id, bottleId } = await mixed(w);
      await takeBack(w, await loaded(w, bottleId));
      return () => takeBack(w, id);
    },
    201,
  ],
  [
    'a mix with a hold',
    async (w) => {
      const { id, bottleId } = await mixed(w);
      await w.put(w.member, 'holds', { bottleId, reason: 'cloudy' }).expect(201);
      return () => takeBack(w, id);
    },
    409,
    'leans-on-it',
    undefined,
    'a hold or a discard',
  ],
  [
    'a mix that another was mixed from',
    (w) => takeBack(w, w.ids.mix),
    409,
    'leans-on-it',
    undefined,
    'Take those back first',
  ],
  [
    'a receipt whose kit was used',
    async (w) => {
      const { lotId, actionId } = await w.house.receive(w.house.concentrate, 1);
      await mixed(w, { from: { kind: 'lot', lotId } });
      return () => takeBack(w, actionId);
    },
    409,
    'leans-on-it',
    undefined,
    'mixed from it',
  ],
  [
    'a receipt whose kit was used, and that mix taken back',
    async (w) => {
      const { lotId, actionId } = await w.house.receive(w.house.concentrate, 1);
      const { id } = await mixed(w, { from: { kind: 'lot', lotId } });
      await takeBack(w, id).expect(201);
      return () => takeBack(w, actionId);
    },
    201,
  ],
  [
    'an order that went out',
    async (w) => {
      const { orderId } = await w.house.draft();
      const id = v7();
      await w.house.send(orderId, 1, id).expect(201);
      return () => takeBack(w, id, w.manager);
    },
    422,
    'cannot-be-voided',
    undefined,
    'Cancel it instead',
  ],
  [
    'a draft that went out',
    async (w) => {
      const id = v7();
      const { orderId } = await w.house.draft(1, id);
      await w.house.send(orderId).expect(201);
      return () => takeBack(w, id);
    },
    409,
    'leans-on-it',
    undefined,
    'Cancel it instead',
  ],
  [
    'a cancellation',
    async (w) => {
      const { orderId } = await w.house.draft();
      const id = v7();
      await w.put(w.manager, 'order-cancellations', { orderId, reason: 'late' }, { id }).expect(201);
      return () => takeBack(w, id, w.manager);
    },
    422,
    'cannot-be-voided',
    undefined,
    'Draft it anew',
  ],
];

export const voidRows = takenBack.map(([what, ...rest]): Row => [`taking back ${what}`, ...rest]);
