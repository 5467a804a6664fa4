import { Injectable, ValidationPipe, type ArgumentMetadata } from '@nestjs/common';
import { invalid, problem, type FieldProblem } from '../errors/problem.js';
import { validationProblem } from '../errors/validation-problem.js';
import { KEPT_TEXT } from './text-checks.js';

/** Deeper than any request here is, and far from what a stack holds. */
const DEEPEST = 16;
const NOT_HERE = 'This is not a field here; leave it out.';

/**
 * Every body, query and path of a request is looked at here before a handler sees it: exactly what the OpenAPI document
 * takes is taken. What the validators would pass over or fall over is refused first.
 */
@Injectable()
export class RequestPipe extends ValidationPipe {
  constructor() {
    super({
      whitelist: true,
      forbidNonWhitelisted: true,
      transform: true,
      exceptionFactory: validationProblem,
    });
  }

  override async transform(value: unknown, metadata: ArgumentMetadata): Promise<unknown> {
    if (metadata.type === 'param' && !isKept(value)) throw problem('not-found');
    if (metadata.type === 'body' && value !== undefined) {
      if (typeof value !== 'object' || value === null || Array.isArray(value)) throw problem('malformed');
      const complaint = strayed(value, '', 1);
      if (complaint) throw invalid([complaint]);
    }
    return super.transform(value, metadata);
  }
}

const kept = new RegExp(KEPT_TEXT, 'u');
const isKept = (value: unknown): boolean => typeof value !== 'string' || kept.test(value);

/** The first name that every object has already (or a class), which is dropped unseen on the way, or the first place too deep. */
function strayed(value: unknown, path: string, depth: number): FieldProblem | null {
  if (typeof value !== 'object' || value === null) return null;
  if (depth > DEEPEST) return { field: path, message: 'This is nested too deep.' };
  for (const [key, inner] of Object.entries(value)) {
    const field = path === '' ? key : `${path}.${key}`;
    if (key in Object.prototype || key === 'prototype') return { field, message: NOT_HERE };
    const complaint = strayed(inner, field, depth + 1);
    if (complaint) return complaint;
  }
  return null;
}
