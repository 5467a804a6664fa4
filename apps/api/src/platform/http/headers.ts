import type { NextFunction, Request, Response } from 'express';
import type { Clock } from '../clock/clock.js';

/** The server's time on every answer, so that a phone with a wrong clock shows the right dates. */
export function tellTime(clock: Clock) {
  return (_request: Request, response: Response, next: NextFunction): void => {
    response.setHeader('x-wetside-now', clock.nowIso());
    next();
  };
}

/** What the API answers is somebody's own: no cache between keeps it, unless a handler says otherwise. */
export function noStore(request: Request, response: Response, next: NextFunction): void {
  if (request.path === '/api' || request.path.startsWith('/api/'))
    response.setHeader('cache-control', 'no-store');
  next();
}
