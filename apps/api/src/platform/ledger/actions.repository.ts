import { Injectable } from '@nestjs/common';
import { actions, memberships, voids } from '@wetside/db';
import { and, eq, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { Tx } from '../database/database.js';
import { hotQuery, isAnyOf } from '../database/hot-query.js';

export type ActionRow = typeof actions.$inferSelect;
export type NewAction = typeof actions.$inferInsert;

export interface ActionWithPeople {
  action: ActionRow;
  displayName: string;
  voidedBy: { actionId: string; at: Date; displayName: string; reason: string | null } | null;
}

const voidActions = alias(actions, 'void_actions');
const voiders = alias(memberships, 'voiders');

const findAction = hotQuery('find_action', (db) =>
  db
    .select()
    .from(actions)
    .where(and(eq(actions.darkroomId, sql.placeholder('darkroomId')), eq(actions.id, sql.placeholder('id')))),
);

const actionsWithPeople = hotQuery('actions_with_people', (db) =>
  db
    .select({
      action: actions,
      displayName: memberships.displayName,
      voidActionId: voids.actionId,
      voidReason: voids.reason,
      voidedAt: voidActions.recordedAt,
      voiderName: voiders.displayName,
    })
    .from(actions)
    .innerJoin(
      memberships,
      and(eq(memberships.darkroomId, actions.darkroomId), eq(memberships.id, actions.membershipId)),
    )
    .leftJoin(voids, and(eq(voids.darkroomId, actions.darkroomId), eq(voids.voidedActionId, actions.id)))
    .leftJoin(
      voidActions,
      and(eq(voidActions.darkroomId, voids.darkroomId), eq(voidActions.id, voids.actionId)),
    )
    .leftJoin(
      voiders,
      and(eq(voiders.darkroomId, voidActions.darkroomId), eq(voiders.id, voidActions.membershipId)),
    )
    .where(and(eq(actions.darkroomId, sql.placeholder('darkroomId')), isAnyOf(actions.id, 'ids'))),
);

const namesOf = hotQuery('names_of_actions', (db) =>
  db
    .select({ id: actions.id, name: memberships.displayName })
    .from(actions)
    .innerJoin(
      memberships,
      and(eq(memberships.darkroomId, actions.darkroomId), eq(memberships.id, actions.membershipId)),
    )
    .where(and(eq(actions.darkroomId, sql.placeholder('darkroomId')), isAnyOf(actions.id, 'ids'))),
);

@Injectable()
export class ActionsRepository {
  async find(tx: Tx, darkroomId: string, id: string): Promise<ActionRow | null> {
    const [row] = await findAction(tx, { darkroomId, id });
    return row ?? null;
  }

  /** Who did these actions, by the actions' ids. */
  async names(tx: Tx, darkroomId: string, ids: readonly string[]): Promise<Map<string, string>> {
    if (ids.length === 0) return new Map();
    const rows = await namesOf(tx, { darkroomId, ids: [...ids] });
    return new Map(rows.map(({ id, name }) => [id, name]));
  }

  /** @returns the server's place in the order */
  async insert(tx: Tx, action: NewAction): Promise<number> {
    const [row] = await tx
      .insert(actions)
      .values(action)
      .returning({ seq: actions.seq })
      .prepare('insert_action')
      .execute();
    if (!row) throw new Error('An inserted action came back without its place.');
    return row.seq;
  }

  async insertVoid(tx: Tx, row: typeof voids.$inferInsert): Promise<void> {
    await tx.insert(voids).values(row);
  }

  async isVoided(tx: Tx, darkroomId: string, id: string): Promise<boolean> {
    const found = await tx
      .select({ id: voids.actionId })
      .from(voids)
      .where(and(eq(voids.darkroomId, darkroomId), eq(voids.voidedActionId, id)));
    return found.length > 0;
  }

  /** What a void took back. */
  async voidedBy(tx: Tx, darkroomId: string, voidActionId: string): Promise<string | null> {
    const [row] = await tx
      .select({ id: voids.voidedActionId })
      .from(voids)
      .where(and(eq(voids.darkroomId, darkroomId), eq(voids.actionId, voidActionId)));
    return row?.id ?? null;
  }

  /** These actions with who did them and, where it was so, who took them back. In no order. */
  async withPeople(tx: Tx, darkroomId: string, ids: readonly string[]): Promise<ActionWithPeople[]> {
    if (ids.length === 0) return [];
    const rows = await actionsWithPeople(tx, { darkroomId, ids: [...ids] });
    return rows.map((row) => ({
      action: row.action,
      displayName: row.displayName,
      voidedBy:
        row.voidActionId && row.voidedAt && row.voiderName !== null
          ? {
              actionId: row.voidActionId,
              at: row.voidedAt,
              displayName: row.voiderName,
              reason: row.voidReason,
            }
          : null,
    }));
  }
}
