import { Injectable, type OnModuleDestroy } from '@nestjs/common';
import { HttpAdapterHost } from '@nestjs/core';
import { Server } from 'node:http';

/** Longer than a request may take in the ordinary way, shorter than a supervisor waits before it kills. */
const LIMIT_MS = 8_000;
const IDLE_MS = 50;

/**
 * The first step of stopping: nobody new is let in, what is being answered is answered. The queue's work comes after
 * it, and a mail server that hangs cannot cut a request short; a mail in flight keeps its lease, which runs out.
 */
@Injectable()
export class FinishRequests implements OnModuleDestroy {
  constructor(private readonly host: HttpAdapterHost) {}

  async onModuleDestroy(): Promise<void> {
    const server = this.server();
    if (!server?.listening) return;
    // A connection that was kept open after its answer would hold the stop until its own time-out.
    const idle = setInterval(() => server.closeIdleConnections(), IDLE_MS);
    const limit = setTimeout(() => server.closeAllConnections(), LIMIT_MS);
    await new Promise((resolve) => server.close(resolve));
    clearInterval(idle);
    clearTimeout(limit);
  }

  /** None in a command that runs and ends. */
  private server(): Server | null {
    const found: unknown = this.host.httpAdapter?.getHttpServer?.();
    return found instanceof Server ? found : null;
  }
}
