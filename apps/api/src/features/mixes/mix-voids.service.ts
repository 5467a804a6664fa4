import { Injectable } from '@nestjs/common';
import type { Tx } from '../../platform/database/database.js';
import { problem } from '../../platform/errors/problem.js';
import type { ActionRow } from '../../platform/ledger/actions.repository.js';
import type { Recording } from '../../platform/ledger/recording.js';
import { touched, type Touched, type VoidHandler } from '../../platform/ledger/void-handlers.js';
import { BottleLedger } from '../bottles/bottle-ledger.js';
import type { LockedBottle } from '../bottles/bottle-row.js';
import { StockService } from '../shelf/stock.service.js';
import { MixesRepository } from './mixes.repository.js';

/** Takes a mix back while nothing leans on it: the bottle never stood here, and what it took is there again. */
@Injectable()
export class MixVoids implements VoidHandler {
  constructor(
    private readonly repository: MixesRepository,
    private readonly ledger: BottleLedger,
    private readonly stock: StockService,
  ) {}

  async prepare(tx: Tx, recording: Recording, target: ActionRow): Promise<void> {
    const { made } = await this.lock(tx, recording.darkroomId, target.id);
    await this.stock.lockMix(tx, recording.darkroomId, target.id);
    const { loads, others, drawnBy } = await this.repository.leaning(tx, recording.darkroomId, made.id);
    const packUsers = await this.stock.leaning(tx, recording.darkroomId, target.id);
    const leaning = [
      loads > 0 ? `${loads} ${loads === 1 ? 'load' : 'loads'}` : '',
      others > 0 ? 'a hold or a discard' : '',
      ...drawnBy,
      ...packUsers,
    ].filter((what) => what !== '');
    if (leaning.length > 0) {
      throw problem('leans-on-it', `${made.code} has ${leaning.join(', ')} on it. Take those back first.`);
    }
  }

  async undo(tx: Tx, recording: Recording, target: ActionRow): Promise<Touched> {
    const { made, parents } = await this.lock(tx, recording.darkroomId, target.id);
    const packIds = await this.stock.undoMix(tx, recording, target.id);
    await this.ledger.refold(tx, recording.darkroomId, recording.now, [made, ...parents]);
    return touched({ bottleIds: [made.id, ...parents.map((bottle) => bottle.id)], packIds });
  }

  private async lock(
    tx: Tx,
    darkroomId: string,
    actionId: string,
  ): Promise<{ made: LockedBottle; parents: LockedBottle[] }> {
    const ids = await this.repository.bottlesOf(tx, darkroomId, actionId);
    if (!ids) throw problem('not-found');
    const locked = await this.ledger.lock(tx, darkroomId, [ids.made, ...ids.parents]);
    const made = locked.find((bottle) => bottle.id === ids.made);
    if (!made) throw problem('not-found');
    return { made, parents: locked.filter((bottle) => bottle.id !== ids.made) };
  }
}
