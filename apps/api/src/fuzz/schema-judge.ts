import { Ajv, type ValidateFunction } from 'ajv';
import { fullFormats } from 'ajv-formats/dist/formats.js';
import { resolve, type Json, type Schema, type Schemas } from './schema.js';

const FORMATS = ['uuid', 'date', 'date-time'] as const;

/** A second opinion on requests: the document's schemas as a JSON-schema validator reads them. */
export class SchemaJudge {
  private readonly ajv: Ajv;
  private readonly compiled = new Map<Schema, ValidateFunction>();

  constructor(private readonly schemas: Schemas) {
    this.ajv = new Ajv({ strictTypes: false });
    for (const name of FORMATS) this.ajv.addFormat(name, fullFormats[name]);
    this.ajv.addVocabulary(['x-trimmed', 'components']);
    // The pattern beside it says all; the validator knows addresses of ASCII only.
    this.ajv.addFormat('idn-email', true);
    this.ajv.addSchema({ components: { schemas } }, 'document');
  }

  takes(schema: Schema, value: Json): boolean {
    let compiled = this.compiled.get(schema);
    if (!compiled) {
      const text = JSON.stringify(schema).replaceAll('"#/', '"document#/');
      compiled = this.ajv.compile(JSON.parse(text) as Schema);
      this.compiled.set(schema, compiled);
    }
    return compiled(this.trimmed(schema, value));
  }

  /** Space is cut off the fields that the document calls trimmed, as their description has it. */
  private trimmed(given: Schema, value: Json): Json {
    const schema = resolve(given, this.schemas);
    if (typeof value === 'string') return schema['x-trimmed'] ? value.trim() : value;
    if (Array.isArray(value)) return value.map((one) => this.trimmed(schema.items ?? {}, one));
    if (typeof value !== 'object' || value === null) return value;
    return Object.fromEntries(
      Object.entries(value).map(([name, one]) => {
        const own = Object.hasOwn(schema.properties ?? {}, name) ? schema.properties?.[name] : undefined;
        return [name, this.trimmed(own ?? {}, one)];
      }),
    );
  }
}
