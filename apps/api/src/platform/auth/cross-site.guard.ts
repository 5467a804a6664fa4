import { Injectable, type CanActivate, type ExecutionContext } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import type { Request } from 'express';
import { Environment } from '../../config/environment.js';
import { problem } from '../errors/problem.js';
import { ACCESS, type Access } from './access.decorators.js';

const SAFE = ['GET', 'HEAD', 'OPTIONS'];

interface Provenance {
  method: string;
  /** Sec-Fetch-Site, which a page cannot forge. */
  site: string | undefined;
  origin: string | undefined;
}

/** Whether a request may change something: only the program's own pages may, and a request that says nothing may not. */
export function isFromOwnPages({ method, site, origin }: Provenance, publicOrigin: string): boolean {
  if (SAFE.includes(method)) return true;
  if (site !== undefined) return site === 'same-origin';
  return origin === publicOrigin;
}

@Injectable()
export class CrossSiteGuard implements CanActivate {
  constructor(
    private readonly reflector: Reflector,
    private readonly environment: Environment,
  ) {}

  canActivate(context: ExecutionContext): boolean {
    const access = this.reflector.getAllAndOverride<Access | undefined>(ACCESS, [
      context.getHandler(),
      context.getClass(),
    ]);
    if (access?.kind === 'by-secret') return true;
    const request = context.switchToHttp().getRequest<Request>();
    const from = {
      method: request.method,
      site: request.get('sec-fetch-site'),
      origin: request.get('origin'),
    };
    if (!isFromOwnPages(from, this.environment.publicOrigin)) throw problem('cross-site');
    return true;
  }
}
