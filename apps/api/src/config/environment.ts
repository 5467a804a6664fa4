import { randomBytes } from 'node:crypto';
import { durationMs } from './duration.js';
import { ConfigError, Reader, type Variables } from './reader.js';

export const MODES = ['demo', 'real', 'test'] as const;
export type Mode = (typeof MODES)[number];
export const LOG_LEVELS = ['silent', 'fatal', 'error', 'warn', 'info', 'debug', 'trace'] as const;
export type LogLevel = (typeof LOG_LEVELS)[number];

/** How long a request waits for the database before it is answered without it; milliseconds. */
export interface DatabaseLimits {
  /** For a row that somebody else holds. */
  lockMs: number;
  /** For one statement. */
  statementMs: number;
  /** Between two statements of one transaction. */
  idleMs: number;
  /** For a free connection, and for a new one to be made. */
  waitMs: number;
  /** For a whole transaction, by the server's own watch: it holds when the database says nothing at all. */
  transactionMs: number;
}

/** The process's settings, read once. A class, so that Nest can hand it out by its type. */
export class Environment {
  mode: Mode;
  host: string;
  port: number;
  /** Where people reach the program: scheme, host and port, no path. */
  publicOrigin: string;
  /** Addresses of proxies in front, whose word on where a request came from is taken; null: nobody's. */
  trustedProxy: string | null;
  databaseUrl: string;
  databaseJobsUrl: string;
  databasePool: number;
  limits: DatabaseLimits;
  smtpUrl: string;
  mailFrom: string;
  sessionSecret: string;
  /** Folder of the built web program, or null when something else serves it. */
  webDist: string | null;
  /** Milliseconds the server's clock runs ahead; 0 in real use. */
  clockOffset: number;
  /** Seconds a mail waits before it is sent, so that an undo can still withdraw it. */
  mailGraceS: number;
  /** Seconds to wait after a mail's first failure; later ones wait longer. */
  mailBackoffS: number;
  /** Seconds for the whole conversation with the mail server, from dialling to its last answer. */
  mailDeadlineS: number;
  /** Seconds between two sweeps. */
  sweepS: number;
  logLevel: LogLevel;
  /**
   * Whether this process runs the queue and the sweep. A command that runs and ends does neither, and puts nothing in
   * the queue: the sweep of the server finds what waits.
   */
  background: boolean;
}

/**
 * Reads and checks the variables.
 * @throws ConfigError with one sentence for each bad value.
 */
export function readEnvironment(variables: Variables = process.env): Environment {
  const read = new Reader(variables);
  const e = new Environment();
  e.mode = read.choice('MODE', MODES, variables.NODE_ENV === 'production' ? 'real' : 'demo');
  e.host = read.text('HOST', '127.0.0.1');
  e.port = read.whole('PORT', { min: 0, max: 65_535, otherwise: 3100 });
  e.publicOrigin = readOrigin(read, e);
  e.trustedProxy = read.textOrNull('TRUSTED_PROXY');
  e.databaseUrl = read.url('DATABASE_URL', ['postgres:', 'postgresql:']);
  e.databaseJobsUrl = read.url('DATABASE_JOBS_URL', ['postgres:', 'postgresql:']);
  e.databasePool = read.whole('DATABASE_POOL', { min: 1, max: 100, otherwise: 10 });
  e.limits = readLimits(read);
  e.smtpUrl = read.url(
    'SMTP_URL',
    ['smtp:', 'smtps:'],
    e.mode === 'real' ? undefined : 'smtp://127.0.0.1:1025',
  );
  e.mailFrom = read.text('MAIL_FROM', e.mode === 'real' ? undefined : 'Wetside <wetside@localhost>');
  e.sessionSecret = read.secret(
    'SESSION_SECRET',
    e.mode === 'real' ? undefined : randomBytes(32).toString('hex'),
  );
  e.webDist = read.textOrNull('WEB_DIST');
  e.clockOffset = readClockOffset(read, e.mode);
  e.mailGraceS = read.whole('MAIL_GRACE_S', { min: 0, max: 86_400, otherwise: 60 });
  e.mailBackoffS = read.whole('MAIL_BACKOFF_S', { min: 0, max: 3_600, otherwise: 30 });
  // Below the lease of a minute: whoever holds a lease has let go of the socket before another may take it.
  e.mailDeadlineS = read.whole('MAIL_DEADLINE_S', { min: 1, max: 50, otherwise: 40 });
  e.sweepS = read.whole('SWEEP_S', { min: 1, max: 86_400, otherwise: 30 });
  e.logLevel = read.choice('LOG_LEVEL', LOG_LEVELS, e.mode === 'test' ? 'silent' : 'info');
  e.background = true;
  refuseOpenDemo(read, e);
  read.finish();
  return e;
}

function readLimits(read: Reader): DatabaseLimits {
  const ms = (name: string, otherwise: number) =>
    read.whole(`DATABASE_${name}_MS`, { min: 10, max: 600_000, otherwise });
  return {
    lockMs: ms('LOCK', 5_000),
    statementMs: ms('STATEMENT', 15_000),
    idleMs: ms('IDLE', 30_000),
    waitMs: ms('WAIT', 5_000),
    transactionMs: ms('TRANSACTION', 30_000),
  };
}

function readOrigin(read: Reader, e: Environment): string {
  const schemes = e.mode === 'real' ? ['https:'] : ['http:', 'https:'];
  const text = read.url(
    'PUBLIC_ORIGIN',
    schemes,
    e.mode === 'real' ? undefined : `http://localhost:${e.port}`,
  );
  if (!text) return '';
  const url = new URL(text);
  if (url.pathname !== '/' || url.search || url.hash || url.username) {
    read.complain('PUBLIC_ORIGIN must be scheme, host and port only, such as https://darkroom.example.');
  }
  return url.origin;
}

function readClockOffset(read: Reader, mode: Mode): number {
  const text = read.textOrNull('CLOCK_OFFSET');
  if (text === null) return 0;
  if (mode === 'real') read.complain('CLOCK_OFFSET is for demo and tests: take it out for real use.');
  const ms = durationMs(text);
  if (ms === null)
    read.complain('CLOCK_OFFSET must be a duration such as P70D or PT3H, or a number of seconds.');
  return ms ?? 0;
}

const LOOPBACK = ['127.0.0.1', 'localhost', '::1'];

function refuseOpenDemo(read: Reader, e: Environment): void {
  if (e.mode === 'demo' && !LOOPBACK.includes(e.host)) {
    read.complain(
      'HOST must be 127.0.0.1, localhost or ::1 in the demo: its sign-ins are printed for all to see.',
    );
  }
}

export { ConfigError };
