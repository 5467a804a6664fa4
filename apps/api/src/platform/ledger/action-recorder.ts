import { Injectable } from '@nestjs/common';
import { localDate } from '@wetside/chemistry';
import type { ActionKind } from '@wetside/db';
import { reaches } from '../auth/roles.js';
import type { Me } from '../auth/me.js';
import { Clock } from '../clock/clock.js';
import type { Tx } from '../database/database.js';
import { isUniqueViolation } from '../database/sql-errors.js';
import { problem } from '../errors/problem.js';
import { ActionsRepository, type ActionRow } from './actions.repository.js';
import { contentHash } from './content-hash.js';
import type { Entrance } from './entrance.js';
import { happened, type Happened } from './happened.js';
import { Recording } from './recording.js';

/** An action as it was sent. */
export interface PutAction {
  id: string;
  kind: ActionKind;
  content: { v: number; happenedAt: string };
  /** The content before validation touched it. */
  raw: unknown;
  envelope: { deviceNow: string; queued: boolean };
}

/** What came of it, and whether it was recorded now or had been before. */
export class Recorded<R> {
  constructor(
    readonly created: boolean,
    readonly body: R,
  ) {}
}

/**
 * The one road on which something that happened gets into the ledger: looked up by its id before any rule, its time
 * corrected, recorded with its details in one transaction, answered as it is now. Sent twice, it is there once.
 */
@Injectable()
export class ActionRecorder {
  constructor(
    private readonly repository: ActionsRepository,
    private readonly clock: Clock,
  ) {}

  /**
   * @param work checks the rules, takes its locks, calls `recording.add(tx)` and writes the details
   * @param view reads the answer, after the work as after a replay
   * @throws Problem 'action-differs', 'in-the-future', 'too-long-ago', and what the work throws
   */
  async record<R>(
    enter: Entrance,
    put: PutAction,
    work: (tx: Tx, recording: Recording) => Promise<void>,
    view: (tx: Tx, me: Me) => Promise<R>,
  ): Promise<Recorded<R>> {
    const once = () => enter((tx, me) => this.inTransaction(tx, me, put, work, view));
    try {
      return await once();
    } catch (error) {
      // The same action came in twice at once and the other was first: now it is found.
      if (isUniqueViolation(error, 'actions_pk')) return once();
      throw error;
    }
  }

  private async inTransaction<R>(
    tx: Tx,
    me: Me,
    put: PutAction,
    work: (tx: Tx, recording: Recording) => Promise<void>,
    view: (tx: Tx, me: Me) => Promise<R>,
  ): Promise<Recorded<R>> {
    const hash = contentHash(put.raw);
    const known = await this.repository.find(tx, me.darkroomId, put.id);
    if (known) {
      if (!isSame(known, put, hash, me)) throw problem('action-differs');
      return new Recorded(false, await view(tx, me));
    }
    await work(tx, this.begin(me, put, hash));
    return new Recorded(true, await view(tx, me));
  }

  private begin(me: Me, put: PutAction, hash: string): Recording {
    const now = this.clock.now();
    const when = timeOf(put, now);
    if (!when) throw problem('in-the-future');
    if (when.longAgo && !reaches(me.role, 'technician')) throw problem('too-long-ago');
    return new Recording(this.repository, me, {
      id: put.id,
      kind: put.kind,
      v: put.content.v,
      when,
      now,
      today: localDate(now.toISOString(), me.zone),
      requestHash: hash,
      queued: put.envelope.queued,
    });
  }
}

function isSame(known: ActionRow, put: PutAction, hash: string, me: Me): boolean {
  return known.kind === put.kind && known.requestHash === hash && known.membershipId === me.membershipId;
}

function timeOf(put: PutAction, now: Date): Happened | null {
  return happened(
    {
      kind: put.kind,
      happenedAt: new Date(put.content.happenedAt),
      deviceNow: new Date(put.envelope.deviceNow),
    },
    now,
  );
}
