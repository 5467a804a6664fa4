import { Injectable } from '@nestjs/common';
import { measureOut, MixingError, type Measured } from '@wetside/chemistry';
import type { mixDraws } from '@wetside/db';
import type { Tx } from '../../platform/database/database.js';
import { invalid, problem } from '../../platform/errors/problem.js';
import type { Recording } from '../../platform/ledger/recording.js';
import type { LockedBottle } from '../bottles/bottle-row.js';
import { ChemistriesRepository, type ChemistryVersion } from '../chemistries/chemistries.repository.js';
import { StockService } from '../shelf/stock.service.js';
import type { MixContentDto } from './mix.dto.js';

type Draw = Omit<typeof mixDraws.$inferInsert, 'darkroomId' | 'actionId' | 'ordinal'>;
type Cost = { costMinor: number; currency: string } | null;

/** What a mix takes, once it was added: rows for its draws, packs that moved, and what that cost. */
export interface Drawn {
  draws: Draw[];
  packIds: string[];
  cost: Cost;
}

/** A way to take what a mix needs: everything checked and locked, nothing moved yet. */
export type Taking = (tx: Tx, recording: Recording) => Promise<Drawn>;

/** Where a mix comes from: a pack on the shelf, an opened one, a bottle of stock, or measured by hand. */
@Injectable()
export class MixDraws {
  constructor(
    private readonly stock: StockService,
    private readonly chemistries: ChemistriesRepository,
  ) {}

  /**
   * Locks lots and opened packs and checks that they make it.
   * @throws Problem 'does-not-make', 'cannot-mix', and the shelf's own refusals once it takes
   */
  async prepare(
    tx: Tx,
    darkroomId: string,
    version: ChemistryVersion,
    content: MixContentDto,
    parent: LockedBottle | null,
  ): Promise<Taking> {
    const measured = measure(version, content.volumeUl);
    const { from } = content;
    if (parent) return this.fromStock(tx, darkroomId, version, measured, parent);
    if (from.kind === 'hand') return byHand(measured);
    return this.fromShelf(tx, darkroomId, version, content);
  }

  private async fromShelf(
    tx: Tx,
    darkroomId: string,
    version: ChemistryVersion,
    content: MixContentDto,
  ): Promise<Taking> {
    const from = shelfSource(content);
    const lotId = from.kind === 'lot' ? from.lotId : await this.lotOf(tx, darkroomId, from.openedPackIds);
    const makes = await this.chemistries.makesFromLot(tx, darkroomId, lotId, version.chemistryId);
    if (!makes || makes.volumeUl === null) {
      const packIds = await this.stock.lockForMix(tx, darkroomId, { lotId });
      throw packIds.length === 0 ? problem('not-found') : problem('does-not-make', version.document.name);
    }
    const packMakes = { volumeUl: makes.volumeUl, wholeOnly: makes.wholeOnly };
    await this.stock.lockForMix(
      tx,
      darkroomId,
      from.kind === 'lot' ? { lotId } : { openedPackIds: from.openedPackIds },
    );
    return async (within, recording) => {
      const parts = await this.stock.drawForMix(within, recording, 0, {
        packMakes,
        makeUl: content.volumeUl,
        from,
      });
      const cost = await this.stock.costOfDraw(within, darkroomId, {
        lotId,
        makeUl: content.volumeUl,
        packMakes,
      });
      return { draws: parts, packIds: [makes.packId], cost };
    };
  }

  private async lotOf(tx: Tx, darkroomId: string, openedPackIds: string[]): Promise<string> {
    const lotId = await this.chemistries.lotOfOpened(tx, darkroomId, openedPackIds[0] ?? '');
    if (!lotId) throw problem('not-found');
    return lotId;
  }

  private async fromStock(
    tx: Tx,
    darkroomId: string,
    version: ChemistryVersion,
    measured: Measured,
    parent: LockedBottle,
  ): Promise<Taking> {
    if (!(await this.chemistries.makesFromStock(tx, darkroomId, parent.chemistryId, version.chemistryId))) {
      throw problem('does-not-make', version.document.name);
    }
    const volumeUl = stockVolume(measured);
    if (!parent.totals || parent.totals.volumeUl < volumeUl) throw problem('stock-too-little', parent.code);
    return () =>
      Promise.resolve({ draws: [{ parentBottleId: parent.id, volumeUl }], packIds: [], cost: null });
  }
}

/** What of a mix is stock solution: everything that is not water. */
export const stockVolume = (measured: Measured): number =>
  measured.parts.reduce((sum, part) => sum + (part.volumeUl ?? 0), 0);

/** @throws Problem 'cannot-mix' */
export function measure(version: ChemistryVersion, volumeUl: number): Measured {
  try {
    return measureOut(version.document.dilution, volumeUl);
  } catch (error) {
    if (error instanceof MixingError) throw problem('cannot-mix', sentence(error.message));
    throw error;
  }
}

const sentence = (text: string): string => `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;

function byHand(measured: Measured): Taking {
  const draws = measured.parts.flatMap((part): Draw[] => {
    if (part.volumeUl) return [{ volumeUl: part.volumeUl }];
    return part.massMg ? [{ massMg: part.massMg }] : [];
  });
  return () => Promise.resolve({ draws, packIds: [], cost: null });
}

function shelfSource({
  from,
}: MixContentDto): { kind: 'lot'; lotId: string } | { kind: 'opened'; openedPackIds: string[] } {
  if (from.kind === 'lot' && from.lotId) return { kind: 'lot', lotId: from.lotId };
  if (from.kind === 'opened' && from.openedPackIds)
    return { kind: 'opened', openedPackIds: from.openedPackIds };
  throw invalid([{ field: 'content.from', message: 'Say which lot, which opened pack, or which bottle.' }]);
}
