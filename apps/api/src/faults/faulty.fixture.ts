import { Controller, Get, Module, Param, type OnModuleInit } from '@nestjs/common';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { sql } from 'drizzle-orm';
import request from 'supertest';
import { readEnvironment } from '../config/environment.js';
import type { Variables } from '../config/reader.js';
import { createApp, startUp } from '../create-app.js';
import { Public } from '../platform/auth/access.decorators.js';
import { Database } from '../platform/database/database.js';
import { JobTasks } from '../platform/jobs/job-tasks.js';
import { Queue } from '../platform/jobs/queue.js';
import { cookieAfter } from '../testing/signed-cookie.js';
import { ORIGIN, PASSPHRASE, SECRET, type TestApp, type TestPerson } from '../testing/test-app.js';
import { Wire } from '../testing/wire.js';

/** Milliseconds; short, so that running into each takes no time. */
export const LIMITS = { lock: 800, statement: 1_200, idle: 1_300, wait: 500, transaction: 2_000 };
/** What a busy machine may add to a limit before an answer is out. */
export const SLACK = 2_500;
export const POOL = 4;

const held = new Set<() => void>();
let begun = 0;

/** Transactions that misbehave as the test wants. */
@Controller('faults')
class FaultsController {
  constructor(private readonly database: Database) {}

  /** One statement that takes long. */
  @Get('sleep/:seconds')
  @Public()
  async sleep(@Param('seconds') seconds: string): Promise<object> {
    await this.database.asIdentity((tx) => tx.execute(sql`select pg_sleep(${Number(seconds)})`));
    return {};
  }

  /** A transaction that does nothing until it is let go, and then goes on. */
  @Get('hold')
  @Public()
  async hold(): Promise<object> {
    await this.database.asIdentity(async (tx) => {
      await tx.execute(sql`select 1`);
      begun += 1;
      await new Promise<void>((go) => held.add(go));
      await tx.execute(sql`select 1`);
    });
    return {};
  }
}

let done = 0;

/** A job that only says that it was done. */
@Module({ controllers: [FaultsController] })
class FaultsModule implements OnModuleInit {
  constructor(private readonly tasks: JobTasks) {}

  onModuleInit(): void {
    this.tasks.register('faults-probe', () => {
      done += 1;
      return Promise.resolve();
    });
  }
}

export const jobsDone = (): number => done;

/** Transactions that were begun by `hold` and not let go. */
export const holding = (): number => begun;
export function letGo(): void {
  for (const go of held) go();
  held.clear();
  begun = 0;
}

/** The program with short limits and a wire to its database that can fail, beside a TestApp on the same database. */
export class Faulty {
  private constructor(
    readonly app: NestExpressApplication,
    readonly wire: Wire,
  ) {}

  static async start(t: TestApp, variables: Variables = {}): Promise<Faulty> {
    const wire = await Wire.to(t.db.appUrl);
    const limits = Object.entries(LIMITS).map(([name, ms]): [string, string] => [
      `DATABASE_${name.toUpperCase()}_MS`,
      String(ms),
    ]);
    const environment = readEnvironment({
      MODE: 'test',
      PUBLIC_ORIGIN: ORIGIN,
      SESSION_SECRET: SECRET,
      DATABASE_URL: wire.by(t.db.appUrl),
      DATABASE_JOBS_URL: wire.by(t.db.jobsUrl),
      DATABASE_POOL: String(POOL),
      SWEEP_S: '1',
      ...Object.fromEntries(limits),
      ...variables,
    });
    const app = await createApp(environment, [FaultsModule]);
    await startUp(app);
    // Listening: a server of its own for each request would hide what requests at once do to each other.
    await app.listen(0, '127.0.0.1');
    return new Faulty(app, wire);
  }

  async close(): Promise<void> {
    await this.app.close();
    await this.wire.cut();
  }

  /** Puts a job into the queue, as an action does. */
  async enqueue(): Promise<void> {
    const queue = this.app.get(Queue);
    await this.app.get(Database).asIdentity((tx) => queue.enqueue(tx, 'faults-probe', {}, 0));
  }

  get(path: string): request.Test {
    return request(this.app.getHttpServer()).get(`/api/${path}`);
  }

  async cookieOf({ email }: TestPerson): Promise<string> {
    const answer = await request(this.app.getHttpServer())
      .post('/api/sign-in')
      .set('sec-fetch-site', 'same-origin')
      .send({ email, passphrase: PASSPHRASE });
    return cookieAfter(answer);
  }

  put(url: string, cookie: string, body: object): request.Test {
    return request(this.app.getHttpServer())
      .put(url)
      .set('sec-fetch-site', 'same-origin')
      .set('cookie', cookie)
      .send(body);
  }
}

export interface Timed {
  status: number;
  body: Record<string, unknown>;
  retryAfter: string | undefined;
  ms: number;
}

/** The answer, and how long it took. */
export async function timed(sent: request.Test): Promise<Timed> {
  const began = performance.now();
  const answer = await sent;
  const body = (answer.body ?? {}) as Record<string, unknown>;
  return {
    status: answer.status,
    body,
    retryAfter: answer.get('retry-after')?.toString(),
    ms: performance.now() - began,
  };
}
