import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { Tx } from '../../platform/database/database.js';
import { problem } from '../../platform/errors/problem.js';
import { ActionRecorder, type PutAction, type Recorded } from '../../platform/ledger/action-recorder.js';
import { ActionViews } from '../../platform/ledger/action-views.js';
import { ActionsRepository } from '../../platform/ledger/actions.repository.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import type { Recording } from '../../platform/ledger/recording.js';
import { touched, VoidHandlers } from '../../platform/ledger/void-handlers.js';
import { WarningsService } from '../alerts/warnings.service.js';
import { BottleLedger } from '../bottles/bottle-ledger.js';
import type { DecisionContentDto } from './load.dto.js';
import type { ActionAnswer } from './load.view.js';
import { LoadsRepository } from './loads.repository.js';

/** A technician accepts a reported load with a reason. It changes no number. */
@Injectable()
export class DecisionsService implements OnModuleInit {
  constructor(
    private readonly recorder: ActionRecorder,
    private readonly views: ActionViews,
    private readonly actions: ActionsRepository,
    private readonly repository: LoadsRepository,
    private readonly ledger: BottleLedger,
    private readonly warnings: WarningsService,
    private readonly voids: VoidHandlers,
  ) {}

  onModuleInit(): void {
    this.voids.register('decision', {
      prepare: async (tx, recording, target) => {
        await this.lock(tx, recording.darkroomId, await this.loadOf(tx, recording.darkroomId, target.id));
      },
      undo: async (tx, recording, target) =>
        touched({ loadActionIds: [await this.loadOf(tx, recording.darkroomId, target.id)] }),
    });
  }

  put(enter: Entrance, put: PutAction & { content: DecisionContentDto }): Promise<Recorded<ActionAnswer>> {
    return this.recorder.record(
      enter,
      put,
      (tx, recording) => this.accept(tx, recording, put.content),
      async (tx, me) => ({ action: await this.views.one(tx, me, put.id) }),
    );
  }

  private async accept(tx: Tx, recording: Recording, content: DecisionContentDto): Promise<void> {
    const { darkroomId } = recording;
    // The load's bottles stand for the load: two decisions, or a decision and a void, wait for each other here.
    await this.lock(tx, darkroomId, content.loadActionId);
    const voided = await this.actions.isVoided(tx, darkroomId, content.loadActionId);
    if (voided || (await this.repository.isDecided(tx, darkroomId, content.loadActionId)))
      throw problem('nothing-to-decide');
    await recording.add(tx);
    await this.repository.insertDecision(tx, {
      darkroomId,
      actionId: recording.id,
      loadActionId: content.loadActionId,
      decision: content.decision,
      reason: content.reason,
    });
    await this.warnings.settle(
      tx,
      { darkroomId, zone: recording.me.zone, now: recording.now, cause: 'action' },
      touched({ loadActionIds: [content.loadActionId] }),
    );
  }

  private async lock(tx: Tx, darkroomId: string, loadActionId: string): Promise<void> {
    const steps = await this.repository.steps(tx, darkroomId, loadActionId);
    if (steps.length === 0) throw problem('not-found');
    await this.ledger.lock(
      tx,
      darkroomId,
      steps.map((step) => step.bottleId),
    );
  }

  private async loadOf(tx: Tx, darkroomId: string, decisionId: string): Promise<string> {
    const found = await this.repository.decidedLoad(tx, darkroomId, decisionId);
    if (!found) throw problem('not-found');
    return found;
  }
}
