import {
  Injectable,
  Logger,
  type BeforeApplicationShutdown,
  type OnApplicationBootstrap,
} from '@nestjs/common';
import { setTimeout as later } from 'node:timers/promises';
import { Logger as QueueLogger, run, type Runner, type TaskList } from 'graphile-worker';
import { Environment } from '../../config/environment.js';
import { JobTasks } from './job-tasks.js';

const CONCURRENCY = 4;
const AGAIN_MS = 2_000;
/** A job put in by another server is heard of at once; this is for those that come due later. */
const POLL_MS = 1_000;

/**
 * Runs the queue inside the server. When the queue cannot be reached the program goes on without it: what is in the
 * queue only says "look at this row", and the sweep looks at the rows too.
 */
@Injectable()
export class JobRunner implements OnApplicationBootstrap, BeforeApplicationShutdown {
  private readonly log = new Logger(JobRunner.name);
  private readonly stopping = new AbortController();
  private runner: Runner | null = null;
  private running: Promise<void> | null = null;

  constructor(
    private readonly environment: Environment,
    private readonly tasks: JobTasks,
  ) {}

  onApplicationBootstrap(): void {
    if (this.environment.background) this.running = this.keepRunning();
  }

  /** Lets the jobs at work end, then lets go of the queue; before the database's pool is closed. */
  async beforeApplicationShutdown(): Promise<void> {
    this.stopping.abort();
    // It may be stopping already because the queue went away.
    await this.runner?.stop().catch(() => undefined);
    await this.running;
  }

  private async keepRunning(): Promise<void> {
    while (!this.stopping.signal.aborted) {
      try {
        await this.runOnce();
      } catch (error) {
        this.log.error(`The queue is not running: ${error instanceof Error ? error.message : String(error)}`);
      }
      // Cut short when it is to stop.
      await later(AGAIN_MS, undefined, { signal: this.stopping.signal }).catch(() => undefined);
    }
  }

  private async runOnce(): Promise<void> {
    const runner = await run({
      connectionString: this.environment.databaseJobsUrl,
      concurrency: CONCURRENCY,
      pollInterval: POLL_MS,
      noHandleSignals: true,
      parsedCronItems: [],
      // In batches, of whatever is there: else a job whose end cannot be written, for the database went away just
      // then, is a rejection that nobody handles, and ends the server.
      preset: { worker: { completeJobBatchDelay: 0, failJobBatchDelay: 0 } },
      taskList: this.taskList(),
      logger: new QueueLogger(() => (level, message) => this.tell(level, message)),
    });
    this.runner = runner;
    if (this.stopping.signal.aborted) await runner.stop();
    await runner.promise;
  }

  private taskList(): TaskList {
    return Object.fromEntries(
      this.tasks.entries().map(([name, task]) => [name, (payload: unknown) => task(payload)]),
    );
  }

  private tell(level: string, message: string): void {
    if (level === 'error') this.log.error(message);
    else if (level === 'warning') this.log.warn(message);
    else this.log.debug(message);
  }
}
