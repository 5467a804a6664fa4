/** What a code means: its status, its short title, and the sentence for this case. */
export interface ProblemKind {
  status: number;
  title: string;
  // `never[]` lets each kind name its own parameters while the table still checks the rest.
  detail: (...params: never[]) => string;
}
