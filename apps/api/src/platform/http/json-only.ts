import type { NextFunction, Request, Response } from 'express';
import { problem } from '../errors/problem.js';

/** A body that is not told to be JSON is read by nobody; saying so is better than missing its fields. */
export function jsonOnly(request: Request, _response: Response, next: NextFunction): void {
  // A length of nothing is no body: a browser sends one with every POST.
  const empty =
    request.get('transfer-encoding') === undefined && Number(request.get('content-length') ?? 0) === 0;
  next(empty || request.is('application/json') ? undefined : problem('not-json'));
}
