import { check, foreignKey, index, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { actions } from './actions.js';
import { bottles } from './bottles.js';
import { darkroomId, oneOf, ownDarkroomOnly } from './columns.js';

const holdChanges = ['hold', 'release'] as const;

/** A bottle taken out of use by a person with a reason, or let back in by a technician. */
export const holds = pgTable(
  'holds',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    bottleId: uuid('bottle_id').notNull(),
    change: text('change', { enum: holdChanges }).notNull(),
    reason: text('reason').notNull(),
  },
  (t) => [
    primaryKey({ name: 'holds_pk', columns: [t.darkroomId, t.actionId, t.bottleId] }),
    foreignKey({
      name: 'holds_action_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    foreignKey({
      name: 'holds_bottle_fk',
      columns: [t.darkroomId, t.bottleId],
      foreignColumns: [bottles.darkroomId, bottles.id],
    }),
    index('holds_by_bottle').on(t.darkroomId, t.bottleId),
    check('holds_change', oneOf('change', holdChanges)),
    ownDarkroomOnly('holds'),
  ],
);

/** A bottle was emptied, and by which waste route. */
export const discards = pgTable(
  'discards',
  {
    darkroomId: darkroomId(),
    actionId: uuid('action_id').notNull(),
    bottleId: uuid('bottle_id').notNull(),
    wasteRoute: text('waste_route').notNull(),
    note: text('note'),
  },
  (t) => [
    primaryKey({ name: 'discards_pk', columns: [t.darkroomId, t.actionId, t.bottleId] }),
    foreignKey({
      name: 'discards_action_fk',
      columns: [t.darkroomId, t.actionId],
      foreignColumns: [actions.darkroomId, actions.id],
    }),
    foreignKey({
      name: 'discards_bottle_fk',
      columns: [t.darkroomId, t.bottleId],
      foreignColumns: [bottles.darkroomId, bottles.id],
    }),
    index('discards_by_bottle').on(t.darkroomId, t.bottleId),
    ownDarkroomOnly('discards'),
  ],
);
