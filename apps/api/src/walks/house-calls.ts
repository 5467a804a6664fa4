import { EventsRepository } from '../features/alerts/events.repository.js';
import { FactsRepository } from '../features/alerts/facts.repository.js';
import { SweepRepository } from '../features/alerts/sweep.repository.js';
import { WarningMailsRepository } from '../features/alerts/warning-mails.repository.js';
import { DarkroomsRepository } from '../features/darkrooms/darkrooms.repository.js';
import { HOUSE_RULES } from '../features/darkrooms/house-rules.js';
import { PeopleRepository } from '../features/people/people.repository.js';
import { SignInRepository } from '../features/sign-in/sign-in.repository.js';
import { AddressesRepository } from '../platform/auth/addresses.repository.js';
import { SessionsRepository } from '../platform/auth/sessions.repository.js';
import { HouseRepository } from '../platform/house/house.repository.js';
import { ActionsRepository } from '../platform/ledger/actions.repository.js';
import { MailsRepository } from '../platform/mail/mails.repository.js';
import { AT } from './bottle-calls.js';
import { callsOf, type RepositoryCalls } from './repository-calls.js';

const NO_HASH = '0'.repeat(64);
const words = { subject: 'other words', body: 'other words' };

const alerts: readonly RepositoryCalls[] = [
  callsOf(EventsRepository)(
    {
      lockPacks: (i) => [i.darkroomId, [i.packId]],
      lock: (i) => [i.darkroomId, [i.flaggedLoad]],
      open: ({ darkroomId, newId: id, bottleId }) => [
        [{ darkroomId, id, kind: 'test-due', bottleId, crossing: 1, openedAt: AT }],
      ],
      reopen: (i) => [i.darkroomId, [i.endedEventId]],
      end: (i) => [i.darkroomId, [i.eventId], AT, 'action'],
      told: (i) => [i.darkroomId, [i.eventId]],
      allOpen: (i) => [i.darkroomId],
    },
    { inner: { set: (i) => [i.darkroomId, [i.eventId], { endedAt: AT, endedBy: 'action' }] } },
  ),
  callsOf(FactsRepository)({
    read: (i) => [
      i.darkroomId,
      { bottleIds: [i.bottleId], packIds: [i.packId], loadActionIds: [i.flaggedLoad] },
    ],
  }),
  callsOf(WarningMailsRepository)({
    note: (i) => [i.darkroomId, [{ eventId: i.eventId, membershipId: i.memberId, mailId: i.leasedMailId }]],
    withdraw: (i) => [i.darkroomId, [i.waitingMailId], 'the condition had ended'],
    reword: (i) => [i.darkroomId, [i.waitingMailId], words],
    wake: (i) => [i.darkroomId, [i.withdrawnMailId], { ...words, dueAt: AT }],
  }),
  callsOf(SweepRepository)(
    {
      claim: () => [AT],
      lockDueBottles: (i) => [i.darkroomId, AT],
      writeNextLooks: (i) => [i.darkroomId, [{ id: i.bottleId, nextLookAt: null }]],
      dueMails: (i) => [i.darkroomId, AT],
      lookAgain: (i) => [i.darkroomId, AT],
    },
    { outside: ['claim'] },
  ),
];

const people: readonly RepositoryCalls[] = [
  callsOf(DarkroomsRepository)(
    {
      settings: (i) => [i.darkroomId],
      add: (i) => [
        { id: i.newId, shortName: 'basement', name: 'Basement', zone: 'Europe/Vienna', createdAt: AT },
      ],
      addSettings: ({ darkroomId }) => [{ darkroomId, ...HOUSE_RULES }],
      addMembership: ({ darkroomId, newId: id }) => [
        { darkroomId, id, role: 'member', displayName: 'New', joinedAt: AT },
      ],
    },
    { outside: ['add'] },
  ),
  callsOf(AddressesRepository)({
    withRoles: (i) => [i.darkroomId, ['technician', 'manager']],
    ofMember: (i) => [i.darkroomId, i.managerId],
  }),
  callsOf(PeopleRepository)({ current: (i) => [i.darkroomId] }),
  callsOf(SignInRepository)({ ownDarkrooms: (i) => [i.personId] }),
  callsOf(HouseRepository)({ read: (i) => [i.darkroomId] }),
  callsOf(SessionsRepository)(
    {
      personByEmail: () => ['nobody@darkroom.example'],
      person: (i) => [i.personId],
      addSession: (i) => [{ id: i.newId, personId: i.personId, now: AT }],
      addToken: (i) => [{ hash: NO_HASH, sessionId: i.newId, createdAt: AT }],
      aliveSession: (i) => [i.newId, i.personId, AT],
      lockByToken: () => [NO_HASH, AT],
      token: () => [NO_HASH],
      use: (i) => [{ hash: NO_HASH, predecessorHash: null, sessionId: i.newId }, AT],
      end: (i) => [i.newId, 'signed-out', AT],
      sessionOfToken: () => [NO_HASH],
    },
    {
      outside: [
        ...(['personByEmail', 'person', 'addSession', 'addToken', 'aliveSession'] as const),
        ...(['lockByToken', 'token', 'use', 'end', 'sessionOfToken'] as const),
      ],
    },
  ),
];

const ledger: readonly RepositoryCalls[] = [
  callsOf(ActionsRepository)({
    find: (i) => [i.darkroomId, i.load],
    insert: ({ darkroomId, newId: id, managerId: membershipId }) => [
      {
        ...{ darkroomId, id, kind: 'load', v: 1, happenedAt: AT, happenedOn: '2031-03-01', recordedAt: AT },
        ...{ membershipId, requestHash: NO_HASH, queued: false },
      },
    ],
    insertVoid: ({ darkroomId, hold: actionId, load: voidedActionId }) => [
      { darkroomId, actionId, voidedActionId },
    ],
    names: (i) => [i.darkroomId, [i.hold]],
    isVoided: (i) => [i.darkroomId, i.voidedLoad],
    voidedBy: (i) => [i.darkroomId, i.void],
    withPeople: (i) => [i.darkroomId, [i.voidedLoad]],
  }),
  callsOf(MailsRepository)(
    {
      takeDue: (i) => [{ darkroomId: i.darkroomId, mailId: i.waitingMailId }, AT],
      waitsUntil: (i) => [{ darkroomId: i.darkroomId, mailId: i.waitingMailId }],
      whyNot: (i) => [{ darkroomId: i.darkroomId, mailId: i.waitingMailId }],
      orderState: (i) => [{ darkroomId: i.darkroomId, mailId: i.leasedMailId }],
      withdraw: (i) => [{ darkroomId: i.darkroomId, mailId: i.waitingMailId }, 'the condition had ended'],
      lease: (i) => [
        { darkroomId: i.darkroomId, mailId: i.waitingMailId },
        { leaseId: i.newId, leaseUntil: AT },
      ],
      settle: (i) => [
        { darkroomId: i.darkroomId, mailId: i.leasedMailId },
        i.leaseId,
        { state: 'sent', sentAt: AT },
      ],
    },
    { absent: { whyNot: 'the condition had ended' } },
  ),
];

export const aboutHouse: readonly RepositoryCalls[] = [...alerts, ...people, ...ledger];
