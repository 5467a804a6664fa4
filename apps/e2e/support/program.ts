import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { type AddressInfo, createServer } from 'node:net';
import { join } from 'node:path';
import { expect } from '@playwright/test';

const root = join(import.meta.dirname, '../../..');
const api = (file: string): string => join(root, 'apps/api/dist', file);
const webDist = process.env.E2E_WEB_DIST ?? join(root, 'apps/web/dist');

export type Settings = Record<string, string>;

/** What this process may hand on: the database and the clock are the journey's own. */
const clean = Object.fromEntries(
  Object.entries(process.env).filter(
    ([name]) => !/^(DATABASE_|PG|SMTP_|CLOCK_OFFSET|MODE$|NODE_ENV$)/.test(name),
  ),
);

/** A port that nobody listens on. */
export async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  server.close();
  await once(server, 'close');
  return port;
}

/** The settings that every program of one journey shares. */
export function settingsFor(
  port: number,
  smtpPort: number,
  database: { appUrl: string; jobsUrl: string },
  more: Settings,
): Settings {
  return {
    MODE: 'test',
    LOG_LEVEL: 'error',
    HOST: '127.0.0.1',
    PORT: String(port),
    PUBLIC_ORIGIN: `http://localhost:${port}`,
    DATABASE_URL: database.appUrl,
    DATABASE_JOBS_URL: database.jobsUrl,
    SMTP_URL: `smtp://127.0.0.1:${smtpPort}`,
    MAIL_FROM: 'Wetside <wetside@darkroom.example>',
    SESSION_SECRET: 'a journey has its own secret, and it guards nothing',
    WEB_DIST: webDist,
    SWEEP_S: '1',
    MAIL_GRACE_S: '0',
    ...more,
  };
}

interface Started {
  child: ChildProcess;
  /** Everything it has written so far. */
  said: () => string;
}

function start(file: string, args: string[], settings: Settings): Started {
  const child = spawn(process.execPath, [api(file), ...args], { env: { ...clean, ...settings } });
  let text = '';
  child.stdout.on('data', (part: Buffer) => (text += part.toString()));
  child.stderr.on('data', (part: Buffer) => (text += part.toString()));
  return { child, said: () => text };
}

/** Runs a command of the server to its end. Throws with what it said when it fails. */
export async function runCommand(
  file: string,
  args: string[],
  settings: Settings,
  input: string,
): Promise<void> {
  const { child, said } = start(file, args, settings);
  child.stdin?.end(input);
  await once(child, 'close');
  if (child.exitCode !== 0) throw new Error(`${file} ended with code ${child.exitCode}:\n${said()}`);
}

export interface Server {
  /** What it has logged: errors only. */
  errors: () => string;
  stop: () => Promise<void>;
}

/** Starts the built server and waits until it answers. */
export async function startServer(settings: Settings): Promise<Server> {
  const { child, said } = start('main.js', [], settings);
  const gone = once(child, 'close');
  const health = async (): Promise<string> => {
    if (child.exitCode !== null) throw new Error(`The server ended with code ${child.exitCode}:\n${said()}`);
    const answer = await fetch(`http://127.0.0.1:${settings.PORT}/api/health`).catch(() => null);
    return answer?.ok ? 'up' : said();
  };
  await expect
    .poll(health, { intervals: [50, 100], timeout: 30_000, message: 'the server answers' })
    .toBe('up');
  return {
    errors: () =>
      said()
        .replace(/^Wetside is at .*$/m, '')
        .trim(),
    stop: async () => {
      child.kill('SIGTERM');
      await gone;
    },
  };
}
