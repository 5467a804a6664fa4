import type { ArgumentMetadata, PipeTransform, Type } from '@nestjs/common';
import { RequestPipe } from '../platform/dto/request-pipe.js';
import { Problem } from '../platform/errors/problem.js';
import { mutations } from './field-mutations.js';
import { rightValues } from './schema-values.js';
import type { SchemaJudge } from './schema-judge.js';
import type { Json, Schema, Schemas } from './schema.js';

const pipe = new RequestPipe();

/** What came of asking both, the program and the document's schema. */
export interface Compared {
  fields: number;
  asked: number;
  /** Taken by both. */
  taken: number;
  /** A sentence for each request of which they think differently. */
  differences: string[];
}

export const NOTHING: Compared = { fields: 0, asked: 0, taken: 0, differences: [] };

/** Whether the program's own pipe takes it; what fails otherwise than with a Problem is thrown on. */
export async function programTakes(
  value: Json | undefined,
  metadata: ArgumentMetadata,
  own: readonly Type<PipeTransform>[] = [],
): Promise<boolean> {
  try {
    let seen: unknown = await pipe.transform(structuredClone(value), metadata);
    for (const OwnPipe of own) seen = await new OwnPipe().transform(seen, metadata);
    return true;
  } catch (error) {
    if (error instanceof Problem && error.status < 500) return false;
    throw error;
  }
}

/**
 * Right requests of a schema and every mutation of them, asked of both.
 * @param seen fields of schemas that were compared before in full
 */
export async function compareBody(
  judge: SchemaJudge,
  schema: Schema,
  schemas: Schemas,
  metatype: Type,
  seen: Set<string>,
): Promise<Compared> {
  const before = seen.size;
  const all = rightValues(schema, schemas).flatMap((right) => [
    { field: 'all', what: 'right', request: right },
    ...mutations(schema, schemas, right, seen),
  ]);
  const compared = { ...NOTHING, fields: seen.size - before, asked: all.length, differences: [] as string[] };
  for (const { field, what, request } of all) {
    const judged = judge.takes(schema, request);
    const did = await programTakes(request, { type: 'body', metatype });
    if (judged && did) compared.taken += 1;
    if (judged !== did || (what === 'right' && !did))
      compared.differences.push(
        `${metatype.name} ${field}, ${what}: the document ${word(judged)}, the program ${word(did)} it.`,
      );
  }
  return compared;
}

export const word = (takes: boolean): string => (takes ? 'takes' : 'refuses');

export const together = (a: Compared, b: Compared): Compared => ({
  fields: a.fields + b.fields,
  asked: a.asked + b.asked,
  taken: a.taken + b.taken,
  differences: [...a.differences, ...b.differences],
});
