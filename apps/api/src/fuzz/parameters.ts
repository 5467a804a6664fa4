import type { OpenAPIObject } from '@nestjs/swagger';
import { anyValues, idTexts, strangeNames, textEdges, textsOfLength } from './edge-values.js';
import { NOTHING, programTakes, word, type Compared } from './compared.js';
import type { RouteInput } from './route-inputs.js';
import type { SchemaJudge } from './schema-judge.js';
import type { Json, Schema } from './schema.js';

interface Parameter {
  name: string;
  in: string;
  required?: boolean;
  schema: Schema;
}

/** The parameters that the document names for a route. */
function documented(document: OpenAPIObject, route: string, where: string): Parameter[] {
  const [method = '', path = ''] = route.split(' ');
  const operation = document.paths[path]?.[method as 'get'];
  // What Nest writes there has schemas in place, and no references.
  return ((operation?.parameters ?? []) as Parameter[]).filter((one) => one.in === where);
}

/** All that may stand in an address for a parameter: texts, for there is nothing else, or several of them. */
function texts({ schema }: Parameter): Json[] {
  const { minimum = 0, maximum = 0, minLength = 0, maxLength = 12 } = schema;
  const bounds = [minimum, maximum].flatMap((bound) =>
    [bound - 1, bound, bound + 1].flatMap((near) => [
      `${near}`,
      `0${near}`,
      `${near}.0`,
      `+${near}`,
      ` ${near}`,
    ]),
  );
  const lengths = [minLength, maxLength].flatMap((length) =>
    [length - 1, length, length + 1].flatMap(textsOfLength),
  );
  const choices = (schema.enum ?? [])
    .map(String)
    .flatMap((one) => [one, one.toUpperCase(), `${one} `, [one], [one, one]]);
  return [
    ...bounds,
    ...lengths,
    ...choices,
    ...textEdges,
    ...idTexts,
    ...anyValues.map(String),
    '1e1',
    [],
    ['1', '2'],
  ];
}

/** A whole number stands in an address in decimal digits, which a schema has no words for. */
const read = ({ schema }: Parameter, text: Json): Json =>
  schema.type === 'integer' && typeof text === 'string' && /^-?\d+$/.test(text) ? Number(text) : text;

/** A route's query, parameter by parameter, and names that it does not know, which it must refuse. */
export async function compareQuery(
  judge: SchemaJudge,
  document: OpenAPIObject,
  input: RouteInput,
): Promise<Compared> {
  const compared = { ...NOTHING, differences: [] as string[] };
  const { metatype } = input;
  for (const parameter of documented(document, input.route, 'query')) {
    compared.fields += 1;
    for (const text of [undefined, ...texts(parameter)]) {
      const judged =
        text === undefined ? !parameter.required : judge.takes(parameter.schema, read(parameter, text));
      const query = text === undefined ? {} : { [parameter.name]: text };
      note(
        compared,
        `${input.route} ?${parameter.name}=${JSON.stringify(text)}`,
        judged,
        await programTakes(query, { type: 'query', metatype }),
      );
    }
  }
  // The document cannot say that a query has no other parameters.
  for (const name of strangeNames.filter((one) => !(one in Object.prototype) && one !== 'prototype'))
    note(
      compared,
      `${input.route} ?${name}`,
      false,
      await programTakes({ [name]: '1' }, { type: 'query', metatype }),
    );
  return compared;
}

/** A parameter of the path: its own pipes after the common one. */
export async function comparePath(
  judge: SchemaJudge,
  document: OpenAPIObject,
  input: RouteInput,
): Promise<Compared> {
  const compared = { ...NOTHING, fields: 1, differences: [] as string[] };
  const parameter = documented(document, input.route, 'path').find(({ name }) => name === input.name);
  if (!parameter)
    return { ...compared, differences: [`${input.route}: nothing is said of ${input.name ?? ''}.`] };
  const metadata = { type: 'param' as const, metatype: String, data: parameter.name };
  // No address carries halves of characters: they are gone when the percent signs are read.
  for (const text of texts(parameter).filter((one) => typeof one === 'string' && one !== '')) {
    note(
      compared,
      `${input.route} ${parameter.name}=${JSON.stringify(text)}`,
      judge.takes(parameter.schema, text),
      await programTakes(text, metadata, input.pipes),
    );
  }
  return compared;
}

function note(compared: Compared, what: string, judged: boolean, did: boolean): void {
  compared.asked += 1;
  if (judged && did) compared.taken += 1;
  if (judged !== did)
    compared.differences.push(`${what}: the document ${word(judged)}, the program ${word(did)} it.`);
}
