import 'reflect-metadata';
import type { Type } from '@nestjs/common';
import type { OpenAPIObject } from '@nestjs/swagger';
import { IsInt, IsNumber, Length, Max, Min } from 'class-validator';
import { readEnvironment } from '../config/environment.js';
import { createApp } from '../create-app.js';
import { Choice, ListOfIds, Text, WholeNumber } from '../platform/dto/fields.js';
import { SEEN_TEXT } from '../platform/dto/text-checks.js';
import { buildOpenApi } from '../platform/http/open-api.js';
import { compareBody, NOTHING, programTakes, together } from './compared.js';
import { comparePath, compareQuery } from './parameters.js';
import { routeInputs, type RouteInput } from './route-inputs.js';
import { SchemaJudge } from './schema-judge.js';
import type { Json, Schema, Schemas } from './schema.js';

const nowhere = 'postgres://nobody@127.0.0.1:1/none';

let document: OpenAPIObject;
let inputs: RouteInput[];
let schemas: Schemas;
let judge: SchemaJudge;

beforeAll(async () => {
  const app = await createApp(
    readEnvironment({
      MODE: 'test',
      DATABASE_URL: nowhere,
      DATABASE_JOBS_URL: nowhere,
      SESSION_SECRET: '-'.repeat(32),
    }),
  );
  // As a reader gets it: JSON.
  document = JSON.parse(JSON.stringify(buildOpenApi(app))) as OpenAPIObject;
  schemas = document.components?.schemas as Schemas;
  judge = new SchemaJudge(schemas);
  inputs = routeInputs(app);
});

const operations = () =>
  Object.entries(document.paths).flatMap(([path, methods]) =>
    (['get', 'put', 'post', 'patch', 'delete'] as const).flatMap((method) => {
      const operation = methods[method];
      return operation ? [{ route: `${method} ${path}`, operation }] : [];
    }),
  );

function bodySchema(route: string): Schema {
  const found = operations().find((one) => one.route === route)?.operation.requestBody;
  const schema = found && 'content' in found ? found.content['application/json']?.schema : undefined;
  if (!schema) throw new Error(`The document says nothing of the body of ${route}.`);
  return schema as Schema;
}

describe('what the program takes is what its OpenAPI document says', () => {
  it('of every body, field by field', async () => {
    const seen = new Set<string>();
    let all = NOTHING;
    for (const { route, metatype } of inputs.filter((input) => input.in === 'body')) {
      if (!metatype) throw new Error(`${route} has a body without a class.`);
      all = together(all, await compareBody(judge, bodySchema(route), schemas, metatype, seen));
    }
    expect(all.differences).toEqual([]);
    expect(all.taken).toBeGreaterThan(all.fields);
    process.stdout.write(
      `bodies: ${all.fields} fields, ${all.asked} requests, ${all.taken} of them taken by both\n`,
    );
  }, 60_000);

  it('of every query and every part of a path', async () => {
    let all = NOTHING;
    for (const input of inputs) {
      if (input.in === 'query') all = together(all, await compareQuery(judge, document, input));
      if (input.in === 'path') all = together(all, await comparePath(judge, document, input));
    }
    expect(all.differences).toEqual([]);
    process.stdout.write(
      `addresses: ${all.fields} parameters, ${all.asked} requests, ${all.taken} of them taken by both\n`,
    );
  });

  it('and nothing of a request is left out of the comparison', () => {
    const compared = (where: string) =>
      inputs.filter((input) => input.in === where).map(({ route }) => route);
    const withBody = operations().filter(({ operation }) => operation.requestBody);
    expect(compared('body').sort()).toEqual(withBody.map(({ route }) => route).sort());
    const withQuery = operations().filter(({ operation }) =>
      operation.parameters?.some((one) => 'in' in one && one.in === 'query'),
    );
    expect(compared('query').sort()).toEqual(withQuery.map(({ route }) => route).sort());
  });
});

describe('lengths are counted in characters, as PostgreSQL does:', () => {
  class Named {
    @Text({ max: 5 })
    name: string;
  }
  const takes = (name: string) => programTakes({ name }, { type: 'body', metatype: Named });

  it.each([
    ['five faces', '\u{1F600}'.repeat(5), true],
    ['six faces', '\u{1F600}'.repeat(6), false],
    [
      'a family of three, which is five characters to a computer',
      '\u{1F469}\u200D\u{1F467}\u200D\u{1F466}',
      true,
    ],
    ['the same and a letter', '\u{1F469}\u200D\u{1F467}\u200D\u{1F466}a', false],
    ['two hearts with their colour and a letter', '❤\ufe0f❤\ufe0fa', true],
    ['three hearts with their colour', '❤\ufe0f❤\ufe0f❤\ufe0f', false],
    ['five letters and space around them', '  abcde\n', true],
    ['nothing that is seen', '\u200b\u2060\ufeff', false],
    ['a NUL', 'a\0b', false],
    ['half a character', 'a\ud83d', false],
  ])('%s', async (_, name, taken) => {
    expect(await takes(name)).toBe(taken);
  });
});

describe('the comparison sees', () => {
  const text = { type: 'string', minLength: 1, maxLength: 6, pattern: SEEN_TEXT, 'x-trimmed': true };
  const count = { type: 'integer', minimum: 1, maximum: 9 };
  const closed = (name: Schema, required = ['it']): Schema => {
    return { type: 'object', properties: { it: name }, required, additionalProperties: false };
  };

  class Shorter {
    @Text({ max: 5 })
    it: string;
  }
  class InUnits {
    @Length(1, 6)
    it: string;
  }
  class Fraction {
    @IsNumber()
    @Min(1)
    @Max(9)
    it: number;
  }
  class Unbounded {
    @IsInt()
    @Min(1)
    it: number;
  }
  class Count {
    @WholeNumber({ min: 1, max: 9 })
    it: number;
  }
  class Kind {
    @Choice(['film', 'stock'])
    it: string;
  }
  class Ids {
    @ListOfIds({ max: 2 })
    it: string[];
  }
  const ids = { type: 'array', items: { type: 'string', format: 'uuid' }, minItems: 0, maxItems: 2 };

  const lies: [string, Schema, Type, string][] = [
    ['a text that may be longer than the program takes', closed(text), Shorter, '"aaaaaa"'],
    ['a length that passes over marks of colour', closed({ ...text, pattern: '' }), InUnits, 'a\ufe0f'],
    ['a number that need not be whole', closed(count), Fraction, '1.5'],
    ['a bound that is not checked', closed(count), Unbounded, '10:'],
    ['a field that is asked for unsaid', closed(count, []), Count, 'left out'],
    ['a field that may be null, unheard', closed({ ...count, nullable: true }), Count, 'null'],
    [
      'a choice that the program does not know',
      closed({ type: 'string', enum: ['film', 'stock', 'both'] }),
      Kind,
      '"both"',
    ],
    ['a choice that the document does not know', closed({ type: 'string', enum: ['film'] }), Kind, '"stock"'],
    [
      'fields that the document leaves open',
      { ...closed(count), additionalProperties: true },
      Count,
      'also "unknown"',
    ],
    ['an id in another writing', closed(ids), Ids, 'urn:uuid:'],
    ['a list that may be longer', closed({ ...ids, maxItems: 3 }), Ids, '['],
  ];

  it.each(lies)('mutant: %s', async (_, schema, metatype, sign) => {
    const { differences } = await compareBody(judge, schema, schemas, metatype, new Set());
    const shown: Json = differences.filter((one) => one.includes(sign));
    expect(shown).not.toEqual([]);
  });
});
