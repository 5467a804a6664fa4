import type { BottleTotals, ChemistryDocument } from '@wetside/chemistry';

/** The documents that the API passes on as the rules' package made them, by the names of their fields. */
interface Documents {
  document: ChemistryDocument;
  versions: Record<string, ChemistryDocument>;
  totals: BottleTotals;
}

/** An answer as the API describes it, with the documents inside it in the types of the rules' package. */
export type Refined<T> = T extends readonly (infer One)[]
  ? Refined<One>[]
  : T extends object
    ? { [Field in keyof T]: Field extends keyof Documents ? Documents[Field] : Refined<T[Field]> }
    : T;
