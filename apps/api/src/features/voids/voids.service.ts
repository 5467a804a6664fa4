import { Injectable } from '@nestjs/common';
import type { Tx } from '../../platform/database/database.js';
import { isUniqueViolation } from '../../platform/database/sql-errors.js';
import { problem } from '../../platform/errors/problem.js';
import { ActionRecorder, type PutAction, type Recorded } from '../../platform/ledger/action-recorder.js';
import { ActionViews } from '../../platform/ledger/action-views.js';
import { ActionsRepository, type ActionRow } from '../../platform/ledger/actions.repository.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import type { Recording } from '../../platform/ledger/recording.js';
import { mayVoid } from '../../platform/ledger/undo-rule.js';
import { VoidHandlers } from '../../platform/ledger/void-handlers.js';
import { WarningsService } from '../alerts/warnings.service.js';
import { BottlesService } from '../bottles/bottles.service.js';
import { LogEntries } from '../log/log-entries.service.js';
import type { VoidAnswer, VoidContentDto } from './void.dto.js';

/** Takes an action back. Both stay in the log. */
@Injectable()
export class VoidsService {
  constructor(
    private readonly recorder: ActionRecorder,
    private readonly actions: ActionsRepository,
    private readonly views: ActionViews,
    private readonly handlers: VoidHandlers,
    private readonly warnings: WarningsService,
    private readonly bottles: BottlesService,
    private readonly log: LogEntries,
  ) {}

  async put(enter: Entrance, put: PutAction & { content: VoidContentDto }): Promise<Recorded<VoidAnswer>> {
    const { voidedActionId, reason } = put.content;
    try {
      return await this.recorder.record(
        enter,
        put,
        (tx, recording) => this.takeBack(tx, recording, voidedActionId, reason || null),
        async (tx, me) => ({
          action: await this.views.one(tx, me, put.id),
          voided: await this.views.one(tx, me, voidedActionId),
          bottles: await this.bottles.views(
            tx,
            me.darkroomId,
            await this.log.bottleIdsOf(tx, me.darkroomId, voidedActionId),
          ),
        }),
      );
    } catch (error) {
      if (isUniqueViolation(error, 'voids_voided_uq')) throw problem('already-voided');
      throw error;
    }
  }

  private async takeBack(
    tx: Tx,
    recording: Recording,
    targetId: string,
    reason: string | null,
  ): Promise<void> {
    const { darkroomId } = recording;
    const target = await this.actions.find(tx, darkroomId, targetId);
    if (!target) throw problem('not-found');
    refuse(target, recording);
    const handler = this.handlers.of(target.kind);
    await handler.prepare(tx, recording, target);
    // Asked under the locks that prepare took; the unique key is behind it.
    if (await this.actions.isVoided(tx, darkroomId, targetId)) throw problem('already-voided');
    await recording.add(tx);
    await this.actions.insertVoid(tx, {
      darkroomId,
      actionId: recording.id,
      voidedActionId: targetId,
      reason,
    });
    const moved = await handler.undo(tx, recording, target);
    await this.warnings.settle(
      tx,
      { darkroomId, zone: recording.me.zone, now: recording.now, cause: 'retraction' },
      moved,
    );
  }
}

function refuse(target: ActionRow, recording: Recording): void {
  if (target.kind === 'void') throw problem('void-of-void');
  const may = mayVoid(target, recording.me, recording.now);
  if (may === 'too-late') throw problem('undo-too-late');
  if (may === 'not-yours') throw problem('not-allowed', 'technician');
}
