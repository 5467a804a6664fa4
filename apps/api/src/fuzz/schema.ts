/** As much of a JSON schema as the API's requests use. */
export interface Schema {
  $ref?: string;
  type?: string;
  enum?: readonly unknown[];
  format?: string;
  pattern?: string;
  minimum?: number;
  maximum?: number;
  minLength?: number;
  maxLength?: number;
  minItems?: number;
  maxItems?: number;
  items?: Schema;
  required?: readonly string[];
  properties?: Readonly<Record<string, Schema>>;
  additionalProperties?: boolean;
  allOf?: readonly Schema[];
  oneOf?: readonly Schema[];
  nullable?: boolean;
  'x-trimmed'?: boolean;
}

export type Schemas = Readonly<Record<string, Schema>>;
export type Json = null | boolean | number | string | Json[] | { [key: string]: Json };

/** What a reference stands for. @throws Error when there is nothing by that name */
export function resolve(schema: Schema, schemas: Schemas): Schema {
  const only = schema.allOf?.length === 1 ? schema.allOf[0] : undefined;
  if (only) return { ...schema, ...resolve(only, schemas) };
  if (schema.$ref === undefined) return schema;
  const found = schemas[schema.$ref.replace('#/components/schemas/', '')];
  if (!found) throw new Error(`There is no schema ${schema.$ref}.`);
  return found;
}
