import type { TestDatabase } from '@wetside/db/testing/clone';
import { readEnvironment } from '../../config/environment.js';
import { Clock } from '../../platform/clock/clock.js';
import { reconcile } from '../reconcile/reconcile.js';
import type { KillCluster } from './cluster.js';
import { compare } from './compare.js';
import { openKillHouse } from './house.js';
import type { KillServer } from './server.js';
import { readStored } from './stored.js';
import { Ticker, type Outcome, type Sent } from './ticker.js';
import { until } from './until.js';

export const KINDS = ['server', 'database', 'both'] as const;
export type KillKind = (typeof KINDS)[number];

/** What came of one kill. */
export interface Killed {
  kind: KillKind;
  answered: number;
  unansweredFound: number;
  unansweredNotFound: number;
  retries: number;
  /** Milliseconds from the kill to the first load that was answered after it. */
  backMs: number;
  differences: string[];
}

const TICKERS = 8;
const BOTTLES = 12;
/** Loads answered before each kill, so that it falls among many. */
const BEFORE = 16;

/** People who tick all the time, and what is killed under them. */
export class Drill {
  private waiting: Promise<void> | null = null;

  private constructor(
    private readonly parts: { cluster: KillCluster; server: KillServer; db: TestDatabase },
    private readonly darkroomId: string,
    private readonly bottleIds: readonly string[],
    private readonly tickers: readonly Ticker[],
    private readonly clock: Clock,
  ) {}

  /** Opens a darkroom, starts the server, signs everybody in and mixes the bottles. */
  static async open(parts: { cluster: KillCluster; server: KillServer; db: TestDatabase }): Promise<Drill> {
    const { server, db } = parts;
    const house = await openKillHouse(db, TICKERS);
    await server.start();
    const settings = { MODE: 'test', DATABASE_URL: db.appUrl, DATABASE_JOBS_URL: db.jobsUrl };
    const clock = new Clock(readEnvironment(settings));
    const tickers = house.emails.map(
      (email) => new Ticker(server.url, house.darkroomId, email, () => clock.now()),
    );
    await Promise.all(tickers.map((ticker) => ticker.signIn()));
    const [manager] = tickers;
    const bottleIds: string[] = [];
    while (manager && bottleIds.length < BOTTLES) bottleIds.push(await manager.mix(house.versionId));
    return new Drill(parts, house.darkroomId, bottleIds, tickers, clock);
  }

  /** Ticks, kills, brings back what was killed, ticks on, and then compares and sends again what was not answered. */
  async kill(kind: KillKind): Promise<Killed> {
    const before = this.answered();
    let stopped = false;
    const ticking = Promise.all(this.tickers.map((ticker) => this.keepTicking(ticker, () => stopped)));
    await until(() => this.answered() >= before + BEFORE);
    const began = performance.now();
    const backMs = this.firstAnswer(began);
    const troubles = await this.killAndBringBack(kind);
    await backMs;
    stopped = true;
    await ticking;
    const unanswered = this.sent().filter(({ answered }) => !answered);
    const differences = [...troubles, ...(await this.compare())];
    const again = await this.sendAgain();
    differences.push(...again.differences, ...(await this.compare()), ...(await this.reconciled()));
    return {
      kind,
      answered: this.answered() - before - unanswered.length,
      unansweredFound: again.found,
      unansweredNotFound: unanswered.length - again.found,
      retries: again.retries,
      backMs: await backMs,
      differences,
    };
  }

  private async killAndBringBack(kind: KillKind): Promise<string[]> {
    const { cluster, server } = this.parts;
    if (kind === 'server') {
      await server.kill();
      await server.start();
      return [];
    }
    cluster.kill();
    if (kind === 'database') {
      await cluster.start();
      return server.isAlive() ? [] : ['The server did not outlive its database.'];
    }
    // The server goes while PostgreSQL reads its log again.
    const started = cluster.start();
    await server.kill();
    await started;
    await server.start();
    return [];
  }

  /** A person whose load failed waits until the server lets people in again before the next one. */
  private async keepTicking(ticker: Ticker, isStopped: () => boolean): Promise<void> {
    while (!isStopped()) if (!(await ticker.tick(this.someBottles()))) await this.whenReady();
  }

  /** One asks for all: eight who ask all the time would keep a server busy that has just come up. */
  private whenReady(): Promise<void> {
    this.waiting ??= until(() => this.parts.server.isReady()).finally(() => (this.waiting = null));
    return this.waiting;
  }

  private someBottles(): string[] {
    const from = Math.floor(Math.random() * BOTTLES);
    const count = 1 + Math.floor(Math.random() * 3);
    return Array.from({ length: count }, (_, n) => this.bottleIds[(from + n) % BOTTLES] ?? '');
  }

  /** The first load sent after the moment of the kill that is answered. */
  private async firstAnswer(began: number): Promise<number> {
    const known = new Set(this.sent().map(({ id }) => id));
    let ms = 0;
    await until(() => {
      ms = performance.now() - began;
      return this.sent().some(({ id, answered }) => answered && !known.has(id));
    });
    return ms;
  }

  /** Sends what was not answered until it is; the first answer must say whether it had arrived before. */
  private async sendAgain(): Promise<{ found: number; retries: number; differences: string[] }> {
    const all = { found: 0, retries: 0, differences: [] as string[] };
    const { loads } = await readStored(this.parts.db.adminUrl, this.darkroomId);
    const there = new Set(loads.map(({ id }) => id));
    await Promise.all(
      this.tickers.map(async (ticker) => {
        for (const sent of ticker.sent.filter(({ answered }) => !answered)) {
          const statuses = await sendUntilAnswered(ticker, sent);
          const due = there.has(sent.id) ? 200 : 201;
          all.found += there.has(sent.id) ? 1 : 0;
          all.retries += statuses.length;
          // A try that failed may have arrived: only a first answer tells.
          if (statuses.length === 1 && statuses[0] !== due)
            all.differences.push(`The retry of load ${sent.id} was answered ${statuses[0]}, not ${due}.`);
        }
      }),
    );
    return all;
  }

  private async compare(): Promise<string[]> {
    return compare(this.sent(), await readStored(this.parts.db.adminUrl, this.darkroomId));
  }

  private async reconciled(): Promise<string[]> {
    return (await reconcile(this.parts.db.adminUrl, this.clock.now())).differences;
  }

  private sent(): Sent[] {
    return this.tickers.flatMap((ticker) => ticker.sent);
  }

  private answered(): number {
    return this.sent().filter(({ answered }) => answered).length;
  }
}

async function sendUntilAnswered(ticker: Ticker, sent: Sent): Promise<Outcome[]> {
  const statuses: Outcome[] = [];
  await until(async () => {
    statuses.push(await ticker.send(sent));
    return sent.answered;
  });
  return statuses;
}
