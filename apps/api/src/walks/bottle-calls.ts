import { rapidFixer } from '@wetside/chemistry';
import { loadSteps } from '@wetside/db';
import { and, eq } from 'drizzle-orm';
import { BottleFactsRepository } from '../features/bottles/bottle-facts.repository.js';
import { BottlesRepository } from '../features/bottles/bottles.repository.js';
import { ChemistriesRepository } from '../features/chemistries/chemistries.repository.js';
import { HoldsRepository } from '../features/holds/holds.repository.js';
import { LoadsRepository } from '../features/loads/loads.repository.js';
import { LogRepository } from '../features/log/log.repository.js';
import { MixesRepository } from '../features/mixes/mixes.repository.js';
import { callsOf, type RepositoryCalls } from './repository-calls.js';
import type { Ids } from '../testing/filled-house.js';

export const AT = new Date('2031-03-01T09:00:00Z');
const totalsOf = ({ bottleId }: Ids) => ({ bottleId, totals: null, nextLookAt: null });
const ofBottle = ({ darkroomId, bottleId }: Ids) => [darkroomId, [bottleId]];

export const aboutBottles: readonly RepositoryCalls[] = [
  callsOf(BottlesRepository)({
    lock: (i) => [i.darkroomId, [i.bottleId]],
    insert: (i) => [
      {
        darkroomId: i.darkroomId,
        id: i.newId,
        code: 'ZZ-1',
        chemistryVersionId: i.versionId,
        madeByActionId: i.mix,
      },
    ],
    insertTotals: (i) => [i.darkroomId, totalsOf(i)],
    writeTotals: (i) => [i.darkroomId, [totalsOf(i)]],
    nextNumber: (i) => [i.darkroomId, 'FX'],
    details: (i) => [i.darkroomId, { ids: [i.bottleId] }],
    findId: (i) => [i.darkroomId, i.bottleId],
  }),
  callsOf(BottleFactsRepository)(
    { standing: (i) => [i.darkroomId, [i.bottleId]] },
    {
      inner: {
        mixes: ofBottle,
        loads: ofBottle,
        holds: ofBottle,
        discards: (i) => [i.darkroomId, [i.discardedId]],
        draws: ofBottle,
      },
    },
  ),
  callsOf(ChemistriesRepository)({
    version: (i) => [i.darkroomId, i.versionId],
    documents: (i) => [i.darkroomId, [i.versionId]],
    current: (i) => [i.darkroomId],
    fromPacks: (i) => [i.darkroomId],
    lastNumbers: (i) => [i.darkroomId, ['FX']],
    makesFromLot: (i) => [i.darkroomId, i.lotId, i.chemistryId],
    lotOfOpened: (i) => [i.darkroomId, i.openedPackId],
    makesFromStock: (i) => [i.darkroomId, i.chemistryId, i.chemistryId],
    insertChemistry: ({ darkroomId, newId: id, otherNewId }) => [
      { darkroomId, id, createdAt: AT },
      { darkroomId, id: otherNewId, chemistryId: id, number: 1, document: rapidFixer, createdAt: AT },
    ],
    insertPack: ({ darkroomId, newId: packId, otherNewId: id, chemistryId }) => [
      { darkroomId, id: packId, name: 'Fixer', form: 'concentrate' },
      [{ darkroomId, id, packId, position: 1, name: '', sizeUl: 1_000_000 }],
      [{ darkroomId, id, packId, chemistryId, volumeUl: 5_000_000, wholeOnly: false }],
    ],
  }),
  callsOf(HoldsRepository)({
    insertHold: ({ darkroomId, load: actionId, bottleId }) => [
      { darkroomId, actionId, bottleId, change: 'hold', reason: 'cloudy' },
    ],
    insertDiscard: ({ darkroomId, load: actionId, bottleId }) => [
      { darkroomId, actionId, bottleId, wasteRoute: 'fixer-silver' },
    ],
    bottlesOf: (i) => [i.darkroomId, i.hold],
  }),
  callsOf(LoadsRepository)({
    insert: ({ darkroomId, hold: actionId, bottleId, managerId }) => [
      { darkroomId, actionId, flags: [] },
      [
        {
          ...{ darkroomId, actionId, ordinal: 0, format: '135-36', count: 1 },
          ...{ filmClass: 'conventional', ownerMembershipId: managerId },
        },
      ],
      [
        {
          ...{ darkroomId, actionId, bottleId, material: 'film', flags: [] },
          ...{ nominalE4: 10_000, factorE4: 10_000, countedE4: 10_000, takenUl: 0 },
        },
      ],
    ],
    insertGuests: ({ darkroomId, newId: id }) => [[{ darkroomId, id, name: 'Guest', reach: 'the street' }]],
    load: (i) => [i.darkroomId, i.load],
    film: (i) => [i.darkroomId, i.load],
    steps: (i) => [i.darkroomId, i.load],
    insertDecision: ({ darkroomId, hold: actionId, flaggedLoad: loadActionId }) => [
      { darkroomId, actionId, loadActionId, decision: 'accept', reason: 'tested' },
    ],
    isDecided: (i) => [i.darkroomId, i.heldLoad],
    decidedLoad: (i) => [i.darkroomId, i.decision],
  }),
  callsOf(MixesRepository)(
    {
      insert: ({ darkroomId, hold: actionId, bottleId, lotId, partId, openedPackId }) => [
        {
          ...{ darkroomId, actionId, bottleId, volumeUl: 1_000 },
          ...{ containerSizeUl: 1_000, containerKind: 'bottle' },
        },
        [{ darkroomId, actionId, ordinal: 0, lotId, packPartId: partId, openedPackId, volumeUl: 200 }],
      ],
      bottlesOf: (i) => [i.darkroomId, i.childMix],
      leaning: (i) => [i.darkroomId, i.bottleId],
    },
    {
      inner: {
        standing: (i) => [
          loadSteps,
          and(eq(loadSteps.darkroomId, i.darkroomId), eq(loadSteps.bottleId, i.bottleId)),
        ],
      },
    },
  ),
  callsOf(LogRepository)({
    page: (i) => [i.darkroomId, null, 50],
    ofBottle: (i) => [i.darkroomId, i.bottleId],
    bottleIdsOf: (i) => [i.darkroomId, i.mix],
    mixes: (i) => [i.darkroomId, [i.mix]],
    film: (i) => [i.darkroomId, [i.load]],
    steps: (i) => [i.darkroomId, [i.load]],
    holds: (i) => [i.darkroomId, [i.hold]],
    discards: (i) => [i.darkroomId, [i.discard]],
    deliveries: (i) => [i.darkroomId, [i.receipt]],
    decisions: (i) => [i.darkroomId, [i.decision]],
    settingChanges: (i) => [i.darkroomId, [i.setting]],
    orderChanges: (i) => [i.darkroomId, [i.draft]],
    voids: (i) => [i.darkroomId, [i.void]],
  }),
];
