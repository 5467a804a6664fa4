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
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { actions } from './actions.js';
import { bottles, materials } from './bottles.js';
import { darkroomId, instant, oneOf, ownDarkroomOnly } from './columns.js';

/** What a film goes through in order. */
export const lines = pgTable(
  'lines',
  { darkroomId: darkroomId(), id: uuid('id').notNull(), createdAt: instant('created_at').notNull() },
  (t) => [primaryKey({ name: 'lines_pk', columns: [t.darkroomId, t.id] }), ownDarkroomOnly('lines')],
);

/** A step keeps its id through all versions of its line; placements name that id. */
export const steps = pgTable(
  'steps',
  { darkroomId: darkroomId(), id: uuid('id').notNull(), lineId: uuid('line_id').notNull() },
  (t) => [
    primaryKey({ name: 'steps_pk', columns: [t.darkroomId, t.id] }),
    foreignKey({
      name: 'steps_line_fk',
      columns: [t.darkroomId, t.lineId],
      foreignColumns: [lines.darkroomId, lines.id],
    }),
    ownDarkroomOnly('steps'),
  ],
);

export const lineVersions = pgTable(
  'line_versions',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    lineId: uuid('line_id').notNull(),
    number: integer('number').notNull(),
    name: text('name').notNull(),
    process: text('process').notNull(),
    createdAt: instant('created_at').notNull(),
  },
  (t) => [
    primaryKey({ name: 'line_versions_pk', columns: [t.darkroomId, t.id] }),
    unique('line_versions_number_uq').on(t.darkroomId, t.lineId, t.number),
    foreignKey({
      name: 'line_versions_line_fk',
      columns: [t.darkroomId, t.lineId],
      foreignColumns: [lines.darkroomId, lines.id],
    }),
    check('line_versions_number', sql`${t.number} > 0`),
    ownDarkroomOnly('line_versions'),
  ],
);

export const stepKinds = ['bottle', 'water'] as const;

/** A bottle step by role and material, or a water step with a time or a number of changes, never ticked. */
export const lineSteps = pgTable(
  'line_steps',
  {
    darkroomId: darkroomId(),
    lineVersionId: uuid('line_version_id').notNull(),
    stepId: uuid('step_id').notNull(),
    position: integer('position').notNull(),
    kind: text('kind', { enum: stepKinds }).notNull(),
    /** Its name on a water step ("Rinse"), the role on a bottle step ("fixer"). */
    name: text('name').notNull(),
    material: text('material', { enum: materials }),
    seconds: integer('seconds'),
    changes: integer('changes'),
  },
  (t) => [
    primaryKey({ name: 'line_steps_pk', columns: [t.darkroomId, t.lineVersionId, t.stepId] }),
    unique('line_steps_position_uq').on(t.darkroomId, t.lineVersionId, t.position),
    foreignKey({
      name: 'line_steps_version_fk',
      columns: [t.darkroomId, t.lineVersionId],
      foreignColumns: [lineVersions.darkroomId, lineVersions.id],
    }),
    foreignKey({
      name: 'line_steps_step_fk',
      columns: [t.darkroomId, t.stepId],
      foreignColumns: [steps.darkroomId, steps.id],
    }),
    check('line_steps_kind', oneOf('kind', stepKinds)),
    check('line_steps_material', oneOf('material', materials)),
    check('line_steps_numbers', sql`${t.seconds} > 0 and ${t.changes} > 0 and ${t.position} >= 0`),
    ownDarkroomOnly('line_steps'),
  ],
);

/** Which bottle stands at a step now and before. One bottle a step at a time; a bottle may stand in several lines. */
export const placements = pgTable(
  'placements',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    stepId: uuid('step_id').notNull(),
    bottleId: uuid('bottle_id').notNull(),
    fromAt: instant('from_at').notNull(),
    toAt: instant('to_at'),
  },
  (t) => [
    primaryKey({ name: 'placements_pk', columns: [t.darkroomId, t.id] }),
    uniqueIndex('placements_now_uq')
      .on(t.darkroomId, t.stepId)
      .where(sql`to_at is null`),
    index('placements_by_bottle').on(t.darkroomId, t.bottleId),
    foreignKey({
      name: 'placements_step_fk',
      columns: [t.darkroomId, t.stepId],
      foreignColumns: [steps.darkroomId, steps.id],
    }),
    foreignKey({
      name: 'placements_bottle_fk',
      columns: [t.darkroomId, t.bottleId],
      foreignColumns: [bottles.darkroomId, bottles.id],
    }),
    check('placements_times', sql`${t.toAt} >= ${t.fromAt}`),
    ownDarkroomOnly('placements'),
  ],
);

/** An action put this bottle at that step (or emptied the step: null). Placements follow from these. */
export const placementChanges = pgTable(
  'placement_changes',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    stepId: uuid('step_id').notNull(),
    bottleId: uuid('bottle_id'),
  },
  (t) => [
    primaryKey({ name: 'placement_changes_pk', columns: [t.darkroomId, t.actionId, t.stepId] }),
    foreignKey({
      name: 'placement_changes_action_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    foreignKey({
      name: 'placement_changes_step_fk',
      columns: [t.darkroomId, t.stepId],
      foreignColumns: [steps.darkroomId, steps.id],
    }),
    foreignKey({
      name: 'placement_changes_bottle_fk',
      columns: [t.darkroomId, t.bottleId],
      foreignColumns: [bottles.darkroomId, bottles.id],
    }),
    ownDarkroomOnly('placement_changes'),
  ],
);
