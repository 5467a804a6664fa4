import { MetadataScanner } from '@nestjs/core';
import { sql } from 'drizzle-orm';
import type { Database, DarkroomScope, Tx } from '../platform/database/database.js';
import { sqlState } from '../platform/database/sql-errors.js';
import type { Ids } from '../testing/filled-house.js';
import { unknownIds, type RepositoryCalls } from './repository-calls.js';

/** A repository method with a way to call it. */
export interface Method {
  name: string;
  call: (tx: Tx, ids: Ids) => Promise<unknown>;
  outside: boolean;
  /** Whether that answer of it means that there was nothing. */
  saysNothing: (value: unknown) => boolean;
}

/** What a call gave, and whether it changed or locked any row; or how it was refused. */
interface Outcome {
  value: unknown;
  touched: boolean;
  refused: string | null;
}

/** Methods of these repositories, and sentences about those that nobody says how to call. */
export function methodsOf(
  repositories: readonly object[],
  known: readonly RepositoryCalls[],
): { methods: Method[]; complaints: string[] } {
  const methods: Method[] = [];
  const complaints: string[] = [];
  for (const repository of repositories) {
    const calls = known.find(({ type }) => type === repository.constructor);
    const prototype: unknown = Object.getPrototypeOf(repository);
    for (const method of new MetadataScanner().getAllMethodNames(prototype as object)) {
      if (calls?.calls[method]) methods.push(methodOf(repository, method, calls));
      else complaints.push(`Nobody says how to call ${repository.constructor.name}.${method}.`);
    }
  }
  return { methods, complaints };
}

function methodOf(repository: object, method: string, { calls, outside, absent }: RepositoryCalls): Method {
  const name = `${repository.constructor.name}.${method}`;
  const given = calls[method];
  const work: unknown = Reflect.get(repository, method);
  if (typeof work !== 'function' || !given) throw new Error(`${name} is no method.`);
  const word = absent[method];
  return {
    name,
    call: async (tx, ids) => (await Reflect.apply(work, repository, [tx, ...given(ids)])) as unknown,
    outside: outside.includes(method),
    saysNothing: (value) => (word === undefined ? isNothing(value) : value === word),
  };
}

/** Calls the method in a transaction of that darkroom, which is kept or taken back. */
export async function outcomeOf(
  database: Database,
  scope: DarkroomScope,
  method: Method,
  ids: Ids,
  after: 'keep' | 'take back',
): Promise<Outcome> {
  const undone = new Error('taken back');
  const seen: Outcome = { value: null, touched: false, refused: null };
  try {
    await database.inDarkroom(scope, async (tx) => {
      seen.value = await method.call(tx, ids);
      // A transaction gets its number with the first row that it changes or locks.
      const [row] = await tx.execute<{ touched: boolean }>(
        sql`select pg_current_xact_id_if_assigned() is not null as touched`,
      );
      seen.touched = row?.touched ?? false;
      if (after === 'take back') throw undone;
    });
  } catch (error) {
    if (error === undone) return seen;
    return { value: null, touched: false, refused: refusalOf(error) };
  }
  return seen;
}

const refusalOf = (error: unknown): string =>
  sqlState(error) ?? (error instanceof Error ? error.message : String(error));

/** Nothing at all, however it is wrapped. */
export function isNothing(value: unknown): boolean {
  if (value === null || value === undefined || value === 0 || value === false) return true;
  if (value instanceof Map || value instanceof Set) return [...value.values()].every(isNothing);
  if (Array.isArray(value)) return value.every(isNothing);
  if (typeof value !== 'object' || value instanceof Date) return false;
  return Object.values(value).every(isNothing);
}

/** The call reached its own darkroom's rows; else the other outcomes would prove nothing. */
export function controlComplaint(
  { name, saysNothing }: Method,
  { value, touched, refused }: Outcome,
): string[] {
  // A row that is there already was found by its key: that is reaching it.
  if (refused === '23505' || touched || (refused === null && !saysNothing(value))) return [];
  return [`${name} reaches nothing even in its own darkroom (${refused ?? 'no rows'}).`];
}

const REFUSALS = [/^42501$/, /has no rules here/];

/** Asked for another darkroom's rows, it gives, changes and locks none. */
export function shutComplaint({ name, saysNothing }: Method, { value, touched, refused }: Outcome): string[] {
  if (refused !== null)
    return REFUSALS.some((good) => good.test(refused)) ? [] : [`${name} failed: ${refused}.`];
  return [
    ...(saysNothing(value) ? [] : [`${name} gives rows of another darkroom.`]),
    ...(touched ? [`${name} changes or locks rows of another darkroom.`] : []),
  ];
}

/** Named by their ids, another darkroom's rows are to it what was never there. */
export async function strangersComplaint(
  database: Database,
  scope: DarkroomScope,
  method: Method,
  foreign: Ids,
): Promise<string[]> {
  const theirs = { ...foreign, darkroomId: scope.darkroomId };
  const none = unknownIds(theirs);
  const met = await outcomeOf(database, scope, method, theirs, 'take back');
  const unmet = await outcomeOf(database, scope, method, none, 'take back');
  return textOf(met, theirs) === textOf(unmet, none)
    ? []
    : [`${method.name} knows another darkroom's ids from ids that never were.`];
}

/** The outcome as text in which ids stand under what they are ids of. */
function textOf(outcome: Outcome, ids: Ids): string {
  const text = JSON.stringify(outcome, (_, value: unknown) =>
    value instanceof Map || value instanceof Set ? [...value] : value,
  );
  return Object.entries(ids).reduce((so, [name, id]) => so.replaceAll(id, name), text);
}
