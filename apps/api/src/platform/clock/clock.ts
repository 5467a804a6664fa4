import { Injectable } from '@nestjs/common';
import { Environment } from '../../config/environment.js';

/** The server's only source of the time. */
@Injectable()
export class Clock {
  private offsetMs: number;

  constructor(private readonly environment: Environment) {
    // Parsing refuses the offset in real use already; a second lock, because a wrong clock spoils every date.
    if (environment.mode === 'real' && environment.clockOffset !== 0) {
      throw new Error('The clock cannot be moved in real use.');
    }
    this.offsetMs = environment.clockOffset;
  }

  now(): Date {
    return new Date(Date.now() + this.offsetMs);
  }

  nowIso(): string {
    return this.now().toISOString();
  }

  /** Moves the clock on by so many milliseconds, so that a test can cross a date and the demo can be played at its times. Refused in real use. */
  advance(ms: number): void {
    if (this.environment.mode === 'real') throw new Error('The clock cannot be moved in real use.');
    this.offsetMs += ms;
  }
}
