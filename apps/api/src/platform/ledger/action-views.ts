import { Injectable } from '@nestjs/common';
import type { Me } from '../auth/me.js';
import { Clock } from '../clock/clock.js';
import type { Tx } from '../database/database.js';
import { problem } from '../errors/problem.js';
import { toActionView, type ActionView } from './action.view.js';
import { ActionsRepository } from './actions.repository.js';

/** Actions as they are told to the caller. */
@Injectable()
export class ActionViews {
  constructor(
    private readonly repository: ActionsRepository,
    private readonly clock: Clock,
  ) {}

  /** @throws Problem 'not-found' */
  async one(tx: Tx, me: Me, id: string): Promise<ActionView> {
    const [row] = await this.repository.withPeople(tx, me.darkroomId, [id]);
    if (!row) throw problem('not-found');
    return toActionView(row, me, this.clock.now());
  }

  async many(tx: Tx, me: Me, ids: readonly string[]): Promise<Map<string, ActionView>> {
    const now = this.clock.now();
    const rows = await this.repository.withPeople(tx, me.darkroomId, ids);
    return new Map(rows.map((row) => [row.action.id, toActionView(row, me, now)]));
  }
}
