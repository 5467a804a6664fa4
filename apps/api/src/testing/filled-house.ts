import { makes, mails, memberships } from '@wetside/db';
import { and, eq, sql } from 'drizzle-orm';
import { v7 } from 'uuid';
import type { Role } from '../platform/auth/roles.js';
import { told, StockHouse } from './stock-house.js';
import type { Browser, TestApp } from './test-app.js';

const ACTIONS = [
  'mix',
  'childMix',
  'otherMix',
  'load',
  'voidedLoad',
  'void',
  'hold',
  'heldLoad',
  'decision',
  'flaggedLoad',
  'release',
  'discard',
  'setting',
  'draft',
] as const;
type ActionName = (typeof ACTIONS)[number];

/** Live rows of a darkroom, by what they are; each value is an id. */
export type Ids = Record<
  | ActionName
  | 'darkroomId'
  | 'personId'
  | 'managerId'
  | 'technicianId'
  | 'memberId'
  | 'guestId'
  | 'chemistryId'
  | 'versionId'
  | 'bottleId'
  | 'discardedId'
  | 'packId'
  | 'partId'
  | 'lotId'
  | 'openedPackId'
  | 'receipt'
  | 'supplierId'
  | 'supplierPackId'
  | 'draftId'
  | 'draftLineId'
  | 'sentOrderId'
  | 'eventId'
  | 'endedEventId'
  | 'waitingMailId'
  | 'leasedMailId'
  | 'leaseId'
  | 'withdrawnMailId'
  | 'newId'
  | 'otherNewId',
  string
>;

/** A darkroom in which everything has happened once, told to the program as its people tell it. */
export class FilledHouse {
  private constructor(
    readonly house: StockHouse,
    readonly member: Browser,
    readonly ids: Ids,
    readonly emails: Readonly<Record<Role, string>>,
  ) {}

  static async open(t: TestApp, shortName: string): Promise<FilledHouse> {
    const house = await StockHouse.open(t, shortName);
    const member = await house.member(`Mira ${shortName}`);
    const actions = Object.fromEntries(ACTIONS.map((name) => [name, v7()])) as Record<ActionName, string>;
    const guestId = v7();
    const bottles = await mixAll(house, actions);
    await putFilmThrough(house, member, bottles.bottleId, guestId, actions);
    const paper = await paperwork(house, actions);
    const found = await lookUp(house, actions.flaggedLoad);
    const ids = { ...actions, guestId, ...bottles, ...paper, ...found, newId: v7(), otherNewId: v7() };
    const emailOf = (name: string) => `${name}.${shortName}@darkroom.example`;
    const emails = { manager: emailOf('ines'), technician: emailOf('tomas'), member: emailOf('mira') };
    return new FilledHouse(house, member, ids, emails);
  }
}

const film = (owner?: object) => [
  { format: '135-36', count: 1, filmClass: 'conventional', ...(owner ? { owner } : {}) },
];

/** A bottle out of a lot, one out of that bottle, and one that is emptied. */
async function mixAll(house: StockHouse, a: Record<ActionName, string>) {
  const { lotId, actionId: receipt } = await house.receive(house.concentrate, 5, { priceMinor: 1150 });
  const made = told('mix', await house.mix({ kind: 'lot', lotId }, 2_000_000, a.mix).expect(201));
  const bottleId = made.bottle.id;
  const chemistryId = await house.t.database.inDarkroom({ darkroomId: house.id }, async (tx) => {
    const version = await tx.query.chemistryVersions.findFirst({
      where: (row, is) => is.and(is.eq(row.darkroomId, house.id), is.eq(row.id, house.version)),
    });
    const id = version?.chemistryId ?? '';
    const made = { darkroomId: house.id, id: v7(), stockChemistryId: id, chemistryId: id, wholeOnly: false };
    await tx.insert(makes).values(made);
    return id;
  });
  await house.mix({ kind: 'stock', bottleId }, 500_000, a.childMix).expect(201);
  const other = told('mix', await house.mix({ kind: 'hand' }, 500_000, a.otherMix).expect(201));
  const discardedId = other.bottle.id;
  const emptied = { bottleId: discardedId, wasteRoute: 'fixer-silver' };
  await house.act(house.technician, 'discards', emptied, a.discard).expect(201);
  return { lotId, receipt, bottleId, chemistryId, versionId: house.version, discardedId };
}

/** Loads: a guest's, one taken back, one through a held bottle and decided on, and one that waits for a decision. */
async function putFilmThrough(
  house: StockHouse,
  member: Browser,
  bottleId: string,
  guestId: string,
  a: Record<ActionName, string>,
): Promise<void> {
  const load = (id: string, more: object = {}) =>
    house.act(member, 'loads', { bottleIds: [bottleId], material: 'film', film: film(), ...more }, id);
  const guest = { id: guestId, name: 'Otto Guest', reach: 'otto@guest.example' };
  await load(a.load, { film: film({ guest }) }).expect(201);
  await load(a.voidedLoad).expect(201);
  await house.act(member, 'voids', { voidedActionId: a.voidedLoad }, a.void).expect(201);
  await house.act(member, 'holds', { bottleId, reason: 'smells wrong' }, a.hold).expect(201);
  await load(a.heldLoad, { reported: true }).expect(201);
  const accepted = { loadActionId: a.heldLoad, decision: 'accept', reason: 'tested since' };
  await house.act(house.technician, 'decisions', accepted, a.decision).expect(201);
  await load(a.flaggedLoad, { reported: true }).expect(201);
  await house.act(house.technician, 'releases', { bottleId, reason: 'clear again' }, a.release).expect(201);
}

/** An order that stays a draft, one that is sent and has come in part, and a supplier who is out of something. */
async function paperwork(house: StockHouse, a: Record<ActionName, string>) {
  const out = {
    subject: 'supplier-pack',
    subjectId: house.soldKit,
    changes: [{ field: 'outUntil', value: '2030-01-01' }],
  };
  await house.act(house.technician, 'setting-changes', out, a.setting).expect(201);
  const sent = await house.draft();
  await house.send(sent.orderId).expect(201);
  await house.receive(house.concentrate, 1).then(({ lotId }) =>
    house
      .act(house.technician, 'receipts', {
        orderId: sent.orderId,
        lines: [
          {
            packId: house.concentrate,
            orderLineId: sent.concentrate,
            lotId,
            lotNumber: '0611',
            expiresOn: '2029-01-12',
            count: 1,
          },
        ],
      })
      .expect(201),
  );
  const draft = await house.draft(2, a.draft);
  return {
    packId: house.concentrate,
    supplierId: house.supplier,
    supplierPackId: house.soldKit,
    sentOrderId: sent.orderId,
    draftId: draft.orderId,
    draftLineId: draft.concentrate,
  };
}

/** Ids that the program made, and mails in each state that a query may ask for. */
async function lookUp(house: StockHouse, flaggedLoad: string) {
  const { id: darkroomId, t } = house;
  const leaseId = v7();
  return t.database.inDarkroom({ darkroomId }, async (tx) => {
    const own = await tx.select().from(memberships).where(eq(memberships.darkroomId, darkroomId));
    const manager = own.find(({ role }) => role === 'manager');
    const opened = await tx.query.openedPacks.findFirst();
    const events = await tx.query.events.findMany();
    const posted = await tx.query.mails.findMany({ orderBy: (row, by) => by.asc(row.id) });
    const noticed = await tx.query.notices.findMany();
    const open = events.find((event) => event.loadActionId === flaggedLoad);
    const waiting = noticed.find(({ eventId }) => eventId === open?.id);
    const [order] = posted.filter(({ kind }) => kind === 'order');
    const lent = { state: 'leased' as const, leaseId, leaseUntil: t.clock.now() };
    const isOrder = and(eq(mails.darkroomId, darkroomId), eq(mails.id, order?.id ?? ''));
    await tx.update(mails).set(lent).where(isOrder);
    const withdrawn = v7();
    await tx.execute(sql`
      insert into mails (darkroom_id, id, kind, to_address, subject, body, message_id, dedupe_key, state, due_at,
        attempts, created_at, withdrawn_because)
      select darkroom_id, ${withdrawn}, kind, to_address, subject, body, ${withdrawn}, ${withdrawn}, 'withdrawn', due_at,
        0, created_at, 'the condition had ended' from mails where darkroom_id = ${darkroomId} and id = ${order?.id ?? ''}`);
    return {
      darkroomId,
      personId: manager?.personId ?? '',
      managerId: manager?.id ?? '',
      memberId: own.find(({ role }) => role === 'member')?.id ?? '',
      technicianId: own.find(({ role }) => role === 'technician')?.id ?? '',
      openedPackId: opened?.id ?? '',
      partId: opened?.packPartId ?? '',
      eventId: open?.id ?? '',
      endedEventId: events.find(({ endedAt }) => endedAt !== null)?.id ?? '',
      waitingMailId: waiting?.mailId ?? '',
      leasedMailId: order?.id ?? '',
      leaseId,
      withdrawnMailId: withdrawn,
    };
  });
}
