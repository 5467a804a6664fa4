import { problemTable } from './problem-table.js';

/** One field that was wrong, with a sentence the person can act on. `field` is a path such as `film.0.count`. */
export interface FieldProblem {
  field: string;
  message: string;
}

type Table = typeof problemTable;
/** Every reason the API ever gives; stable, so that programs can act on it. */
export type ProblemCode = keyof Table;
type Params<C extends ProblemCode> = Parameters<Table[C]['detail']>;

/** The body of an answer that is not a success (RFC 9457). */
export interface ProblemDocument {
  type: string;
  title: string;
  status: number;
  detail: string;
  code: ProblemCode;
  errors?: FieldProblem[];
  [member: string]: unknown;
}

/** A refusal with a reason: thrown anywhere, answered as a problem document. */
export class Problem extends Error {
  override readonly name = 'Problem';
  /** Headers that go with the answer. */
  headers: Readonly<Record<string, string>> = {};

  constructor(
    readonly code: ProblemCode,
    detail: string,
    private readonly members: Readonly<Record<string, unknown>> = {},
  ) {
    super(detail);
  }

  get status(): number {
    return problemTable[this.code].status;
  }

  toDocument(): ProblemDocument {
    const { status, title } = problemTable[this.code];
    return {
      type: `urn:wetside:problem:${this.code}`,
      title,
      status,
      detail: this.message,
      code: this.code,
      ...this.members,
    };
  }

  /** Adds members of its own to the document, such as the ids of the actions that stand in the way. */
  with(members: Readonly<Record<string, unknown>>): Problem {
    const problem = new Problem(this.code, this.message, { ...this.members, ...members });
    problem.headers = this.headers;
    return problem;
  }

  withHeaders(headers: Readonly<Record<string, string>>): Problem {
    const problem = new Problem(this.code, this.message, this.members);
    problem.headers = { ...this.headers, ...headers };
    return problem;
  }
}

/** The problem of that code; what the sentence needs to know follows the code. */
export function problem<C extends ProblemCode>(code: C, ...params: Params<C>): Problem {
  // The table's type ties the parameters to the code; TypeScript cannot follow that through the index.
  const detail = problemTable[code].detail as (...given: Params<C>) => string;
  return new Problem(code, detail(...params));
}

/** 400: the fields that were wrong. */
export function invalid(errors: FieldProblem[]): Problem {
  return problem('invalid').with({ errors });
}
