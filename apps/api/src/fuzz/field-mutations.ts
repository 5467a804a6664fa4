import {
  anyValues,
  dateTexts,
  idTexts,
  mailTexts,
  momentTexts,
  strangeNames,
  textEdges,
  textsOfLength,
} from './edge-values.js';
import { places, withAt, type Place } from './schema-values.js';
import type { Json, Schema, Schemas } from './schema.js';

/** A request with one thing changed in it. */
export interface Mutation {
  /** `content.film.0.count` */
  field: string;
  what: string;
  request: Json;
}

/** Everything that is tried in one place, at both sides of each of its bounds and across all types. */
function tries(schema: Schema, value: Json, words: readonly Json[]): (Json | undefined)[] {
  const all: (Json | undefined)[] = [
    undefined,
    ...anyValues,
    ...(schema.enum ?? []).flatMap((one) => near(one as Json)),
  ];
  if (schema.enum) all.push(...words);
  if (schema.type === 'integer') all.push(...numbers(schema));
  if (schema.type === 'array' && Array.isArray(value)) all.push(...lists(schema, value));
  if (schema.type === 'string') all.push(...texts(schema));
  if (schema.type === 'object') all.push([value]);
  return all;
}

function near(one: Json): Json[] {
  if (typeof one !== 'string') return [one, JSON.stringify(one)];
  return [one, one.toUpperCase(), ` ${one}`, `${one}\0`, one.slice(1), [one]];
}

function numbers({ minimum = 0, maximum = 0 }: Schema): Json[] {
  return [minimum, maximum].flatMap((bound) =>
    [bound - 1, bound, bound + 1].flatMap((near) => [near, near + 0.5, String(near), `${near}n`]),
  );
}

function lists({ minItems = 0, maxItems = 0 }: Schema, value: Json[]): Json[] {
  const [one = null] = value;
  const of = (length: number): Json[] => Array.from({ length: Math.max(0, length) }, () => one);
  return [minItems - 1, minItems, minItems + 1, maxItems - 1, maxItems, maxItems + 1]
    .map((length): Json => of(length))
    .concat([[...value, null], [...value, 'x'], [[one]], [...of(maxItems - 1), {}]], [{ ...of(1) }]);
}

const WRITINGS: Readonly<Record<string, readonly string[]>> = {
  uuid: idTexts,
  date: dateTexts,
  'date-time': momentTexts,
  'idn-email': mailTexts,
};

function texts({ minLength = 0, maxLength, format = '', enum: closed }: Schema): Json[] {
  if (closed) return textEdges.slice(0, 12);
  const lengths =
    maxLength === undefined
      ? []
      : [minLength - 1, minLength, minLength + 1, maxLength - 1, maxLength, maxLength + 1];
  return [...lengths.flatMap(textsOfLength), ...textEdges, ...(WRITINGS[format] ?? [])];
}

/** Every word of every closed list of the document, so that a list which the program keeps longer is seen. */
function wordsOf(schemas: Schemas): Json[] {
  const lists = [...JSON.stringify(schemas).matchAll(/"enum":(\[[^\]]*\])/g)];
  return [...new Set(lists.flatMap(([, list = '[]']) => JSON.parse(list) as Json[]))];
}

/** What is tried again where the same field of the same schema was tried in another request already. */
const AGAIN: readonly (Json | undefined)[] = [undefined, null, 0, 'x', [], {}];

/**
 * Every mutation of every place of a right request.
 * @param seen fields of schemas that were tried before; they are added to
 */
export function mutations(schema: Schema, schemas: Schemas, right: Json, seen: Set<string>): Mutation[] {
  const words = wordsOf(schemas);
  return places(schema, schemas, right).flatMap((place) => {
    const before = seen.has(place.known);
    seen.add(place.known);
    return inPlace(place, right, before ? null : words);
  });
}

/** @param words null where the field was tried before */
function inPlace({ path, schema }: Place, right: Json, words: readonly Json[] | null): Mutation[] {
  const field = path.join('.');
  const there = path.reduce<Json>((at, key) => child(at, key), right);
  const changed = (words ? tries(schema, there, words) : AGAIN)
    // The parser of bodies lets objects through and nothing else: the body itself only changes inside.
    .filter((put) => field !== '' || isObject(put))
    .map((put) => ({ field, what: told(put), request: withAt(right, path, put) }));
  if (schema.type !== 'object') return changed;
  const strange = (words ? strangeNames : strangeNames.slice(0, 1)).map((name) => ({
    field,
    what: `also ${JSON.stringify(name)}`,
    request: withAt(right, [...path, name], 1),
  }));
  return [...changed, ...strange];
}

const child = (at: Json, key: string): Json =>
  typeof at === 'object' && at !== null ? ((at as Record<string, Json>)[key] ?? null) : null;

const isObject = (value: Json | undefined): boolean =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

const told = (put: Json | undefined): string =>
  put === undefined ? 'left out' : JSON.stringify(put === Infinity ? '1e999' : put).slice(0, 60);
