import { Injectable } from '@nestjs/common';
import { JwtService } from '@nestjs/jwt';
import { createHash, createSecretKey, randomBytes } from 'node:crypto';
import { validate } from 'uuid';
import { Environment } from '../../config/environment.js';
import { Clock } from '../clock/clock.js';
import { ACCESS_S } from './lifetimes.js';

const AUDIENCE = 'wetside-api';
type TokenType = 'access+jwt' | 'device+jwt';

/** What an access token names: a person and a session, and nothing that could change meanwhile. */
export interface AccessClaims {
  personId: string;
  sessionId: string;
}

interface Verified {
  header: { typ?: unknown };
  payload: Record<string, unknown>;
}

@Injectable()
export class Tokens {
  private readonly jwt: JwtService;

  constructor(
    private readonly environment: Environment,
    private readonly clock: Clock,
  ) {
    // As a key object: a text would be tried as a public key first, at every request.
    const key = createSecretKey(Buffer.from(environment.sessionSecret));
    this.jwt = new JwtService({ secretOrKeyProvider: () => key });
  }

  access({ personId, sessionId }: AccessClaims): string {
    return this.sign('access+jwt', { sub: personId, sid: sessionId }, ACCESS_S);
  }

  /** Null for anything but a token that this server signed for this use and that has not run out. */
  readAccess(token: string): AccessClaims | null {
    const claims = this.verify('access+jwt', token);
    const personId = claims?.['sub'];
    const sessionId = claims?.['sid'];
    if (typeof personId !== 'string' || typeof sessionId !== 'string') return null;
    return validate(personId) && validate(sessionId) ? { personId, sessionId } : null;
  }

  /** Says that this person has signed in on this device before; it opens nothing. */
  device(personId: string, deviceId: string): string {
    return this.sign('device+jwt', { sub: personId, did: deviceId }, 400 * 86_400);
  }

  readDevice(token: string): { personId: string; deviceId: string } | null {
    const claims = this.verify('device+jwt', token);
    const personId = claims?.['sub'];
    const deviceId = claims?.['did'];
    return typeof personId === 'string' && typeof deviceId === 'string' ? { personId, deviceId } : null;
  }

  private sign(type: TokenType, claims: Record<string, string>, seconds: number): string {
    const iat = this.nowS();
    return this.jwt.sign(
      { ...claims, iat, exp: iat + seconds },
      {
        algorithm: 'HS256',
        issuer: this.environment.publicOrigin,
        audience: AUDIENCE,
        header: { alg: 'HS256', typ: type },
      },
    );
  }

  private verify(type: TokenType, token: string): Record<string, unknown> | null {
    try {
      const { header, payload } = this.jwt.verify<Verified>(token, {
        algorithms: ['HS256'],
        issuer: this.environment.publicOrigin,
        audience: AUDIENCE,
        clockTimestamp: this.nowS(),
        complete: true,
      });
      return header.typ === type && typeof payload['exp'] === 'number' ? payload : null;
    } catch {
      // Whatever is wrong with it, the caller is not signed in.
      return null;
    }
  }

  private nowS(): number {
    return Math.floor(this.clock.now().getTime() / 1000);
  }
}

/** A secret of 256 random bits for a cookie or a link, in 43 characters. */
export function randomSecret(): string {
  return randomBytes(32).toString('base64url');
}

/** What is stored in a secret's place. The secret is random, so a plain digest is enough. */
export function secretHash(secret: string): string {
  return createHash('sha256').update(secret).digest('hex');
}
