import { Catch, HttpException, type ArgumentsHost, type ExceptionFilter, Logger } from '@nestjs/common';
import type { Response } from 'express';
import { databaseTrouble } from '../database/sql-errors.js';
import { Problem, problem } from './problem.js';

/** Seconds after which asking again is worth while. */
const AGAIN_S = '2';

/** Answers every failure as a problem document; what is not a Problem is logged and told without its inside. */
@Catch()
export class ProblemFilter implements ExceptionFilter {
  private readonly logger = new Logger('problems');

  catch(error: unknown, host: ArgumentsHost): void {
    const found = withRetry(asProblem(error));
    if (found.status >= 500) this.logger.error({ err: error }, 'failed');
    else if (found.status === 401 || found.status === 403 || found.status === 429) {
      this.logger.warn({ code: found.code }, 'refused');
    }
    const response = host.switchToHttp().getResponse<Response>();
    // A stream that has begun cannot change its status any more; breaking it off is all that is left.
    if (response.headersSent) {
      response.destroy();
      return;
    }
    response
      .status(found.status)
      .set(found.headers)
      .type('application/problem+json')
      .send(JSON.stringify(found.toDocument()));
  }
}

/** Every 503 says when to come back. */
const withRetry = (found: Problem): Problem =>
  found.status === 503 ? found.withHeaders({ 'retry-after': AGAIN_S, ...found.headers }) : found;

function asProblem(error: unknown): Problem {
  if (error instanceof Problem) return error;
  const trouble = databaseTrouble(error);
  if (trouble) return problem(trouble);
  const status = statusOf(error);
  if (status === 400) return problem('malformed');
  if (status === 404 || status === 405) return problem('not-found');
  if (status === 413) return problem('too-large');
  if (status === 415) return problem('not-json');
  return problem('broken');
}

/** Nest's own exceptions and the body parser's errors carry a status of the 400s; nothing else is trusted with one. */
function statusOf(error: unknown): number {
  if (error instanceof HttpException) return error.getStatus();
  if (error instanceof Error && 'status' in error && typeof error.status === 'number') return error.status;
  return 500;
}
