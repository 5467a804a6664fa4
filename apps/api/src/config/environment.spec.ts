import { durationMs } from './duration.js';
import { readEnvironment } from './environment.js';

const DATABASE = {
  DATABASE_URL: 'postgres://app@127.0.0.1/wetside',
  DATABASE_JOBS_URL: 'postgres://jobs@127.0.0.1/wetside',
};
const REAL = {
  ...DATABASE,
  MODE: 'real',
  PUBLIC_ORIGIN: 'https://darkroom.example',
  SMTP_URL: 'smtps://mail.example',
  MAIL_FROM: 'Wetside <wetside@darkroom.example>',
  SESSION_SECRET: 's'.repeat(32),
};

describe('the environment', () => {
  it('needs little for the demo', () => {
    const demo = readEnvironment({ ...DATABASE, PORT: '3000' });
    expect(demo).toMatchObject({
      mode: 'demo',
      host: '127.0.0.1',
      publicOrigin: 'http://localhost:3000',
      clockOffset: 0,
      mailBackoffS: 30,
      mailDeadlineS: 40,
      webDist: null,
      limits: { lockMs: 5_000, statementMs: 15_000, idleMs: 30_000, waitMs: 5_000, transactionMs: 30_000 },
    });
    expect(demo.sessionSecret).toHaveLength(64);
  });

  it('needs all its secrets and addresses for real use', () => {
    expect(readEnvironment(REAL)).toMatchObject({ mode: 'real', publicOrigin: 'https://darkroom.example' });
    expect(() => readEnvironment({ ...DATABASE, MODE: 'real' })).toThrow(
      [
        'PUBLIC_ORIGIN must be set.',
        'SMTP_URL must be set.',
        'MAIL_FROM must be set.',
        'SESSION_SECRET must be set.',
      ].join('\n'),
    );
  });

  it.each([
    [{ ...REAL, PUBLIC_ORIGIN: 'http://darkroom.example' }, 'https'],
    [{ ...REAL, PUBLIC_ORIGIN: 'https://darkroom.example/wetside' }, 'PUBLIC_ORIGIN'],
    [{ ...REAL, SESSION_SECRET: 'short' }, '32 characters'],
    [{ ...REAL, CLOCK_OFFSET: 'P1D' }, 'CLOCK_OFFSET'],
    [{ ...DATABASE, CLOCK_OFFSET: 'P1M' }, 'CLOCK_OFFSET'],
    [{ ...DATABASE, HOST: '0.0.0.0' }, 'HOST'],
    [{ ...DATABASE, PORT: '80x' }, 'PORT'],
    [{ ...DATABASE, MAIL_BACKOFF_S: '1h' }, 'MAIL_BACKOFF_S must be a whole number from 0 to 3600.'],
    [{ ...REAL, MAIL_DEADLINE_S: '60' }, 'MAIL_DEADLINE_S must be a whole number from 1 to 50.'],
    [{ ...DATABASE, DATABASE_LOCK_MS: '5s' }, 'DATABASE_LOCK_MS must be a whole number from 10 to 600000.'],
    [{ ...DATABASE, MODE: 'production' }, 'MODE'],
    [{ ...DATABASE, DATABASE_URL: 'secret-pw@nowhere' }, 'DATABASE_URL'],
  ])('stops the start with a sentence: %#', (variables, word) => {
    expect(() => readEnvironment(variables)).toThrow(word);
  });

  it('does not repeat an address that may hold a password', () => {
    expect(() => readEnvironment({ ...DATABASE, DATABASE_URL: 'secret-pw@nowhere' })).not.toThrow(
      'secret-pw',
    );
  });
});

describe('a duration', () => {
  it.each([
    ['P70D', 70 * 86_400_000],
    ['PT3H', 10_800_000],
    ['-P1DT12H', -129_600_000],
    ['P2W', 1_209_600_000],
    ['90', 90_000],
    ['P', null],
    ['PT', null],
    ['P1Y', null],
    ['soon', null],
  ])('%s is %p ms', (text, ms) => {
    expect(durationMs(text)).toBe(ms);
  });
});
