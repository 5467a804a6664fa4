import { OutOfTime } from './within.js';

interface SqlError {
  code?: unknown;
  cause?: unknown;
  constraint_name?: unknown;
}

/** The error that carries a code of that shape: Drizzle wraps it, so it may stand one or more causes down. */
function coded(error: unknown, shape: RegExp): SqlError | null {
  // By its looks: Node's own errors are of another realm where tests run in one of theirs.
  for (
    let at = error as SqlError | null | undefined;
    typeof at === 'object' && at;
    at = at.cause as SqlError
  ) {
    if (typeof at.code === 'string' && shape.test(at.code)) return at;
  }
  return null;
}

const sqlErrorOf = (error: unknown) => coded(error, /^[0-9A-Z]{5}$/);

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

const LOST = /^(CONNECTION_(CLOSED|DESTROYED|ENDED)|ECONNRESET|EPIPE|ETIMEDOUT)$/;
/** No connection came about: by the network, or because the database lets nobody in just now (57P03, 53300). */
const AWAY = /^(ECONNREFUSED|EHOSTUNREACH|ENETUNREACH|ENOTFOUND|EAI_AGAIN|CONNECT_TIMEOUT)$/;
const AWAY_STATES = /^(08...|53...|57P0[1-4])$/;

/** The connection was there and is gone; whether the last statement was carried out, nobody knows. */
export const isConnectionLost = (error: unknown): boolean => coded(error, LOST) !== null;

export type DatabaseTrouble = 'unavailable' | 'interrupted' | 'held-up' | 'too-slow';

/**
 * What stood in the way when the work itself was sound, by the codes of PostgreSQL (SQLSTATE, appendix A of its
 * manual), of the driver and of Node; null for every other error. After each of them the same action may be sent again.
 */
export function databaseTrouble(error: unknown): DatabaseTrouble | null {
  if (error instanceof OutOfTime) return 'too-slow';
  if (isConnectionLost(error)) return 'interrupted';
  if (coded(error, AWAY)) return 'unavailable';
  const state = sqlState(error);
  if (state === null) return null;
  if (AWAY_STATES.test(state)) return 'unavailable';
  if (state === '55P03' || isWorthAnotherTry(error)) return 'held-up';
  // 25P03 and 25P04: the transaction stood idle, or lasted, beyond its limit.
  if (state === '57014' || state === '25P03' || state === '25P04') return 'too-slow';
  return null;
}

/** Whether other work over the same connections must be expected to fare no better. */
export function isAboutConnection(error: unknown): boolean {
  // It has no room for more (class 53): the connections that there are serve on.
  if (sqlState(error)?.startsWith('53')) return false;
  const trouble = databaseTrouble(error);
  return trouble === 'unavailable' || trouble === 'interrupted' || error instanceof OutOfTime;
}
