import { sql } from 'drizzle-orm';
import {
  check,
  foreignKey,
  index,
  integer,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { bottles } from './bottles.js';
import { darkroomId, instant, oneOf, ownDarkroomOnly } from './columns.js';
import { loads } from './loads.js';
import { orders } from './orders.js';
import { memberships } from './people.js';
import { packs } from './stock.js';

export const eventKinds = [
  'low',
  'near-date',
  'spent',
  'past-date',
  'on-hold',
  'load-to-decide',
  'kit-near-expiry',
  'kit-past-expiry',
  'reorder-point',
  'none-on-shelf',
  'test-due',
] as const;
export type EventKind = (typeof eventKinds)[number];

/** How a condition ended: by something done, or by taking something back (a void, a cancelled order, a changed rule). */
export const eventEndings = ['action', 'retraction', 'time'] as const;

/** A condition that somebody must know of: one row for each time it is crossed. */
export const events = pgTable(
  'events',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    kind: text('kind', { enum: eventKinds }).notNull(),
    bottleId: uuid('bottle_id'),
    packId: uuid('pack_id'),
    loadActionId: uuid('load_action_id'),
    subjectId: uuid('subject_id')
      .notNull()
      .generatedAlwaysAs(sql`coalesce(bottle_id, pack_id, load_action_id)`),
    /** Counts the crossings of this subject and kind from 1. */
    crossing: integer('crossing').notNull(),
    openedAt: instant('opened_at').notNull(),
    endedAt: instant('ended_at'),
    endedBy: text('ended_by', { enum: eventEndings }),
  },
  (t) => [
    primaryKey({ name: 'events_pk', columns: [t.darkroomId, t.id] }),
    unique('events_crossing_uq').on(t.darkroomId, t.subjectId, t.kind, t.crossing),
    foreignKey({
      name: 'events_bottle_fk',
      columns: [t.darkroomId, t.bottleId],
      foreignColumns: [bottles.darkroomId, bottles.id],
    }),
    foreignKey({
      name: 'events_pack_fk',
      columns: [t.darkroomId, t.packId],
      foreignColumns: [packs.darkroomId, packs.id],
    }),
    foreignKey({
      name: 'events_load_fk',
      columns: [t.darkroomId, t.loadActionId],
      foreignColumns: [loads.darkroomId, loads.actionId],
    }),
    index('events_open')
      .on(t.darkroomId, t.openedAt)
      .where(sql`ended_at is null`),
    check('events_kind', oneOf('kind', eventKinds)),
    check('events_ended_by', oneOf('ended_by', eventEndings)),
    check('events_subject', sql`num_nonnulls(${t.bottleId}, ${t.packId}, ${t.loadActionId}) = 1`),
    check('events_ended', sql`(${t.endedAt} is null) = (${t.endedBy} is null)`),
    ownDarkroomOnly('events'),
  ],
);

export const mailKinds = ['warning', 'order', 'order-cancelled'] as const;
export const mailStates = ['waiting', 'leased', 'sent', 'failed', 'withdrawn'] as const;

/** A mail and how far it has come. This row is the truth; the queue only says "look at it". */
export const mails = pgTable(
  'mails',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    kind: text('kind', { enum: mailKinds }).notNull(),
    membershipId: uuid('membership_id'),
    orderId: uuid('order_id'),
    toAddress: text('to_address').notNull(),
    replyTo: text('reply_to'),
    subject: text('subject').notNull(),
    body: text('body').notNull(),
    messageId: text('message_id').notNull(),
    dedupeKey: text('dedupe_key').notNull(),
    state: text('state', { enum: mailStates }).notNull(),
    /** Not before this: grace at first, back-off after a failure. */
    dueAt: instant('due_at').notNull(),
    attempts: integer('attempts').notNull(),
    /** Tries of which nobody knows how they ended: the mail may have arrived by each of them too. */
    unclearTries: integer('unclear_tries').notNull().default(0),
    leaseUntil: instant('lease_until'),
    leaseId: uuid('lease_id'),
    lastAnswer: text('last_answer'),
    createdAt: instant('created_at').notNull(),
    sentAt: instant('sent_at'),
    withdrawnBecause: text('withdrawn_because'),
  },
  (t) => [
    primaryKey({ name: 'mails_pk', columns: [t.darkroomId, t.id] }),
    unique('mails_dedupe_uq').on(t.darkroomId, t.dedupeKey),
    foreignKey({
      name: 'mails_membership_fk',
      columns: [t.darkroomId, t.membershipId],
      foreignColumns: [memberships.darkroomId, memberships.id],
    }),
    foreignKey({
      name: 'mails_order_fk',
      columns: [t.darkroomId, t.orderId],
      foreignColumns: [orders.darkroomId, orders.id],
    }),
    index('mails_due')
      .on(t.darkroomId, t.dueAt)
      .where(sql`state in ('waiting', 'leased')`),
    check('mails_kind', oneOf('kind', mailKinds)),
    check('mails_state', oneOf('state', mailStates)),
    check(
      'mails_lease',
      sql`(${t.state} = 'leased') = (${t.leaseUntil} is not null and ${t.leaseId} is not null)`,
    ),
    index('mails_by_order').on(t.darkroomId, t.orderId),
    ownDarkroomOnly('mails'),
  ],
);

/** Who was told of an event, and in which mail: once. */
export const notices = pgTable(
  'notices',
  {
    darkroomId: darkroomId(),
    eventId: uuid('event_id').notNull(),
    membershipId: uuid('membership_id').notNull(),
    mailId: uuid('mail_id').notNull(),
  },
  (t) => [
    primaryKey({ name: 'notices_pk', columns: [t.darkroomId, t.eventId, t.membershipId] }),
    foreignKey({
      name: 'notices_event_fk',
      columns: [t.darkroomId, t.eventId],
      foreignColumns: [events.darkroomId, events.id],
    }),
    foreignKey({
      name: 'notices_membership_fk',
      columns: [t.darkroomId, t.membershipId],
      foreignColumns: [memberships.darkroomId, memberships.id],
    }),
    foreignKey({
      name: 'notices_mail_fk',
      columns: [t.darkroomId, t.mailId],
      foreignColumns: [mails.darkroomId, mails.id],
    }),
    index('notices_by_mail').on(t.darkroomId, t.mailId),
    ownDarkroomOnly('notices'),
  ],
);
