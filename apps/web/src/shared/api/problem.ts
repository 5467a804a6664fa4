export interface FieldProblem {
  field: string;
  message: string;
}

/** An answer that says no, in words a person can act on (a problem document). */
export class ProblemError extends Error {
  override name = 'ProblemError';
  constructor(
    readonly status: number,
    readonly code: string,
    readonly detail: string,
    readonly fields: readonly FieldProblem[] = [],
  ) {
    super(detail);
  }
}

/** No answer came: nobody knows whether the request arrived. */
export class NetworkError extends Error {
  override name = 'NetworkError';
}

const isText = (value: unknown): value is string => typeof value === 'string';

function fieldsOf(value: unknown): FieldProblem[] {
  if (!Array.isArray(value)) return [];
  return value.flatMap((entry: unknown) => {
    const { field, message } = (entry ?? {}) as Partial<FieldProblem>;
    return isText(field) && isText(message) ? [{ field, message }] : [];
  });
}

/** Reads a problem document; a body that is none still gives an error with words. */
export function problemOf(status: number, body: unknown): ProblemError {
  const { code, detail, title, errors } = (body ?? {}) as Record<string, unknown>;
  const words = isText(detail)
    ? detail
    : isText(title)
      ? title
      : 'The server gave an answer that cannot be read.';
  return new ProblemError(status, isText(code) ? code : 'unknown', words, fieldsOf(errors));
}

/** The request may or may not have been carried out, so the same one is sent again. */
export const isUncertain = (error: unknown): boolean =>
  error instanceof NetworkError ||
  (error instanceof ProblemError && (error.status >= 500 || error.status === 429 || error.status === 401));

/** Worth another try at once: nothing but time stands in the way. */
export const isPassing = (error: unknown): boolean =>
  isUncertain(error) && !(error instanceof ProblemError && error.status === 401);

/** Words for any failure. */
export const wordsOf = (error: unknown): string =>
  error instanceof ProblemError ? error.detail : 'No signal. Nothing came back from the server.';
