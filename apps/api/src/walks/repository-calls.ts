import { v7 } from 'uuid';
import type { Tx } from '../platform/database/database.js';
import type { Ids } from '../testing/filled-house.js';

/** A repository's class, as Nest knows it. */
export type RepositoryType = abstract new (...args: never[]) => object;
export type Arguments = (ids: Ids) => readonly unknown[];

type Rest<F> = F extends (tx: Tx, ...rest: infer R) => unknown ? R : never;
/** Arguments for every public method; the compiler asks for each. */
type CallsOf<R> = { [K in keyof R]: (ids: Ids) => Rest<R[K]> };

/** How to call the methods of one repository about the rows that are named. */
export interface RepositoryCalls {
  type: RepositoryType;
  calls: Readonly<Record<string, Arguments>>;
  /** Methods about rows that stand outside any darkroom: they must leave every darkroom's rows alone. */
  outside: readonly string[];
  /** What a method answers that finds nothing, where that is a word and not an emptiness. */
  absent: Readonly<Record<string, string>>;
}

interface Options<K extends string> {
  inner?: Record<string, Arguments>;
  outside?: K[];
  absent?: Record<string, string>;
}

/**
 * In two steps, so that the compiler knows the class before it reads the arguments.
 * `inner` are arguments for the methods that only the class itself calls.
 */
export function callsOf<T extends RepositoryType>(type: T) {
  return (
    calls: CallsOf<InstanceType<T>>,
    { inner = {}, outside = [], absent = {} }: Options<keyof InstanceType<T> & string> = {},
  ): RepositoryCalls => ({ type, calls: { ...calls, ...inner }, outside, absent });
}

/** Ids of nothing that ever was, in the same darkroom and for the same person. */
export function unknownIds(ids: Ids): Ids {
  const none = Object.fromEntries(Object.keys(ids).map((name) => [name, v7()])) as Ids;
  return { ...none, darkroomId: ids.darkroomId, personId: v7() };
}
