import {
  Injectable,
  Logger,
  type BeforeApplicationShutdown,
  type OnApplicationBootstrap,
} from '@nestjs/common';
import { Environment } from '../../config/environment.js';
import { Sweeper } from './sweeper.js';

/** Sweeps every SWEEP_S seconds, the first time as soon as the server is up; one sweep ends before the next begins. */
@Injectable()
export class SweepTimer implements OnApplicationBootstrap, BeforeApplicationShutdown {
  private readonly log = new Logger(SweepTimer.name);
  private timer: NodeJS.Timeout | null = null;
  private sweeping: Promise<void> = Promise.resolve();
  private stopped = false;

  constructor(
    private readonly environment: Environment,
    private readonly sweeper: Sweeper,
  ) {}

  onApplicationBootstrap(): void {
    if (this.environment.background) this.after(0);
  }

  async beforeApplicationShutdown(): Promise<void> {
    this.stopped = true;
    if (this.timer) clearTimeout(this.timer);
    await this.sweeping;
  }

  private after(ms: number): void {
    if (this.stopped) return;
    this.timer = setTimeout(() => {
      this.sweeping = this.sweep().then(() => this.after(this.environment.sweepS * 1_000));
    }, ms);
  }

  private async sweep(): Promise<void> {
    try {
      await this.sweeper.runOnce();
    } catch (error) {
      this.log.error(
        `The sweep failed and comes again: ${error instanceof Error ? error.message : String(error)}`,
      );
    }
  }
}
