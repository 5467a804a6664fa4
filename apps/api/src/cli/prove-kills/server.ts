import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';
import { until } from './until.js';

/** The built server as a process that is killed and started again, always at the same address. */
export class KillServer {
  private child: ChildProcess | null = null;
  private said = '';
  readonly url: string;

  /**
   * @param folder of the build, with main.js in it
   * @param settings its environment, PORT among them
   */
  constructor(
    private readonly folder: string,
    private readonly settings: Readonly<Record<string, string>>,
  ) {
    this.url = `http://127.0.0.1:${settings.PORT}`;
  }

  /** Resolves when it lets people in. @throws Error when it ends before that */
  async start(): Promise<void> {
    const child = spawn(process.execPath, [join(this.folder, 'main.js')], {
      env: { PATH: process.env.PATH, ...this.settings },
      stdio: ['ignore', 'ignore', 'pipe'],
    });
    this.child = child;
    child.stderr.setEncoding('utf8').on('data', (text: string) => (this.said += text));
    await until(async () => {
      if (!this.isAlive()) throw new Error(`The server ended: ${this.said}`);
      return this.isReady();
    });
  }

  /** Whether the process that was started last still runs. */
  isAlive(): boolean {
    return this.child !== null && this.child.exitCode === null && this.child.signalCode === null;
  }

  async isReady(): Promise<boolean> {
    try {
      return (await fetch(`${this.url}/api/ready`, { signal: AbortSignal.timeout(20_000) })).ok;
    } catch {
      return false;
    }
  }

  /** Without a moment to finish anything. */
  async kill(): Promise<void> {
    const { child } = this;
    if (!child || !this.isAlive()) return;
    const ended = once(child, 'exit');
    child.kill('SIGKILL');
    await ended;
  }
}
