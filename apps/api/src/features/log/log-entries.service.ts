import { Injectable } from '@nestjs/common';
import type { ActionKind } from '@wetside/db';
import type { Me } from '../../platform/auth/me.js';
import type { Tx } from '../../platform/database/database.js';
import { isInstant } from '../../platform/dto/time-checks.js';
import { invalid } from '../../platform/errors/problem.js';
import { ActionViews } from '../../platform/ledger/action-views.js';
import { LogRepository, type Place } from './log.repository.js';
import { tellAll } from './log-sentences.js';
import type { LogAnswer, LogEntryView } from './log.view.js';

interface Listed {
  id: string;
  kind: ActionKind;
}

/** Who did what, newest first. */
@Injectable()
export class LogEntries {
  constructor(
    private readonly repository: LogRepository,
    private readonly views: ActionViews,
  ) {}

  async page(tx: Tx, me: Me, cursor: string | undefined, limit: number): Promise<LogAnswer> {
    const rows = await this.repository.page(tx, me.darkroomId, cursor ? placeOf(cursor) : null, limit + 1);
    const shown = rows.slice(0, limit);
    const last = shown.at(-1);
    return {
      entries: await this.entries(tx, me, shown),
      nextCursor: rows.length > limit && last ? cursorOf(last) : null,
    };
  }

  async ofBottle(tx: Tx, me: Me, bottleId: string): Promise<LogEntryView[]> {
    return this.entries(tx, me, await this.repository.ofBottle(tx, me.darkroomId, bottleId));
  }

  bottleIdsOf(tx: Tx, darkroomId: string, actionId: string): Promise<string[]> {
    return this.repository.bottleIdsOf(tx, darkroomId, actionId);
  }

  private async entries(tx: Tx, me: Me, listed: readonly Listed[]): Promise<LogEntryView[]> {
    const views = await this.views.many(
      tx,
      me,
      listed.map((one) => one.id),
    );
    const told = await tellAll(this.repository, tx, me.darkroomId, listed);
    return listed.flatMap(({ id }) => {
      const action = views.get(id);
      const words = told.get(id);
      return action && words ? [{ action, ...words }] : [];
    });
  }
}

const cursorOf = (place: Place): string =>
  Buffer.from(`${place.happenedAt.toISOString()}|${place.seq}`).toString('base64url');

/** @throws Problem 'invalid' for what no page has given out */
function placeOf(cursor: string): Place {
  const [at = '', seq = ''] = Buffer.from(cursor, 'base64url').toString('utf8').split('|');
  // A Date would read years that PostgreSQL has no moment for.
  if (!isInstant(at) || !/^\d{1,15}$/.test(seq)) {
    throw invalid([{ field: 'cursor', message: 'Start again from the newest.' }]);
  }
  return { happenedAt: new Date(at), seq: Number(seq) };
}
