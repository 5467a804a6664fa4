import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { Tx } from '../../platform/database/database.js';
import { problem } from '../../platform/errors/problem.js';
import { ActionRecorder, type PutAction, type Recorded } from '../../platform/ledger/action-recorder.js';
import { ActionsRepository, type ActionRow } from '../../platform/ledger/actions.repository.js';
import { ActionViews } from '../../platform/ledger/action-views.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import type { Recording } from '../../platform/ledger/recording.js';
import {
  touched,
  VoidHandlers,
  type Touched,
  type VoidHandler,
} from '../../platform/ledger/void-handlers.js';
import { WarningsService } from '../alerts/warnings.service.js';
import { PackLocks } from './pack-locks.js';
import type { SettingChangeAnswer, SettingChangeContent } from './suppliers.dto.js';
import { SuppliersRepository } from './suppliers.repository.js';

export type SettingChangePut = PutAction & { content: SettingChangeContent };

/** A fact about a supplier, changed from one value to another, so that it can be set back. */
@Injectable()
export class SettingChangesService implements OnModuleInit, VoidHandler {
  constructor(
    private readonly recorder: ActionRecorder,
    private readonly actions: ActionsRepository,
    private readonly actionViews: ActionViews,
    private readonly repository: SuppliersRepository,
    private readonly packs: PackLocks,
    private readonly warnings: WarningsService,
    private readonly voids: VoidHandlers,
  ) {}

  onModuleInit(): void {
    this.voids.register('setting-change', this);
  }

  /** @throws Problem 'not-found' for a supplier's pack that is not in this darkroom */
  record(enter: Entrance, put: SettingChangePut): Promise<Recorded<SettingChangeAnswer>> {
    return this.recorder.record(
      enter,
      put,
      (tx, recording) => this.change(tx, recording, put.content),
      async (tx, me) => ({ action: await this.actionViews.one(tx, me, put.id) }),
    );
  }

  private async change(
    tx: Tx,
    recording: Recording,
    { subject, subjectId, changes }: SettingChangeContent,
  ): Promise<void> {
    const { darkroomId, id: actionId } = recording;
    const row = await this.lock(tx, darkroomId, subjectId);
    await recording.add(tx);
    for (const { field, value } of changes) {
      await this.repository.addChanges(tx, [
        { darkroomId, actionId, subject, subjectId, field, oldValue: row.outUntil, newValue: value },
      ]);
      await this.repository.setOutUntil(tx, darkroomId, subjectId, value);
    }
    const { zone } = recording.me;
    await this.warnings.settle(
      tx,
      { darkroomId, zone, now: recording.now, cause: 'retraction' },
      touched({ packIds: [row.packId] }),
    );
  }

  async prepare(tx: Tx, { darkroomId }: Recording, target: ActionRow): Promise<void> {
    for (const change of await this.repository.changes(tx, darkroomId, target.id)) {
      await this.lock(tx, darkroomId, change.subjectId);
      // Taken back already: the void says so itself.
      if (await this.actions.isVoided(tx, darkroomId, target.id)) return;
      if ((await this.repository.newestChange(tx, darkroomId, change)) !== target.id) {
        throw problem('leans-on-it', 'It was changed again since. Change it to what it should be.');
      }
    }
  }

  async undo(tx: Tx, { darkroomId }: Recording, target: ActionRow): Promise<Touched> {
    const packIds: string[] = [];
    for (const { subjectId, oldValue } of await this.repository.changes(tx, darkroomId, target.id)) {
      packIds.push((await this.lock(tx, darkroomId, subjectId)).packId);
      await this.repository.setOutUntil(tx, darkroomId, subjectId, oldValue);
    }
    return touched({ packIds });
  }

  private async lock(tx: Tx, darkroomId: string, supplierPackId: string) {
    const [sold] = await this.repository.soldPacks(tx, darkroomId, [supplierPackId]);
    if (!sold) throw problem('not-found');
    await this.packs.lock(tx, darkroomId, [sold.packId]);
    const row = await this.repository.lockSupplierPack(tx, darkroomId, supplierPackId);
    if (!row) throw problem('not-found');
    return row;
  }
}
