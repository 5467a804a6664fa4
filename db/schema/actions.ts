import { sql } from 'drizzle-orm';
import {
  bigint,
  boolean,
  check,
  date,
  foreignKey,
  index,
  integer,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { darkroomId, instant, oneOf, ownDarkroomOnly } from './columns.js';
import { memberships } from './people.js';

export const actionKinds = [
  'mix',
  'load',
  'hold',
  'release',
  'discard',
  'receipt',
  'decision',
  'setting-change',
  'order-draft',
  'order-send',
  'order-cancel',
  'void',
] as const;
export type ActionKind = (typeof actionKinds)[number];

/**
 * One row for each thing that somebody did; only ever added. The client makes the id, the server the order:
 * (happened_at, seq). What it was about hangs off (darkroom_id, action_id) in the tables of details.
 */
export const actions = pgTable(
  'actions',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    kind: text('kind', { enum: actionKinds }).notNull(),
    /** The version of the content's shape; every version ever shipped stays accepted. */
    v: integer('v').notNull(),
    happenedAt: instant('happened_at').notNull(),
    /** The darkroom's local date of happenedAt as it was reckoned then: changing the zone moves no past date. */
    happenedOn: date('happened_on', { mode: 'string' }).notNull(),
    recordedAt: instant('recorded_at').notNull(),
    seq: bigint('seq', { mode: 'number' }).notNull().generatedAlwaysAsIdentity(),
    membershipId: uuid('membership_id').notNull(),
    /** SHA-256 (hex) of the content as it was sent, keys sorted. */
    requestHash: text('request_hash').notNull(),
    /** It waited on a phone before it was sent. */
    queued: boolean('queued').notNull(),
  },
  (t) => [
    primaryKey({ name: 'actions_pk', columns: [t.darkroomId, t.id] }),
    foreignKey({
      name: 'actions_membership_fk',
      columns: [t.darkroomId, t.membershipId],
      foreignColumns: [memberships.darkroomId, memberships.id],
    }),
    index('actions_newest').on(t.darkroomId, t.happenedAt.desc(), t.seq.desc()),
    index('actions_by_membership').on(t.darkroomId, t.membershipId, t.seq.desc()),
    check('actions_kind', oneOf('kind', actionKinds)),
    check('actions_v', sql`${t.v} > 0`),
    check('actions_request_hash', sql`${t.requestHash} ~ '^[0-9a-f]{64}$'`),
    ownDarkroomOnly('actions'),
  ],
);

/** A void names an action, once; both stay in the log. */
export const voids = pgTable(
  'voids',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    voidedActionId: uuid('voided_action_id').notNull(),
    reason: text('reason'),
  },
  (t) => [
    primaryKey({ name: 'voids_pk', columns: [t.darkroomId, t.actionId] }),
    unique('voids_voided_uq').on(t.darkroomId, t.voidedActionId),
    foreignKey({
      name: 'voids_action_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    foreignKey({
      name: 'voids_voided_fk',
      columns: [t.darkroomId, t.voidedActionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    check('voids_not_itself', sql`${t.actionId} <> ${t.voidedActionId}`),
    ownDarkroomOnly('voids'),
  ],
);

export const settingSubjects = ['darkroom', 'pack', 'supplier', 'supplier-pack'] as const;

/** A rule of the house, or a fact about a supplier, changed from one value to another. */
export const settingChanges = pgTable(
  'setting_changes',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    subject: text('subject', { enum: settingSubjects }).notNull(),
    /** The pack, supplier or supplier's pack; the darkroom's own id for a rule of the house. */
    subjectId: uuid('subject_id').notNull(),
    field: text('field').notNull(),
    oldValue: text('old_value'),
    newValue: text('new_value'),
  },
  (t) => [
    primaryKey({ name: 'setting_changes_pk', columns: [t.darkroomId, t.actionId, t.field] }),
    foreignKey({
      name: 'setting_changes_action_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    check('setting_changes_subject', oneOf('subject', settingSubjects)),
    ownDarkroomOnly('setting_changes'),
  ],
);
