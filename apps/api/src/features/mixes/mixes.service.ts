import { Injectable, type OnModuleInit } from '@nestjs/common';
import { assess, roleLetters, type BottleFact } from '@wetside/chemistry';
import type { Me } from '../../platform/auth/me.js';
import type { Tx } from '../../platform/database/database.js';
import { isUniqueViolation } from '../../platform/database/sql-errors.js';
import { invalid, problem } from '../../platform/errors/problem.js';
import { HouseRepository } from '../../platform/house/house.repository.js';
import { ActionRecorder, type PutAction, type Recorded } from '../../platform/ledger/action-recorder.js';
import { ActionViews } from '../../platform/ledger/action-views.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import type { Recording } from '../../platform/ledger/recording.js';
import { touched, VoidHandlers } from '../../platform/ledger/void-handlers.js';
import { WarningsService } from '../alerts/warnings.service.js';
import { openingOf } from '../bottles/bottle-facts.repository.js';
import { BottleLedger } from '../bottles/bottle-ledger.js';
import type { LockedBottle } from '../bottles/bottle-row.js';
import { BottlesRepository } from '../bottles/bottles.repository.js';
import { BottlesService } from '../bottles/bottles.service.js';
import { ChemistriesRepository, type ChemistryVersion } from '../chemistries/chemistries.repository.js';
import { bottleCode } from '../chemistries/chemistries.service.js';
import { MixDraws, type Drawn } from './mix-draws.service.js';
import type { MixAnswer, MixContentDto } from './mix.dto.js';
import { MixVoids } from './mix-voids.service.js';
import { MixesRepository } from './mixes.repository.js';

@Injectable()
export class MixesService implements OnModuleInit {
  constructor(
    private readonly recorder: ActionRecorder,
    private readonly views: ActionViews,
    private readonly repository: MixesRepository,
    private readonly chemistries: ChemistriesRepository,
    private readonly draws: MixDraws,
    private readonly bottleRows: BottlesRepository,
    private readonly bottles: BottlesService,
    private readonly ledger: BottleLedger,
    private readonly houses: HouseRepository,
    private readonly warnings: WarningsService,
    private readonly voids: VoidHandlers,
    private readonly mixVoids: MixVoids,
  ) {}

  onModuleInit(): void {
    this.voids.register('mix', this.mixVoids);
  }

  async put(enter: Entrance, put: PutAction & { content: MixContentDto }): Promise<Recorded<MixAnswer>> {
    try {
      return await this.recorder.record(
        enter,
        put,
        (tx, recording) => this.mix(tx, recording, put.content),
        (tx, me) => this.answer(tx, me, put),
      );
    } catch (error) {
      if (isUniqueViolation(error, 'bottles_pk')) throw problem('bottle-exists');
      throw error;
    }
  }

  private async mix(tx: Tx, recording: Recording, content: MixContentDto): Promise<void> {
    const { darkroomId } = recording;
    if (content.volumeUl > content.container.sizeUl) throw tooMuch();
    const version = await this.chemistries.version(tx, darkroomId, content.chemistryVersionId);
    if (!version) throw problem('not-found');
    const parent = await this.parent(tx, recording, content);
    const take = await this.draws.prepare(tx, darkroomId, version, content, parent);
    await recording.add(tx);
    const drawn = await take(tx, recording);
    await this.write(tx, recording, version, content, drawn);
    if (parent)
      await this.ledger.advance(tx, darkroomId, recording.now, [
        { bottle: parent, fact: drawFact(recording, drawn) },
      ]);
    await this.warnings.settle(
      tx,
      { darkroomId, zone: recording.me.zone, now: recording.now, cause: 'action' },
      touched({ bottleIds: [content.bottleId, ...(parent ? [parent.id] : [])], packIds: drawn.packIds }),
    );
  }

  /** The bottle of stock that it is mixed from, locked and fit for it. */
  private async parent(tx: Tx, recording: Recording, { from }: MixContentDto): Promise<LockedBottle | null> {
    if (from.kind !== 'stock') return null;
    if (!from.bottleId) throw invalid([{ field: 'content.from.bottleId', message: 'Say which bottle.' }]);
    const [bottle] = await this.ledger.lock(tx, recording.darkroomId, [from.bottleId]);
    if (!bottle?.totals) throw problem('not-found');
    const { zone, thresholds, smallestTankUl } = await this.houses.read(tx, recording.darkroomId);
    const now = recording.now.toISOString();
    const stands = assess(bottle.document, bottle.totals, {
      now,
      today: recording.today,
      zone,
      thresholds,
      smallestTankUl,
    });
    if (stands.closed && stands.verdict !== 'volume-short')
      throw problem('stock-closed', `${bottle.code}: ${stands.sentence}.`);
    return bottle;
  }

  private async write(
    tx: Tx,
    recording: Recording,
    version: ChemistryVersion,
    content: MixContentDto,
    drawn: Drawn,
  ): Promise<void> {
    const { darkroomId } = recording;
    const { document } = version;
    const letters = roleLetters[document.role];
    const code = bottleCode(letters, await this.bottleRows.nextNumber(tx, darkroomId, letters));
    const readyAt = document.readyAfter
      ? new Date(recording.happenedAt.getTime() + document.readyAfter.seconds * 1000)
      : null;
    const mix = {
      darkroomId,
      actionId: recording.id,
      bottleId: content.bottleId,
      volumeUl: content.volumeUl,
      containerSizeUl: content.container.sizeUl,
      containerKind: content.container.kind,
      containerMaterial: content.container.material ?? null,
      readyAt,
      note: content.note || null,
    };
    await this.bottleRows.insert(tx, {
      darkroomId,
      id: content.bottleId,
      code,
      chemistryVersionId: version.id,
      material: content.material,
      madeByActionId: recording.id,
      ...drawn.cost,
    });
    await this.repository.insert(
      tx,
      mix,
      drawn.draws.map((draw, ordinal) => ({ ...draw, darkroomId, actionId: recording.id, ordinal })),
    );
    const fact: BottleFact = { ...placeOf(recording), ...openingOf(mix, content.material) };
    await this.ledger.open(tx, darkroomId, recording.now, { id: content.bottleId, document, fact });
  }

  private async answer(tx: Tx, me: Me, put: PutAction & { content: MixContentDto }): Promise<MixAnswer> {
    const action = await this.views.one(tx, me, put.id);
    const { bottle, document } = await this.bottles.one(tx, me, put.content.bottleId);
    return { action, bottle, document };
  }
}

const tooMuch = () =>
  problem('volume-over-container').with({
    errors: [{ field: 'content.container.sizeUl', message: 'The container holds less than that.' }],
  });

const placeOf = (recording: Recording) => ({
  actionId: recording.id,
  seq: recording.seq,
  happenedAt: recording.happenedAt.toISOString(),
  happenedOn: recording.happenedOn,
});

const drawFact = (recording: Recording, drawn: Drawn): BottleFact => ({
  ...placeOf(recording),
  kind: 'draw',
  takenUl: drawn.draws.reduce((sum, draw) => sum + (draw.volumeUl ?? 0), 0),
});
