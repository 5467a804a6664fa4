import type { BottleTotals, ChemistryDocument, StepFlag } from '@wetside/chemistry';
import type { LatestEvent } from './crossing.js';

export interface BottleFacts {
  id: string;
  code: string;
  document: ChemistryDocument;
  /** Null: its mix was voided. */
  totals: BottleTotals | null;
  /** Who put it on hold. */
  holdBy: string | null;
}

export interface PackFacts {
  id: string;
  name: string;
  unopened: number;
  onOrder: number;
  /** Null: the house does not watch it. */
  reorderPoint: number | null;
}

export interface LoadFacts {
  /** Its action. */
  id: string;
  by: string;
  happenedOn: string;
  voided: boolean;
  /** A technician accepted it, and that stands. */
  decided: boolean;
  steps: { code: string; flags: StepFlag[] }[];
  film: { format: string; count: number; widthMm: number | null; heightMm: number | null }[];
}

/** What warnings are judged by, as it stands in the transaction. */
export interface AlertFacts {
  bottles: BottleFacts[];
  packs: PackFacts[];
  loads: LoadFacts[];
  /** The newest event of each kind about these subjects. */
  events: LatestEvent[];
}
