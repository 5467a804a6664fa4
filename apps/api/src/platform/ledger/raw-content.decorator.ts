import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import type { Request } from 'express';

/** The content of an action as it was parsed, untouched by validation: what its hash is taken of. */
export const RawContent = createParamDecorator((_: unknown, context: ExecutionContext): unknown => {
  const body: unknown = context.switchToHttp().getRequest<Request>().body;
  return typeof body === 'object' && body !== null && 'content' in body ? body.content : null;
});
