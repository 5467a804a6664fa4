import type { Row } from './table.js';
import { mixed, takeBack } from './voids.rows.js';
import type { World } from './world.js';

/** A bottle whose mix never was. */
const never = async (w: World): Promise<string> => {
  const { id, bottleId } = await mixed(w);
  await takeBack(w, id).expect(201);
  return bottleId;
};

export const bottleRows: Row[] = [
  [
    'a load into a bottle whose mix was taken back',
    async (w) => {
      const bottleId = await never(w);
      return () => w.put(w.member, 'loads', w.load({ bottleIds: [bottleId] }));
    },
    422,
    'bottle-taken-back',
    undefined,
    'Which bottle was it?',
  ],
  [
    'a hold on a bottle whose mix was taken back',
    async (w) => {
      const bottleId = await never(w);
      return () => w.put(w.member, 'holds', { bottleId, reason: 'cloudy' });
    },
    404,
    'not-found',
  ],
  [
    'a bottle’s id a second time',
    (w) => w.put(w.technician, 'mixes', w.mix({ bottleId: w.ids.bottleId })),
    409,
    'bottle-exists',
    undefined,
    'anew',
  ],
  [
    'a bottle let go that nobody held',
    (w) => w.put(w.technician, 'releases', { bottleId: w.ids.bottleId, reason: 'clear' }),
    409,
    'not-on-hold',
  ],
  [
    'a bottle discarded twice',
    (w) => w.put(w.technician, 'discards', { bottleId: w.ids.discardedId, wasteRoute: 'fixer-silver' }),
    409,
    'already-discarded',
  ],
  [
    'a hold on a discarded bottle',
    (w) => w.put(w.member, 'holds', { bottleId: w.ids.discardedId, reason: 'cloudy' }),
    409,
    'already-discarded',
  ],
  [
    'a load through a discarded bottle, which happened',
    (w) => w.put(w.member, 'loads', w.load({ bottleIds: [w.ids.discardedId], reported: true })),
    201,
  ],
  [
    'a load decided on twice',
    (w) =>
      w.put(w.technician, 'decisions', { loadActionId: w.ids.heldLoad, decision: 'accept', reason: 'again' }),
    409,
    'nothing-to-decide',
  ],
  [
    'a decision on a load that was taken back',
    (w) =>
      w.put(w.technician, 'decisions', {
        loadActionId: w.ids.voidedLoad,
        decision: 'accept',
        reason: 'late',
      }),
    409,
    'nothing-to-decide',
  ],
  [
    'a decision on a mix',
    (w) =>
      w.put(w.technician, 'decisions', { loadActionId: w.ids.mix, decision: 'accept', reason: 'no load' }),
    404,
    'not-found',
  ],
  [
    'a decision that is none',
    (w) =>
      w.put(w.technician, 'decisions', { loadActionId: w.ids.flaggedLoad, decision: 'reject', reason: 'no' }),
    400,
    'invalid',
    'content.decision',
  ],
];
