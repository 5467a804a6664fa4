import type { ContainerMaterial, ContainerState } from './container.js';
import type { FilmClass, Material } from './film.js';
import type { Dilution } from './mixing.js';
import type { Process, Role, WasteRoute, WayOfUse } from './role.js';

export { roleLetters } from './role.js';
export type { Process, Role, WasteRoute, WayOfUse } from './role.js';

/** Where a figure was read. Only the first kind may be trusted without a second look. */
export interface Source {
  kind: 'published' | 'second-hand' | 'common-practice' | 'memory' | 'darkroom';
  text: string;
}

/** What every figure carries: the key of its source, and whether that sheet is this darkroom's own product's. */
export interface Sourced {
  source: string;
  sheetInHand?: boolean;
  note?: string;
}

/** Capacity for a material: 1/10,000 of a roll (or 8×10 print) per litre of the mix, or for a whole bottle. */
export type CapacityFigure = Sourced &
  ({ per: 'litre'; rollsE4: number } | { per: 'bottle'; rollsE4: number; bottleUl?: number });

/** A material the chemistry works on. No capacity figure means that the capacity is not known. */
export interface MaterialUse {
  material: Material;
  capacity: CapacityFigure[];
  dilution?: Dilution;
}

/** How much faster a class of film tires the bath: 20,000 = twice. Classes not named count once. */
export interface FilmFactor extends Sourced {
  filmClass: FilmClass;
  factorE4: number;
}

/** Time growth by the rolls before this load, per litre of the mix, of the original time, not compounded. */
export type UseRule = Sourced &
  (
    | { kind: 'percent-per-rolls'; growthE4: number; everyRollsE4: number; perLitre: true }
    | { kind: 'table'; steps: { fromRollsE4: number; factorE4: number }[] }
  );

export type Agitation = 'hand' | 'rotary' | 'rack' | 'tray' | 'stand';

/** A published time: film rows name film and index, a fixed process names neither. Temperature in 1/100 °C. */
export interface TimeRow extends Sourced {
  film?: string;
  exposureIndex?: number;
  material?: Material;
  dilution?: string;
  agitation?: Agitation;
  temperatureCc: number;
  toleranceCc?: number;
  seconds: number;
  toSeconds?: number;
  /** 'at-least' for a monobath or a fixer: more time does no harm. */
  bound?: 'at-least' | 'exact';
}

/** A step of a process that is not a bottle of its own, or the step this chemistry makes. */
export interface ProcessStep extends Sourced {
  name: string;
  seconds: number;
  temperatureCc: number;
  toleranceCc: number;
}

export interface Duration {
  count: number;
  unit: 'months' | 'weeks' | 'days';
}

/** How long the solution keeps in a state, from mixing or from its first use. */
export interface KeepingFigure extends Sourced {
  state: ContainerState;
  keeps: Duration;
  from: 'mixing' | 'first-use';
  container?: { minSizeUl?: number; maxSizeUl?: number; materials?: ContainerMaterial[] };
}

export interface ConcentrateKeeping extends Sourced {
  opened: boolean;
  keeps: Duration;
}

/** A test of the bath. A test only takes life away. */
export type TestMethod = Sourced &
  (
    | { kind: 'clip'; spentAtFactorE4: number; toleranceCc: number }
    | { kind: 'silver'; limitMgPerL: number; material?: Material }
    | { kind: 'indicator'; fresh: string; turning: string; spent: string }
    | { kind: 'ph'; spentAboveE2?: number; spentBelowE2?: number }
    | { kind: 'control-strip'; what: string }
    | { kind: 'iodide'; method: string }
    | { kind: 'control-clip'; what: string }
  );

/** What the chemistry is bought or made of. A powder packet is mixed whole. */
export interface Part {
  name: string;
  form: 'powder-packet' | 'liquid' | 'single-chemical' | 'ready-to-use';
  divisible: boolean;
}

/** Before this the fresh mix is not used: cooled, cleared, stood. */
export interface ReadyAfter extends Sourced {
  seconds: number;
  why: string;
}

export interface Replenishment extends Sourced {
  ulPerRoll: number;
  needsStarter?: boolean;
}

/** What a one-shot load takes at least, whatever the tank holds, in microlitres of stock. */
export interface OneShot extends Sourced {
  leastStockPerRollUl: number;
  workingDilution?: Dilution;
}

/** One immutable version of a chemistry. Later schema 1 documents may add optional fields. */
export interface ChemistryDocument {
  schema: 1;
  name: string;
  role: Role;
  processes: Process[];
  use: WayOfUse;
  dilution: Dilution;
  /** Where the ratio or the formula was read. */
  dilutionSources: Sourced[];
  water: 'tap' | 'distilled';
  materials: MaterialUse[];
  filmFactors: FilmFactor[];
  useRule?: UseRule;
  timeRows: TimeRow[];
  steps?: ProcessStep[];
  keeping: KeepingFigure[];
  keepingNote?: string;
  concentrateKeeping: ConcentrateKeeping[];
  tests: TestMethod[];
  endsAtOnce?: string[];
  parts: Part[];
  readyAfter?: ReadyAfter;
  replenishment?: Replenishment;
  oneShot?: OneShot;
  /** Never in a line's verdict and never mail: a fresh litre is a matter of minutes. */
  cheapToRenew: boolean;
  cautions: string[];
  hazardNote: string;
  waste: { route: WasteRoute; note: string };
  sources: Record<string, Source>;
}

/** cheapToRenew where a document's author says nothing. */
export const cheapByDefault = (role: Role): boolean =>
  role === 'stop-bath' || role === 'washing-aid' || role === 'wetting-agent';
