import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { BottleFact } from '@wetside/chemistry';
import type { Tx } from '../../platform/database/database.js';
import { problem } from '../../platform/errors/problem.js';
import { ActionRecorder, type PutAction, type Recorded } from '../../platform/ledger/action-recorder.js';
import { ActionViews } from '../../platform/ledger/action-views.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import type { Recording } from '../../platform/ledger/recording.js';
import { touched, VoidHandlers, type VoidHandler } from '../../platform/ledger/void-handlers.js';
import { WarningsService } from '../alerts/warnings.service.js';
import { BottleLedger } from '../bottles/bottle-ledger.js';
import { keepAfterMix } from '../bottles/mix-time.js';
import type { LockedBottle } from '../bottles/bottle-row.js';
import { BottlesService } from '../bottles/bottles.service.js';
import type { DiscardContentDto, HoldContentDto } from './hold.dto.js';
import type { BottleActionAnswer } from './hold.view.js';
import { HoldsRepository } from './holds.repository.js';

type Detail = { kind: 'hold'; reason: string } | { kind: 'release' } | { kind: 'discard' };

/** Bottles out of use and back, and bottles emptied. */
@Injectable()
export class HoldsService implements OnModuleInit {
  constructor(
    private readonly recorder: ActionRecorder,
    private readonly views: ActionViews,
    private readonly repository: HoldsRepository,
    private readonly ledger: BottleLedger,
    private readonly bottles: BottlesService,
    private readonly warnings: WarningsService,
    private readonly voids: VoidHandlers,
  ) {}

  onModuleInit(): void {
    const handler = this.voidHandler();
    for (const kind of ['hold', 'release', 'discard'] as const) this.voids.register(kind, handler);
  }

  hold(enter: Entrance, put: PutAction & { content: HoldContentDto }): Promise<Recorded<BottleActionAnswer>> {
    const { reason } = put.content;
    return this.onBottle(enter, put, { kind: 'hold', reason }, refuseDiscarded, (tx, recording, bottleId) =>
      this.repository.insertHold(tx, { ...keyOf(recording), bottleId, change: 'hold', reason }),
    );
  }

  release(
    enter: Entrance,
    put: PutAction & { content: HoldContentDto },
  ): Promise<Recorded<BottleActionAnswer>> {
    const { reason } = put.content;
    return this.onBottle(enter, put, { kind: 'release' }, refuseNotHeld, (tx, recording, bottleId) =>
      this.repository.insertHold(tx, { ...keyOf(recording), bottleId, change: 'release', reason }),
    );
  }

  discard(
    enter: Entrance,
    put: PutAction & { content: DiscardContentDto },
  ): Promise<Recorded<BottleActionAnswer>> {
    const { wasteRoute, note } = put.content;
    return this.onBottle(enter, put, { kind: 'discard' }, refuseDiscarded, (tx, recording, bottleId) =>
      this.repository.insertDiscard(tx, { ...keyOf(recording), bottleId, wasteRoute, note: note || null }),
    );
  }

  private onBottle(
    enter: Entrance,
    put: PutAction & { content: { bottleId: string } },
    detail: Detail,
    refuse: (bottle: LockedBottle) => void,
    write: (tx: Tx, recording: Recording, bottleId: string) => Promise<void>,
  ): Promise<Recorded<BottleActionAnswer>> {
    const { bottleId } = put.content;
    return this.recorder.record(
      enter,
      put,
      async (tx, recording) => {
        const [bottle] = await this.ledger.lock(tx, recording.darkroomId, [bottleId]);
        if (!bottle?.totals) throw problem('not-found');
        refuse(bottle);
        keepAfterMix(recording, [bottle]);
        await recording.add(tx);
        await write(tx, recording, bottleId);
        await this.ledger.advance(tx, recording.darkroomId, recording.now, [
          { bottle, fact: factOf(recording, detail) },
        ]);
        await this.warnings.settle(tx, atOf(recording, 'action'), touched({ bottleIds: [bottleId] }));
      },
      async (tx, me) => {
        const action = await this.views.one(tx, me, put.id);
        const [bottle] = await this.bottles.views(tx, me.darkroomId, [bottleId]);
        if (!bottle) throw problem('not-found');
        return { action, bottle };
      },
    );
  }

  private voidHandler(): VoidHandler {
    const lock = async (tx: Tx, recording: Recording, actionId: string) =>
      this.ledger.lock(
        tx,
        recording.darkroomId,
        await this.repository.bottlesOf(tx, recording.darkroomId, actionId),
      );
    return {
      prepare: async (tx, recording, target) => void (await lock(tx, recording, target.id)),
      undo: async (tx, recording, target) => {
        const locked = await lock(tx, recording, target.id);
        await this.ledger.refold(tx, recording.darkroomId, recording.now, locked);
        return touched({ bottleIds: locked.map((bottle) => bottle.id) });
      },
    };
  }
}

const keyOf = (recording: Recording) => ({ darkroomId: recording.darkroomId, actionId: recording.id });

const atOf = (recording: Recording, cause: 'action' | 'retraction') => ({
  darkroomId: recording.darkroomId,
  zone: recording.me.zone,
  now: recording.now,
  cause,
});

function factOf(recording: Recording, detail: Detail): BottleFact {
  return {
    ...detail,
    actionId: recording.id,
    seq: recording.seq,
    happenedAt: recording.happenedAt.toISOString(),
    happenedOn: recording.happenedOn,
  };
}

function refuseDiscarded(bottle: LockedBottle): void {
  if (bottle.totals?.discardedAt) throw problem('already-discarded', bottle.code);
}

function refuseNotHeld(bottle: LockedBottle): void {
  refuseDiscarded(bottle);
  if (!bottle.totals?.hold) throw problem('not-on-hold', bottle.code);
}
