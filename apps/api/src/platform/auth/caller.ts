import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import type { Request } from 'express';
import type { Role } from './roles.js';

/** Who is calling, as the token tells it; whether the session still lives is read with the first query. */
export class CallerInfo {
  /** Set once the caller has been let into the darkroom; an answer without it is a defect and is not sent. */
  entered = false;

  constructor(
    readonly personId: string,
    readonly sessionId: string,
    /** The least role of this route; null on a route without a darkroom. */
    readonly least: Role | null,
    /** Whether the request only reads: its transaction is then read-only. */
    readonly readsOnly: boolean,
  ) {}
}

export interface AuthedRequest extends Request {
  caller?: CallerInfo;
}

/** Hands the caller to a handler: `@Caller() caller: CallerInfo`. */
export const Caller = createParamDecorator((_: unknown, context: ExecutionContext): CallerInfo => {
  const { caller } = context.switchToHttp().getRequest<AuthedRequest>();
  if (!caller) throw new Error('The route asks for a caller but takes nobody signed in.');
  return caller;
});
