import { Injectable, type CanActivate, type ExecutionContext } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import { PinoLogger } from 'nestjs-pino';
import { problem } from '../errors/problem.js';
import { ACCESS, type Access } from './access.decorators.js';
import { CallerInfo, type AuthedRequest } from './caller.js';
import { Cookies } from './cookies.js';
import { Sessions } from './sessions.js';
import { Tokens } from './tokens.js';

/**
 * Closed by default. On a darkroom's route the session's life and the role are read in the request's own transaction
 * (DarkroomAccess); where there is no darkroom the session is read here.
 */
@Injectable()
export class AuthGuard implements CanActivate {
  constructor(
    private readonly reflector: Reflector,
    private readonly cookies: Cookies,
    private readonly tokens: Tokens,
    private readonly sessions: Sessions,
    private readonly log: PinoLogger,
  ) {}

  async canActivate(context: ExecutionContext): Promise<boolean> {
    const access = this.reflector.getAllAndOverride<Access | undefined>(ACCESS, [
      context.getHandler(),
      context.getClass(),
    ]);
    if (!access) throw problem('not-found');
    if (access.kind === 'public' || access.kind === 'by-secret') return true;
    const request = context.switchToHttp().getRequest<AuthedRequest>();
    const token = this.cookies.read(request, 'access');
    const claims = token === null ? null : this.tokens.readAccess(token);
    if (!claims) throw problem('signed-out');
    // From here on every line of this request says whose it is: a refusal without a name helps nobody.
    this.log.assign({ personId: claims.personId });
    if (access.kind === 'signed-in' && !(await this.sessions.isAlive(claims))) throw problem('session-ended');
    const least = access.kind === 'role' ? access.least : null;
    const readsOnly = request.method === 'GET' || request.method === 'HEAD';
    request.caller = new CallerInfo(claims.personId, claims.sessionId, least, readsOnly);
    return true;
  }
}
