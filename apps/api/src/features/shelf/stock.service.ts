import { Injectable } from '@nestjs/common';
import { v7 } from 'uuid';
import type { Tx } from '../../platform/database/database.js';
import { problem } from '../../platform/errors/problem.js';
import type { Recording } from '../../platform/ledger/recording.js';
import { PackLocks } from '../suppliers/pack-locks.js';
import { leftIn, matchOpened, planDraws, type NamedPart, type PackMakes } from './draw-plan.js';
import { costShare, figureOf, withFigure, wholePart, type Amount } from './proportions.js';
import { StockHistoryRepository, type MovementRow } from './stock-history.repository.js';
import { StockRepository, type NewMovement } from './stock.repository.js';

export interface DrawRequest {
  packMakes: PackMakes;
  /** Microlitres of the solution that is mixed. */
  makeUl: number;
  from: { kind: 'lot'; lotId: string } | { kind: 'opened'; openedPackIds: string[] };
}

/** One part as it went into the mix; for mix_draws. */
export type DrawnPart = { lotId: string; packPartId: string; openedPackId: string } & Amount;

export interface Cost {
  costMinor: number;
  currency: string;
}

/** What mixing takes off the shelf, and gives back when the mix is voided. */
@Injectable()
export class StockService {
  constructor(
    private readonly stock: StockRepository,
    private readonly history: StockHistoryRepository,
    private readonly packs: PackLocks,
  ) {}

  /** Locks what a mix takes from, after the bottles and before the counters. @returns the packs it is of */
  async lockForMix(
    tx: Tx,
    darkroomId: string,
    from: { lotId?: string; openedPackIds?: string[] },
  ): Promise<string[]> {
    return this.lock(tx, darkroomId, from.lotId ? [from.lotId] : [], from.openedPackIds ?? []);
  }

  /**
   * Locks what a mix took from, before it is taken back.
   * @throws Problem 'leans-on-it' naming the bottles that were mixed since from a pack that it opened
   */
  async lockMix(tx: Tx, darkroomId: string, mixActionId: string): Promise<void> {
    const moved = await this.history.movements(tx, darkroomId, mixActionId);
    await this.lock(
      tx,
      darkroomId,
      moved.map((row) => row.lotId),
      openedIds(moved),
    );
    const codes = await this.leaning(tx, darkroomId, mixActionId);
    if (codes.length > 0) {
      throw problem(
        'leans-on-it',
        `The pack that it opened was used again for ${codes.join(', ')}. Take that back first.`,
      );
    }
  }

  /**
   * Takes each part in proportion from a pack that it opens, or from opened ones. Call it after lockForMix and after the
   * action was added; movements are numbered from `ordinal`.
   * @throws Problem 'not-found', 'lot-empty', 'more-than-pack-makes', 'whole-only', 'opened-too-little', 'invalid'
   */
  async drawForMix(
    tx: Tx,
    recording: Recording,
    ordinal: number,
    request: DrawRequest,
  ): Promise<DrawnPart[]> {
    const { from } = request;
    return from.kind === 'lot'
      ? this.openPack(tx, recording, ordinal, request, from.lotId)
      : this.drawOpened(tx, recording, ordinal, request, from.openedPackIds);
  }

  /** Codes of the bottles that lean on a mix: drawn from a pack that it opened. Empty: it may be taken back. */
  async leaning(tx: Tx, darkroomId: string, mixActionId: string): Promise<string[]> {
    const moved = await this.history.movements(tx, darkroomId, mixActionId);
    const opened = openedIds(moved.filter((row) => row.kind === 'opened'));
    return this.history.codesDrawnFrom(tx, darkroomId, opened, mixActionId);
  }

  /** Puts back what the mix took; a pack that it opened is unopened again. @returns the packs it moved */
  async undoMix(tx: Tx, { darkroomId, now }: Recording, mixActionId: string): Promise<string[]> {
    const moved = await this.history.movements(tx, darkroomId, mixActionId);
    const lots = new Map<string, number>();
    for (const { lotId, unopenedDelta } of moved) lots.set(lotId, (lots.get(lotId) ?? 0) - unopenedDelta);
    await this.stock.moveLots(
      tx,
      darkroomId,
      [...lots].map(([lotId, unopened]) => ({ lotId, unopened })),
    );
    const neverOpened = openedIds(moved.filter((row) => row.kind === 'opened'));
    const drawn = moved.filter((row) => row.openedPackId !== null && !neverOpened.includes(row.openedPackId));
    const opened = await this.stock.lockOpened(tx, darkroomId, openedIds(drawn));
    const left = opened.map((row) => {
      const took = drawn
        .filter((one) => one.openedPackId === row.id)
        .reduce((sum, one) => sum + deltaOf(one), 0);
      return { id: row.id, left: leftIn(row) - took };
    });
    await this.stock.writeLeft(tx, darkroomId, left);
    await this.stock.voidOpened(tx, darkroomId, neverOpened, now);
    return packIdsIn(moved);
  }

  async packIdsOfMix(tx: Tx, darkroomId: string, mixActionId: string): Promise<string[]> {
    return packIdsIn(await this.history.movements(tx, darkroomId, mixActionId));
  }

  /** What the drawn share of a pack cost by its lot's last delivery; null where that price is not known. */
  async costOfDraw(
    tx: Tx,
    darkroomId: string,
    { lotId, makeUl, packMakes }: { lotId: string; makeUl: number; packMakes: PackMakes },
  ): Promise<Cost | null> {
    const price = await this.history.lastPrice(tx, darkroomId, lotId);
    return (
      price && {
        costMinor: costShare(price.priceMinor, makeUl, packMakes.volumeUl),
        currency: price.currency,
      }
    );
  }

  private async lock(
    tx: Tx,
    darkroomId: string,
    lotIds: readonly string[],
    opened: readonly string[],
  ): Promise<string[]> {
    const packIds = await this.stock.packIds(tx, darkroomId, lotIds, opened);
    await this.packs.lock(tx, darkroomId, packIds);
    await this.stock.lockLots(tx, darkroomId, lotIds);
    await this.stock.lockOpened(tx, darkroomId, opened);
    return packIds;
  }

  private async openPack(
    tx: Tx,
    { darkroomId, id: actionId, happenedOn }: Recording,
    ordinal: number,
    { packMakes, makeUl }: DrawRequest,
    lotId: string,
  ): Promise<DrawnPart[]> {
    const [lot] = await this.stock.lockLots(tx, darkroomId, [lotId]);
    if (!lot) throw problem('not-found');
    if (lot.unopened < 1) throw problem('lot-empty', lot.lotNumber);
    const draws = planDraws(await this.partsOf(tx, darkroomId, lot.packId), makeUl, packMakes).map(
      (draw) => ({
        ...draw,
        openedPackId: v7(),
        whole: wholePart(draw.part),
      }),
    );
    await this.stock.moveLots(tx, darkroomId, [{ lotId, unopened: -1 }]);
    await this.stock.insertOpened(
      tx,
      draws.map(({ part, taken, whole, openedPackId }) => ({
        darkroomId,
        id: openedPackId,
        lotId,
        packPartId: part.packPartId,
        openedOn: happenedOn,
        ...asLeft(withFigure(whole, figureOf(whole) - figureOf(taken))),
      })),
    );
    const base = { darkroomId, actionId, packId: lot.packId, lotId };
    const movements: NewMovement[] = draws.flatMap(({ taken, whole, openedPackId }, at) => [
      // The pack is one, so only its first part takes it off the shelf.
      {
        ...base,
        ordinal: ordinal + 2 * at,
        kind: 'opened',
        unopenedDelta: at === 0 ? -1 : 0,
        openedPackId,
        ...asDelta(whole, 1),
      },
      {
        ...base,
        ordinal: ordinal + 2 * at + 1,
        kind: 'drawn',
        unopenedDelta: 0,
        openedPackId,
        ...asDelta(taken, -1),
      },
    ]);
    await this.stock.insertMovements(tx, movements);
    return draws.map(({ part, taken, openedPackId }) => ({
      lotId,
      packPartId: part.packPartId,
      openedPackId,
      ...taken,
    }));
  }

  private async drawOpened(
    tx: Tx,
    { darkroomId, id: actionId }: Recording,
    ordinal: number,
    { packMakes, makeUl }: DrawRequest,
    openedPackIds: readonly string[],
  ): Promise<DrawnPart[]> {
    const [packId] = await this.stock.packIds(tx, darkroomId, [], openedPackIds);
    if (packId === undefined) throw problem('not-found');
    const opened = await this.stock.lockOpened(tx, darkroomId, openedPackIds);
    const draws = matchOpened(
      planDraws(await this.partsOf(tx, darkroomId, packId), makeUl, packMakes),
      opened,
    );
    await this.stock.writeLeft(
      tx,
      darkroomId,
      draws.map(({ taken, from }) => ({ id: from.id, left: leftIn(from) - figureOf(taken) })),
    );
    await this.stock.insertMovements(
      tx,
      draws.map(({ taken, from }, at) => ({
        darkroomId,
        actionId,
        ordinal: ordinal + at,
        kind: 'drawn' as const,
        packId,
        lotId: from.lotId,
        unopenedDelta: 0,
        openedPackId: from.id,
        ...asDelta(taken, -1),
      })),
    );
    return draws.map(({ part, taken, from }) => ({
      lotId: from.lotId,
      packPartId: part.packPartId,
      openedPackId: from.id,
      ...taken,
    }));
  }

  private async partsOf(tx: Tx, darkroomId: string, packId: string): Promise<NamedPart[]> {
    const rows = await this.stock.parts(tx, darkroomId, packId);
    return rows.map(({ id, name, sizeUl, sizeMg }) => ({ packPartId: id, name, sizeUl, sizeMg }));
  }
}

const asLeft = (amount: Amount) =>
  'volumeUl' in amount ? { leftUl: amount.volumeUl } : { leftMg: amount.massMg };

const asDelta = (amount: Amount, sign: 1 | -1) =>
  'volumeUl' in amount ? { deltaUl: sign * amount.volumeUl } : { deltaMg: sign * amount.massMg };

const deltaOf = ({ deltaUl, deltaMg }: MovementRow): number => deltaUl ?? deltaMg ?? 0;

const packIdsIn = (moved: readonly MovementRow[]): string[] => [...new Set(moved.map((row) => row.packId))];

const openedIds = (moved: readonly MovementRow[]): string[] => [
  ...new Set(moved.flatMap((row) => (row.openedPackId === null ? [] : [row.openedPackId]))),
];
