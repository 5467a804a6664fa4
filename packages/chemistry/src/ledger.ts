import type { Container, ContainerState } from './container.js';
import type { LocalDate } from './dates.js';
import type { Material } from './film.js';
import type { FractionText } from './fraction.js';

export type PerMaterialE4 = Partial<Record<Material, number>>;

/** What every fact carries. Order is (happenedAt, seq, part), never the id. */
export interface FactBase {
  actionId: string;
  seq: number;
  /** Which of several facts of one action on one bottle, from 0. */
  part?: number;
  happenedAt: string;
  happenedOn: LocalDate;
  voided?: boolean;
}

/** What a bottle is when it first stands there. */
export interface Opening {
  volumeUl: number;
  container: Container;
  material: Material | null;
  readyAt?: string;
}

/** One thing that happened to one bottle. Volumes in µL, rolls in 1/10,000. */
export type BottleFact = FactBase &
  (
    | ({ kind: 'mix' } & Opening)
    | ({
        kind: 'standing';
        about: true;
        mixedOn: LocalDate;
        firstUsedOn?: LocalDate;
        usedE4: PerMaterialE4;
      } & Opening)
    | { kind: 'load'; charges: { material: Material; countedE4: number; takenUl: number }[] }
    | { kind: 'hold'; reason: string }
    | { kind: 'release' }
    | { kind: 'discard' }
    | { kind: 'draw'; takenUl: number }
    | { kind: 'top-up'; addedUl: number; replenisher?: boolean }
    | { kind: 'container-change'; container: Container }
    | { kind: 'reading'; shareE4: PerMaterialE4 }
    | {
        kind: 'adjustment';
        material: Material;
        deltaE4: number;
        reason: string;
        kindOf: 'uncounted-use' | 'raise';
      }
    | TransferIn
    | { kind: 'transfer-out'; volumeUl: number; usedE4: PerMaterialE4; ceilingE4?: PerMaterialE4 }
  );

/** Solution poured in from another bottle, with its history. `opens` makes it the bottle's first fact. */
export interface TransferIn {
  kind: 'transfer-in';
  volumeUl: number;
  ratedVolumeUl?: number;
  usedE4: PerMaterialE4;
  ceilingE4?: PerMaterialE4;
  mixedOn?: LocalDate;
  firstUsedOn?: LocalDate | null;
  lifeUsed?: FractionText;
  useLifeUsed?: FractionText;
  about?: boolean;
  opens?: { container: Container; material: Material | null; readyAt?: string };
}

/** Where a bottle stands, as fold and apply leave it. Plain JSON. */
export interface BottleTotals {
  usedE4: PerMaterialE4;
  volumeUl: number;
  /** The volume that the rated capacity rests on: what was mixed, less what was drawn off. */
  ratedVolumeUl: number;
  container: Container;
  containerState: ContainerState;
  stateSince: LocalDate;
  /** The share of its keeping that passed in states before the present one: from mixing, and from first use. */
  lifeUsed: FractionText;
  useLifeUsed: FractionText;
  /** Set when the life had ended before the container was changed: no change brings it back. */
  endedOn: LocalDate | null;
  material: Material | null;
  mixedOn: LocalDate;
  firstUsedOn: LocalDate | null;
  readyAt: string | null;
  about: boolean;
  /** What tests leave at most, lowered by each later load. */
  ceilingE4: PerMaterialE4;
  replenishedUl: number;
  hold: { actionId: string; since: string; reason: string } | null;
  discardedAt: string | null;
  lastActionId: string;
  lastHappenedAt: string;
  lastSeq: number;
  lastPart: number;
  loads: number;
}

/** A fact older than the newest, or one for a bottle that is not there: fold the whole history instead. */
export class LedgerOrderError extends Error {
  override name = 'LedgerOrderError';
}
