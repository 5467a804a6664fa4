import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';
import type { TestDatabase } from '@wetside/db/testing/clone';
import { builtProgram } from '../../testing/built-server.js';
import { ORIGIN, SECRET } from '../../testing/test-app.js';

/** A process of the built server that sends mail, and can be ended without a word. */
export class MailingServer {
  private constructor(private readonly child: ChildProcess) {}

  /**
   * It sweeps as soon as it is up, and each second after that.
   * @param variables SMTP_URL and what else it takes
   */
  static start(db: TestDatabase, variables: Record<string, string>): MailingServer {
    const child = spawn(process.execPath, [join(builtProgram(), 'main.js')], {
      env: {
        PATH: process.env.PATH,
        MODE: 'test',
        PORT: '0',
        PUBLIC_ORIGIN: ORIGIN,
        DATABASE_URL: db.appUrl,
        DATABASE_JOBS_URL: db.jobsUrl,
        DATABASE_POOL: '4',
        SESSION_SECRET: SECRET,
        SWEEP_S: '1',
        ...variables,
      },
      stdio: ['ignore', 'ignore', 'inherit'],
    });
    return new MailingServer(child);
  }

  /** SIGKILL: it finishes nothing. */
  kill(): Promise<void> {
    return this.end('SIGKILL');
  }

  stop(): Promise<void> {
    return this.end('SIGTERM');
  }

  private async end(signal: NodeJS.Signals): Promise<void> {
    if (this.child.exitCode !== null || this.child.signalCode !== null) return;
    const ended = once(this.child, 'exit');
    this.child.kill(signal);
    await ended;
  }
}
