interface SqlError {
  code?: unknown;
  constraint_name?: unknown;
}

/** PostgreSQL's own error: Drizzle wraps it, so it may stand one or more causes down. */
function sqlErrorOf(error: unknown): SqlError | null {
  for (let at: unknown = error; at instanceof Error; at = at.cause) {
    if ('code' in at && typeof at.code === 'string' && /^[0-9A-Z]{5}$/.test(at.code)) return at;
  }
  return null;
}

/** The SQLSTATE, or null when the error did not come from PostgreSQL. */
export function sqlState(error: unknown): string | null {
  const code = sqlErrorOf(error)?.code;
  return typeof code === 'string' ? code : null;
}

/** Deadlock (40P01) and serialisation failure (40001): nothing was wrong with the work itself. */
export function isWorthAnotherTry(error: unknown): boolean {
  const state = sqlState(error);
  return state === '40P01' || state === '40001';
}

/** Whether the row was refused by that unique constraint or unique index. */
export function isUniqueViolation(error: unknown, constraintName: string): boolean {
  const found = sqlErrorOf(error);
  return found?.code === '23505' && found.constraint_name === constraintName;
}

/** Whether the row was refused because what it names is not there (in its darkroom). */
export function isForeignKeyViolation(error: unknown, constraintName: string): boolean {
  const found = sqlErrorOf(error);
  return found?.code === '23503' && found.constraint_name === constraintName;
}
