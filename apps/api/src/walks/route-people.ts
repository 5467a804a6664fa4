import { JwtService } from '@nestjs/jwt';
import { createHmac } from 'node:crypto';
import { cookieName } from '../platform/auth/cookies.js';
import type { Access } from '../platform/auth/access.decorators.js';
import { reaches, ROLES, type Role } from '../platform/auth/roles.js';
import { ORIGIN } from '../testing/test-app.js';

/** Somebody who sends a request that must be refused, and how. */
export interface Refused {
  who: string;
  cookie: string;
  headers: Readonly<Record<string, string>>;
  status: number;
  codes: readonly string[];
  /** Knows the darkroom by its short name only. */
  byShortName?: true;
}

/** The cookies of people who have signed in. */
export interface SignedIn {
  roles: Record<Role, string>;
  stranger: string;
  former: string;
  signedOut: string;
}

export const OWN_PAGES = { 'sec-fetch-site': 'same-origin' };
const SAFE = ['GET', 'HEAD'];
const jwt = new JwtService();

/** The value of one cookie out of a Cookie header. */
export function valueIn(cookie: string, kind: 'access' | 'refresh' | 'device'): string {
  const name = cookieName(kind, ORIGIN);
  return new RegExp(`(?:^|; )${name}=([^;]*)`).exec(cookie)?.[1] ?? '';
}

const accessCookie = (token: string) => `${cookieName('access', ORIGIN)}=${token}`;

const part = (value: object) => Buffer.from(JSON.stringify(value)).toString('base64url');

interface Forgery {
  claims?: object;
  header?: object;
  secret?: string;
  algorithm?: 'HS256' | 'HS512';
}

/** An access token made by hand, right in all but what is given. */
export function forged(cookie: string, own: string, { claims, header, secret, algorithm }: Forgery): string {
  const right = jwt.decode<object>(valueIn(cookie, 'access'));
  const alg = algorithm ?? 'HS256';
  const text = `${part({ alg, typ: 'access+jwt', ...header })}.${part({ ...right, ...claims })}`;
  const hash = alg === 'HS512' ? 'sha512' : 'sha256';
  return accessCookie(
    `${text}.${createHmac(hash, secret ?? own)
      .update(text)
      .digest('base64url')}`,
  );
}

/** Tokens that open nothing, by what is wrong with them. */
export function badTokens(cookie: string, own: string, nowS: number): [string, string][] {
  const [header = '', payload = '', signature = ''] = valueIn(cookie, 'access').split('.');
  const claims = jwt.decode<object>(`${header}.${payload}.${signature}`);
  const thief = 'a secret that somebody else has made up';
  const jwk = { kty: 'oct', k: Buffer.from(thief).toString('base64url') };
  return [
    ['an expired token', forged(cookie, own, { claims: { iat: nowS - 1_000, exp: nowS - 100 } })],
    ['a token without an end', forged(cookie, own, { claims: { exp: undefined } })],
    ['a token of algorithm none', accessCookie(`${part({ alg: 'none', typ: 'access+jwt' })}.${payload}.`)],
    ['a token of another algorithm', forged(cookie, own, { algorithm: 'HS512' })],
    ['a token of another secret', forged(cookie, own, { secret: thief })],
    ['a token that brings its key', forged(cookie, own, { secret: thief, header: { jwk } })],
    [
      'a token that says where its key is',
      forged(cookie, own, { secret: thief, header: { jku: 'https://elsewhere.example/keys', kid: '1' } }),
    ],
    ['a token for another audience', forged(cookie, own, { claims: { aud: 'elsewhere' } })],
    ['a token of another issuer', forged(cookie, own, { claims: { iss: 'https://elsewhere.example' } })],
    ['a token of another type', forged(cookie, own, { header: { typ: 'device+jwt' } })],
    [
      'a token with its claims changed',
      accessCookie(
        `${header}.${part({ ...claims, sub: '0190c8a0-0000-7000-8000-000000000001' })}.${signature}`,
      ),
    ],
    ['a refresh token for an access token', accessCookie(valueIn(cookie, 'refresh'))],
    ['a device’s mark for an access token', accessCookie(valueIn(cookie, 'device'))],
  ];
}

const ELSEWHERE: [string, Record<string, string>][] = [
  ['another site', { 'sec-fetch-site': 'cross-site', origin: 'https://evil.example' }],
  ['another origin of the site', { 'sec-fetch-site': 'same-site', origin: ORIGIN }],
  ['a typed address', { 'sec-fetch-site': 'none' }],
  ['an old browser on another site', { origin: 'https://evil.example' }],
  ['nowhere', {}],
];

/** Everybody whom a route with that access must refuse. */
export function refusedBy(
  access: Access,
  method: string,
  people: SignedIn,
  bad: readonly [string, string][],
  best: string,
): Refused[] {
  const elsewhere = SAFE.includes(method) || access.kind === 'by-secret' ? [] : ELSEWHERE;
  const crossing = elsewhere.map(([from, headers]): Refused => {
    return { who: `somebody from ${from}`, cookie: best, headers, status: 403, codes: ['cross-site'] };
  });
  if (access.kind === 'public' || access.kind === 'by-secret') return crossing;
  const shut = (who: string, cookie: string, status: number, ...codes: string[]): Refused => {
    return { who, cookie, headers: OWN_PAGES, status, codes };
  };
  const unsigned = [
    shut('nobody', '', 401, 'signed-out'),
    ...bad.map(([who, cookie]) => shut(who, cookie, 401, 'signed-out')),
    shut('somebody who has signed out', people.signedOut, 401, 'session-ended'),
  ];
  if (access.kind === 'signed-in') return [...crossing, ...unsigned];
  const stranger = shut('a stranger', people.stranger, 404, 'not-found');
  return [
    ...crossing,
    ...unsigned,
    stranger,
    { ...stranger, who: 'a stranger who knows its short name', byShortName: true },
    shut('a manager who has left', people.former, 404, 'not-found'),
    ...ROLES.filter((role) => !reaches(role, access.least)).map((role) =>
      shut(`a ${role}`, people.roles[role], 403, 'not-allowed'),
    ),
  ];
}
