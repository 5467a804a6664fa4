import type { LocalDate } from './dates.js';
import type { Material } from './film.js';
import type { PerMaterialE4 } from './ledger.js';

export interface Thresholds {
  lowShareE4: number;
  lowRollsE4: number;
  nearDaysMax: number;
  nearShareE4: number;
}

/** 20 % or 3 rolls, 7 days or a quarter of the keeping. Ours, editable by the darkroom; no source. */
export const defaultThresholds: Thresholds = {
  lowShareE4: 2_000,
  lowRollsE4: 30_000,
  nearDaysMax: 7,
  nearShareE4: 2_500,
};

export type Verdict =
  | 'open'
  | 'low'
  | 'near-date'
  | 'spent'
  | 'past-date'
  | 'on-hold'
  | 'discarded'
  | 'not-ready'
  | 'volume-short';
export type Condition = 'low' | 'near' | 'spent' | 'past-date' | 'on-hold';
export type LimitKind = 'capacity' | 'date' | 'volume' | 'test' | 'hold' | 'ready';

/** One thing that can stop a bottle, with its figures. shareLeftE4: 0 = reached, null = not a matter of degree. */
export interface Limit {
  kind: LimitKind;
  closes: boolean;
  shareLeftE4: number | null;
  text: string;
  sourceKeys: string[];
  material?: Material;
  leftE4?: number;
  ratedE4?: number;
  lastDay?: LocalDate;
  daysLeft?: number;
  volumeUl?: number;
  neededUl?: number;
  at?: string;
}

export interface AssessContext {
  /** The present instant, ISO. */
  now: string;
  today: LocalDate;
  zone: string;
  smallestTankUl: number | null;
  thresholds: Thresholds;
  material?: Material;
}

/** How a bottle stands. Rolls in 1/10,000, volumes in µL. */
export interface Assessment {
  verdict: Verdict;
  /** Nobody should load it. */
  closed: boolean;
  /** Every condition that is true, whichever of them the verdict names. */
  conditions: Condition[];
  /** Tightest first. */
  limits: Limit[];
  governs: LimitKind | null;
  /** null = the capacity is not known. Never negative: what is over stands in overE4. */
  leftE4: Partial<Record<Material, number | null>>;
  overE4: PerMaterialE4;
  ratedE4: Partial<Record<Material, number | null>>;
  /** The material that the verdict and the sentence speak of. */
  material: Material | null;
  lastDay: LocalDate | null;
  daysLeft: number | null;
  owedUl: number | null;
  reasons: string[];
  sentence: string;
  /** The instant at which time alone changes the answer, or null. */
  nextLookAt: string | null;
}
