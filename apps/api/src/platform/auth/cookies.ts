import { Injectable } from '@nestjs/common';
import type { CookieOptions, Request, Response } from 'express';
import { Environment } from '../../config/environment.js';
import { ACCESS_S, REFRESH_IDLE_S } from './lifetimes.js';

export type CookieKind = 'access' | 'refresh' | 'device';

/** A browser keeps a cookie for 400 days at the most. */
const DEVICE_S = 400 * 86_400;
const MAX_AGE_S: Record<CookieKind, number> = { access: ACCESS_S, refresh: REFRESH_IDLE_S, device: DEVICE_S };

/**
 * The name follows the scheme people see: with https the browser itself holds the cookie to this host;
 * on localhost, where every port shares one jar, the name carries the port.
 */
export function cookieName(kind: CookieKind, publicOrigin: string): string {
  const url = new URL(publicOrigin);
  return url.protocol === 'https:' ? `__Host-wetside-${kind}` : `wetside-${kind}-${url.port || '80'}`;
}

export function cookieOptions(publicOrigin: string): CookieOptions {
  return { httpOnly: true, sameSite: 'lax', path: '/', secure: new URL(publicOrigin).protocol === 'https:' };
}

@Injectable()
export class Cookies {
  constructor(private readonly environment: Environment) {}

  read(request: Request, kind: CookieKind): string | null {
    const jar: unknown = request.cookies;
    if (typeof jar !== 'object' || jar === null) return null;
    const value: unknown = Reflect.get(jar, cookieName(kind, this.environment.publicOrigin));
    return typeof value === 'string' && value !== '' ? value : null;
  }

  set(response: Response, kind: CookieKind, value: string): void {
    const { publicOrigin } = this.environment;
    response.cookie(cookieName(kind, publicOrigin), value, {
      ...cookieOptions(publicOrigin),
      maxAge: MAX_AGE_S[kind] * 1000,
    });
  }

  /** Takes the sign-in out of the browser; the device stays known, so that guesses elsewhere do not slow it. */
  clear(response: Response): void {
    const { publicOrigin } = this.environment;
    for (const kind of ['access', 'refresh'] as const) {
      response.clearCookie(cookieName(kind, publicOrigin), cookieOptions(publicOrigin));
    }
  }
}
