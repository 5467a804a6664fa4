import { Injectable, type OnModuleInit } from '@nestjs/common';
import { flagsFor, type BottleFact } from '@wetside/chemistry';
import type { Me } from '../../platform/auth/me.js';
import type { Tx } from '../../platform/database/database.js';
import { isForeignKeyViolation } from '../../platform/database/sql-errors.js';
import { problem } from '../../platform/errors/problem.js';
import { ActionRecorder, type PutAction, type Recorded } from '../../platform/ledger/action-recorder.js';
import type { ActionRow } from '../../platform/ledger/actions.repository.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import type { Recording } from '../../platform/ledger/recording.js';
import { touched, VoidHandlers, type Touched } from '../../platform/ledger/void-handlers.js';
import { WarningsService } from '../alerts/warnings.service.js';
import { BottleLedger, type Step } from '../bottles/bottle-ledger.js';
import { BottlesService } from '../bottles/bottles.service.js';
import type { LockedBottle } from '../bottles/bottle-row.js';
import { ActionViews } from '../../platform/ledger/action-views.js';
import { chargeOf, checkedFilm, type BottleCharge } from './load-charges.js';
import { filmRows, guestRows } from './load-owners.js';
import type { LoadContentDto } from './load.dto.js';
import { placeInTime } from './load-time.js';
import type { LoadAnswer } from './load.view.js';
import { LoadsRepository, type NewStep } from './loads.repository.js';

interface ChargedStep extends Step {
  charge: BottleCharge;
}

@Injectable()
export class LoadsService implements OnModuleInit {
  constructor(
    private readonly recorder: ActionRecorder,
    private readonly views: ActionViews,
    private readonly repository: LoadsRepository,
    private readonly ledger: BottleLedger,
    private readonly bottles: BottlesService,
    private readonly warnings: WarningsService,
    private readonly voids: VoidHandlers,
  ) {}

  onModuleInit(): void {
    this.voids.register('load', {
      prepare: async (tx, recording, target) => void (await this.lockOf(tx, recording.darkroomId, target)),
      undo: (tx, recording, target) => this.undo(tx, recording, target),
    });
  }

  /** A load that happened is recorded, whatever stood against it; what stood against it is flagged. */
  put(enter: Entrance, put: PutAction & { content: LoadContentDto }): Promise<Recorded<LoadAnswer>> {
    const recorded = this.recorder.record(
      enter,
      put,
      (tx, recording) => this.count(tx, recording, put.content),
      (tx, me) => this.answer(tx, me, put.id, put.content.bottleIds),
    );
    return recorded.catch(refuseUnknown);
  }

  private async count(tx: Tx, recording: Recording, content: LoadContentDto): Promise<void> {
    const film = checkedFilm(content.film);
    const locked = await this.ledger.lock(tx, recording.darkroomId, content.bottleIds);
    refuseTakenBack(locked);
    const flags = placeInTime(recording, locked, content.reported ?? false);
    await recording.add(tx);
    const steps = locked.map((bottle): ChargedStep => {
      const charge = chargeOf(bottle, film, content.material);
      return { bottle, charge, fact: factOf(recording, content, charge) };
    });
    const rows = await Promise.all(steps.map((step) => this.row(tx, recording, content, step)));
    await this.repository.insertGuests(tx, guestRows(recording, content.film));
    await this.repository.insert(
      tx,
      {
        darkroomId: recording.darkroomId,
        actionId: recording.id,
        lineVersionId: content.lineVersionId ?? null,
        flags,
        note: content.note || null,
      },
      filmRows(recording, content.film),
      rows,
    );
    await this.ledger.advance(tx, recording.darkroomId, recording.now, steps);
    await this.warnings.settle(
      tx,
      { darkroomId: recording.darkroomId, zone: recording.me.zone, now: recording.now, cause: 'action' },
      touched({ bottleIds: locked.map((bottle) => bottle.id), loadActionIds: [recording.id] }),
    );
  }

  /** One step as it is written, with what was known to stand against it at the time that it happened. */
  private async row(
    tx: Tx,
    recording: Recording,
    content: LoadContentDto,
    step: ChargedStep,
  ): Promise<NewStep> {
    const before = await this.ledger.before(tx, recording.darkroomId, step);
    return {
      darkroomId: recording.darkroomId,
      actionId: recording.id,
      bottleId: step.bottle.id,
      material: content.material,
      ...step.charge,
      flags: flagsFor(step.bottle.document, before, step.charge, {
        happenedAt: recording.happenedAt.toISOString(),
        happenedOn: recording.happenedOn,
        material: content.material,
      }),
    };
  }

  private async lockOf(tx: Tx, darkroomId: string, target: ActionRow): Promise<LockedBottle[]> {
    const steps = await this.repository.steps(tx, darkroomId, target.id);
    return this.ledger.lock(
      tx,
      darkroomId,
      steps.map((step) => step.bottleId),
    );
  }

  private async undo(tx: Tx, recording: Recording, target: ActionRow): Promise<Touched> {
    const locked = await this.lockOf(tx, recording.darkroomId, target);
    await this.ledger.refold(tx, recording.darkroomId, recording.now, locked);
    return touched({ bottleIds: locked.map((bottle) => bottle.id), loadActionIds: [target.id] });
  }

  private async answer(tx: Tx, me: Me, actionId: string, bottleIds: readonly string[]): Promise<LoadAnswer> {
    const [load, film, steps, action, bottles] = await Promise.all([
      this.repository.load(tx, me.darkroomId, actionId),
      this.repository.film(tx, me.darkroomId, actionId),
      this.repository.steps(tx, me.darkroomId, actionId),
      this.views.one(tx, me, actionId),
      this.bottles.views(tx, me.darkroomId, bottleIds),
    ]);
    if (!load) throw problem('not-found');
    return {
      action,
      load: { flags: load.flags, note: load.note, film, steps },
      bottles,
    };
  }
}

/** A film's owner or a line that is not of this darkroom. @throws Problem 'not-found', or what it was */
function refuseUnknown(error: unknown): never {
  const named = ['load_film_membership_fk', 'loads_line_version_fk'];
  throw named.some((key) => isForeignKeyViolation(error, key)) ? problem('not-found') : error;
}

/** @throws Problem 'bottle-taken-back' */
function refuseTakenBack(locked: readonly LockedBottle[]): void {
  const gone = locked.find((bottle) => bottle.totals === null);
  if (gone) throw problem('bottle-taken-back', gone.code);
}

function factOf(recording: Recording, content: LoadContentDto, charge: BottleCharge): BottleFact {
  return {
    kind: 'load',
    actionId: recording.id,
    seq: recording.seq,
    happenedAt: recording.happenedAt.toISOString(),
    happenedOn: recording.happenedOn,
    charges: [{ material: content.material, countedE4: charge.countedE4, takenUl: charge.takenUl }],
  };
}
