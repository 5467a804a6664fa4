/** The part of JSON Schema 2020-12 that chemistry documents are described in. */
export interface Schema {
  $ref?: string;
  $defs?: Record<string, Schema>;
  title?: string;
  type?: 'object' | 'array' | 'string' | 'integer' | 'boolean';
  const?: string | number | boolean;
  enum?: string[];
  properties?: Record<string, Schema>;
  required?: string[];
  additionalProperties?: boolean | Schema;
  items?: Schema;
  minItems?: number;
  minLength?: number;
  minimum?: number;
  oneOf?: Schema[];
}

export const ref = (name: string): Schema => ({ $ref: `#/$defs/${name}` });
export const listOf = (items: Schema): Schema => ({ type: 'array', items });

/** An object with these fields and no others: a misspelt field is an error, not a silent loss. */
export const object = (required: Record<string, Schema>, optional: Record<string, Schema> = {}): Schema => ({
  type: 'object',
  properties: { ...required, ...optional },
  required: Object.keys(required),
  additionalProperties: false,
});

const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

function typeFits(type: Schema['type'], value: unknown): boolean {
  if (type === 'object') return isObject(value);
  if (type === 'array') return Array.isArray(value);
  if (type === 'integer') return Number.isSafeInteger(value);
  return typeof value === type;
}

function objectFault(
  schema: Schema,
  value: Record<string, unknown>,
  at: string,
  root: Schema,
): string | null {
  const missing = schema.required?.find((key) => !Object.hasOwn(value, key));
  if (missing !== undefined) return `${at}/${missing} is missing`;
  for (const [key, member] of Object.entries(value)) {
    const declared = schema.properties;
    const own = declared && Object.hasOwn(declared, key) ? declared[key] : schema.additionalProperties;
    if (own === false) return `${at}/${key} is not known`;
    const fault = typeof own === 'object' ? faultIn(own, member, `${at}/${key}`, root) : null;
    if (fault) return fault;
  }
  return null;
}

/** Of several shapes the one whose fixed words fit is the one that was meant, so its fault is the one to tell. */
function oneOfFault(shapes: Schema[], value: unknown, at: string, root: Schema): string | null {
  const faults = shapes.map((shape) => faultIn(shape, value, at, root));
  const fitting = faults.filter((fault) => fault === null).length;
  if (fitting === 1) return null;
  if (fitting > 1 || !isObject(value)) return `${at} fits none of its shapes`;
  const meant = shapes.findIndex((shape) =>
    Object.entries(shape.properties ?? {}).some(
      ([key, field]) => 'const' in field && field.const === value[key],
    ),
  );
  return faults[meant] ?? `${at} fits none of its shapes`;
}

/** The first place where the value is not what the schema says, as a sentence, or null. */
export function faultIn(schema: Schema, value: unknown, at = '', root: Schema = schema): string | null {
  const place = at === '' ? 'the document' : at;
  if (schema.$ref !== undefined) {
    const target = root.$defs?.[schema.$ref.replace('#/$defs/', '')];
    return target ? faultIn(target, value, at, root) : `${place}: no such definition`;
  }
  if (schema.type && !typeFits(schema.type, value)) return `${place} is no ${schema.type}`;
  if (schema.const !== undefined && value !== schema.const) return `${place} is not ${String(schema.const)}`;
  if (schema.enum && !schema.enum.some((word) => word === value)) {
    return `${place} is none of ${schema.enum.join(', ')}`;
  }
  if (typeof value === 'string' && value.length < (schema.minLength ?? 0)) return `${place} is empty`;
  if (typeof value === 'number' && value < (schema.minimum ?? -Infinity)) return `${place} is too small`;
  if (schema.oneOf) return oneOfFault(schema.oneOf, value, at, root);
  if (isObject(value)) return objectFault(schema, value, at, root);
  if (!Array.isArray(value)) return null;
  if (value.length < (schema.minItems ?? 0)) return `${place} is too short`;
  if (!schema.items) return null;
  for (const [index, member] of value.entries()) {
    const fault = faultIn(schema.items, member, `${at}/${index}`, root);
    if (fault) return fault;
  }
  return null;
}
