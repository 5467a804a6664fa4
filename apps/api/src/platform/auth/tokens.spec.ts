import { JwtService } from '@nestjs/jwt';
import { v7 } from 'uuid';
import { readEnvironment } from '../../config/environment.js';
import { Clock } from '../clock/clock.js';
import { Tokens } from './tokens.js';

const SECRET = 'a secret that is only ever used in tests';
const environment = readEnvironment({
  MODE: 'test',
  SESSION_SECRET: SECRET,
  DATABASE_URL: 'postgres://nobody@127.0.0.1:1/none',
  DATABASE_JOBS_URL: 'postgres://nobody@127.0.0.1:1/none',
});
const jwt = new JwtService();
const claims = { personId: v7(), sessionId: v7() };

function fresh() {
  const clock = new Clock(environment);
  return { clock, tokens: new Tokens(environment, clock) };
}

/** A token made by hand, right in all but what is given. */
function forged(change: {
  claims?: object;
  typ?: string;
  secret?: string;
  algorithm?: 'HS256' | 'HS512';
  endless?: true;
}) {
  const iat = Math.floor(new Clock(environment).now().getTime() / 1000);
  const right = {
    sub: claims.personId,
    sid: claims.sessionId,
    iss: environment.publicOrigin,
    aud: 'wetside-api',
    iat,
  };
  const end = change.endless ? {} : { exp: iat + 900 };
  const algorithm = change.algorithm ?? 'HS256';
  return jwt.sign(
    { ...right, ...end, ...change.claims },
    {
      secret: change.secret ?? SECRET,
      algorithm,
      header: { alg: algorithm, typ: change.typ ?? 'access+jwt' },
    },
  );
}

/** The claims of a right token under a header that asks for no signature. */
function unsigned() {
  const header = Buffer.from(JSON.stringify({ alg: 'none', typ: 'access+jwt' })).toString('base64url');
  return `${header}.${forged({}).split('.')[1] ?? ''}.`;
}

describe('access tokens', () => {
  it('name a person and a session, and nothing more', () => {
    const { tokens } = fresh();
    const token = tokens.access(claims);
    expect(tokens.readAccess(token)).toEqual(claims);
    expect(Object.keys(jwt.decode<object>(token)).sort()).toEqual(['aud', 'exp', 'iat', 'iss', 'sid', 'sub']);
    expect(tokens.readAccess(forged({}))).toEqual(claims);
  });

  it('run out after 15 minutes of the server’s clock', () => {
    const { tokens, clock } = fresh();
    const token = tokens.access(claims);
    clock.advance(14 * 60_000);
    expect(tokens.readAccess(token)).toEqual(claims);
    clock.advance(61_000);
    expect(tokens.readAccess(token)).toBeNull();
  });

  it.each([
    ['another secret', forged({ secret: 'x'.repeat(40) })],
    ['another algorithm', forged({ algorithm: 'HS512' })],
    ['another issuer', forged({ claims: { iss: 'https://elsewhere.example' } })],
    ['another audience', forged({ claims: { aud: 'elsewhere' } })],
    ['another type', forged({ typ: 'JWT' })],
    ['no end', forged({ endless: true })],
    ['a session that is no id', forged({ claims: { sid: 'x' } })],
    ['no signature', unsigned()],
    ['nonsense', 'not.a.token'],
  ])('are refused with %s', (_, token) => {
    expect(fresh().tokens.readAccess(token)).toBeNull();
  });

  it('are not to be had from a device’s mark, nor the other way round', () => {
    const { tokens } = fresh();
    expect(tokens.readAccess(tokens.device(claims.personId, claims.sessionId))).toBeNull();
    expect(tokens.readDevice(tokens.access(claims))).toBeNull();
  });
});
