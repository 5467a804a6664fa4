import type { BottleTotals, ChemistryDocument } from '@wetside/chemistry';
import type { bottles } from '@wetside/db';

/** A bottle under its row lock, with all that its rules need. */
export interface LockedBottle {
  id: string;
  code: string;
  material: (typeof bottles.$inferSelect)['material'];
  chemistryVersionId: string;
  chemistryId: string;
  document: ChemistryDocument;
  madeByActionId: string;
  /** When it was mixed. */
  madeAt: Date;
  /** Null: its mix was voided, it never stood here. */
  totals: BottleTotals | null;
}
