import {
  apply,
  assess,
  defaultThresholds,
  fold,
  localDate,
  type BottleFact,
  type ChemistryDocument,
  type StepFlag,
} from '@wetside/chemistry';
import {
  actions,
  bottles,
  bottleTotals,
  chemistries,
  chemistryVersions,
  holds,
  loadFilm,
  loads,
  loadSteps,
  mixes,
  voids,
  type ActionKind,
} from '@wetside/db';
import { and, eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import type { Tx } from '../platform/database/database.js';

/** Who acts, where and when, for rows that a test writes without going through the program's own actions. */
export interface Hand {
  darkroomId: string;
  membershipId: string;
  zone: string;
  now: Date;
}

/** A bottle that a test keeps the history of. */
export interface MadeBottle {
  id: string;
  code: string;
  document: ChemistryDocument;
  facts: BottleFact[];
}

const NO_HASH = '0'.repeat(64);

async function act(tx: Tx, { darkroomId, membershipId, zone, now }: Hand, kind: ActionKind) {
  const id = v7();
  const happenedOn = localDate(now.toISOString(), zone);
  const [row] = await tx
    .insert(actions)
    .values({
      darkroomId,
      id,
      kind,
      v: 1,
      happenedAt: now,
      happenedOn,
      recordedAt: now,
      membershipId,
      requestHash: NO_HASH,
      queued: false,
    })
    .returning({ seq: actions.seq });
  return { actionId: id, seq: row?.seq ?? 0, happenedAt: now.toISOString(), happenedOn };
}

async function write(tx: Tx, hand: Hand, bottle: MadeBottle): Promise<void> {
  const totals = fold(bottle.document, bottle.facts);
  const now = hand.now.toISOString();
  const today = localDate(now, hand.zone);
  const context = { now, today, zone: hand.zone, smallestTankUl: null, thresholds: defaultThresholds };
  const nextLookAt = totals && assess(bottle.document, totals, context).nextLookAt;
  await tx
    .update(bottleTotals)
    .set({
      totals,
      inUse: totals !== null && totals.discardedAt === null,
      nextLookAt: nextLookAt ? new Date(nextLookAt) : null,
    })
    .where(and(eq(bottleTotals.darkroomId, hand.darkroomId), eq(bottleTotals.bottleId, bottle.id)));
}

/** A full bottle of that chemistry, mixed now. */
export async function makeBottle(
  tx: Tx,
  hand: Hand,
  { code, document, volumeUl }: { code: string; document: ChemistryDocument; volumeUl: number },
): Promise<MadeBottle> {
  const { darkroomId, now } = hand;
  const [chemistryId, versionId, id] = [v7(), v7(), v7()];
  await tx.insert(chemistries).values({ darkroomId, id: chemistryId, createdAt: now });
  await tx
    .insert(chemistryVersions)
    .values({ darkroomId, id: versionId, chemistryId, number: 1, document, createdAt: now });
  const base = await act(tx, hand, 'mix');
  const container = { sizeUl: volumeUl, kind: 'bottle' as const };
  const fact: BottleFact = { ...base, kind: 'mix', volumeUl, container, material: 'film' };
  await tx.insert(bottles).values({
    darkroomId,
    id,
    code,
    chemistryVersionId: versionId,
    material: 'film',
    madeByActionId: base.actionId,
  });
  await tx.insert(mixes).values({
    darkroomId,
    actionId: base.actionId,
    bottleId: id,
    volumeUl,
    containerSizeUl: volumeUl,
    containerKind: 'bottle',
  });
  await tx
    .insert(bottleTotals)
    .values({ darkroomId, bottleId: id, totals: apply(document, null, fact), inUse: true, volumeUl });
  const bottle = { id, code, document, facts: [fact] };
  await write(tx, hand, bottle);
  return bottle;
}

/** So many rolls of 135-36 through a bottle. @returns the load's action */
export async function makeLoad(
  tx: Tx,
  hand: Hand,
  bottle: MadeBottle,
  rolls: number,
  flags: StepFlag[] = [],
): Promise<string> {
  const { darkroomId, membershipId } = hand;
  const base = await act(tx, hand, 'load');
  const { actionId } = base;
  const countedE4 = rolls * 10_000;
  await tx.insert(loads).values({ darkroomId, actionId, flags: [] });
  await tx.insert(loadFilm).values({
    darkroomId,
    actionId,
    ordinal: 0,
    format: '135-36',
    count: rolls,
    filmClass: 'conventional',
    ownerMembershipId: membershipId,
  });
  await tx.insert(loadSteps).values({
    darkroomId,
    actionId,
    bottleId: bottle.id,
    material: 'film',
    nominalE4: countedE4,
    factorE4: 10_000,
    countedE4,
    takenUl: 0,
    flags,
  });
  await add(tx, hand, bottle, {
    ...base,
    kind: 'load',
    charges: [{ material: 'film', countedE4, takenUl: 0 }],
  });
  return actionId;
}

export async function makeHold(
  tx: Tx,
  hand: Hand,
  bottle: MadeBottle,
  change: 'hold' | 'release',
  reason: string,
): Promise<string> {
  const base = await act(tx, hand, change);
  await tx
    .insert(holds)
    .values({ darkroomId: hand.darkroomId, actionId: base.actionId, bottleId: bottle.id, change, reason });
  await add(
    tx,
    hand,
    bottle,
    change === 'hold' ? { ...base, kind: 'hold', reason } : { ...base, kind: 'release' },
  );
  return base.actionId;
}

/** Takes back one of the bottle's actions. */
export async function makeVoid(
  tx: Tx,
  hand: Hand,
  bottle: MadeBottle,
  voidedActionId: string,
): Promise<void> {
  const { actionId } = await act(tx, hand, 'void');
  await tx.insert(voids).values({ darkroomId: hand.darkroomId, actionId, voidedActionId });
  bottle.facts = bottle.facts.map((fact) =>
    fact.actionId === voidedActionId ? { ...fact, voided: true } : fact,
  );
  await write(tx, hand, bottle);
}

async function add(tx: Tx, hand: Hand, bottle: MadeBottle, fact: BottleFact): Promise<void> {
  bottle.facts = [...bottle.facts, fact];
  await write(tx, hand, bottle);
}
