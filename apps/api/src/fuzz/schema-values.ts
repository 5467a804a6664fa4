import { resolve, type Json, type Schema, type Schemas } from './schema.js';

const TEXTS: Readonly<Record<string, string>> = {
  uuid: '0190c8a0-0000-7000-8000-000000000001',
  date: '2026-03-01',
  'date-time': '2026-03-01T18:20:00.000Z',
  'idn-email': 'ada@example.org',
};

/** Right values of that schema: with every field, one for each of its alternatives. */
export function rightValues(given: Schema, schemas: Schemas): Json[] {
  const schema = resolve(given, schemas);
  if (schema.oneOf) return schema.oneOf.flatMap((one) => rightValues(one, schemas));
  if (schema.enum) return [schema.enum[0] as Json];
  if (schema.type === 'object') return objects(schema, schemas);
  if (schema.type === 'array') {
    const [item = null] = rightValues(schema.items ?? {}, schemas);
    return [Array.from({ length: Math.max(schema.minItems ?? 0, 1) }, () => item)];
  }
  if (schema.type === 'integer') return [schema.minimum ?? 0];
  if (schema.type === 'boolean') return [false];
  if (schema.type === 'string')
    return [TEXTS[schema.format ?? ''] ?? 'a'.repeat(Math.max(schema.minLength ?? 0, 1))];
  throw new Error(`Nobody says what is right for ${JSON.stringify(schema)}.`);
}

function objects({ properties = {} }: Schema, schemas: Schemas): Json[] {
  const fields = Object.entries(properties).map(([name, one]) => ({
    name,
    values: rightValues(one, schemas),
  }));
  const most = Math.max(1, ...fields.map(({ values }) => values.length));
  return Array.from({ length: most }, (_, at) =>
    Object.fromEntries(fields.map(({ name, values }) => [name, values[at % values.length] ?? null])),
  );
}

/** A place in a request: the keys that lead there, and the schema of what stands there. */
export interface Place {
  path: readonly string[];
  schema: Schema;
  /** The same for every request that has this field of this schema: `FilmDto.count`. */
  known: string;
}

/** Every place of a value that the schema knows, lists by their first member. */
export function places(
  given: Schema,
  schemas: Schemas,
  value: Json,
  path: readonly string[] = [],
  within = '',
): Place[] {
  const schema = alternative(resolve(given, schemas), value, schemas);
  const known = nameOf(given) ?? within;
  const own: Place[] = [{ path, schema, known }];
  if (Array.isArray(value)) {
    const [first] = value;
    if (first === undefined) return own;
    return [...own, ...places(schema.items ?? {}, schemas, first, [...path, '0'], `${known}[]`)];
  }
  if (typeof value !== 'object' || value === null) return own;
  const kind = typeof value['kind'] === 'string' ? `(${value['kind']})` : '';
  return [
    ...own,
    ...Object.entries(schema.properties ?? {}).flatMap(([name, one]) => {
      const inner = value[name];
      return inner === undefined
        ? []
        : places(one, schemas, inner, [...path, name], `${known}${kind}.${name}`);
    }),
  ];
}

const nameOf = ({ $ref, allOf }: Schema): string | undefined => ($ref ?? allOf?.[0]?.$ref)?.split('/').pop();

/** Of several shapes, the one with the value's own kind. */
function alternative(schema: Schema, value: Json, schemas: Schemas): Schema {
  if (!schema.oneOf || typeof value !== 'object' || value === null || Array.isArray(value)) return schema;
  const fits = schema.oneOf
    .map((one) => resolve(one, schemas))
    .find(({ properties }) => properties?.['kind']?.enum?.includes(value['kind']));
  return fits ?? schema;
}

/** A copy with something else at that place; `undefined` leaves it out. */
export function withAt(value: Json, path: readonly string[], put: Json | undefined): Json {
  const [key, ...rest] = path;
  if (key === undefined) return put ?? null;
  if (Array.isArray(value)) {
    const copy = [...value];
    const at = Number(key);
    if (rest.length === 0 && put === undefined) copy.splice(at, 1);
    else copy[at] = withAt(copy[at] ?? null, rest, put);
    return copy;
  }
  if (typeof value !== 'object' || value === null) return value;
  const entries = Object.entries(value).filter(([name]) => name !== key);
  if (rest.length > 0 || put !== undefined) entries.push([key, withAt(value[key] ?? null, rest, put)]);
  // Keys such as __proto__ become fields of the object's own here, as JSON.parse makes them.
  return Object.fromEntries(entries);
}
