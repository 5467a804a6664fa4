import postgres from 'postgres';
import { v7 } from 'uuid';
import { FilledHouse, type Ids } from '../testing/filled-house.js';
import type { StockHouse } from '../testing/stock-house.js';
import { TestApp, type Browser } from '../testing/test-app.js';

/** How an action is told; left out: a new id, now, by the server's clock. */
export interface Telling {
  id?: string;
  at?: Date;
  deviceNow?: Date;
}

type Content = Record<string, unknown>;

/** Two darkrooms in which everything has happened once, and short ways to ask the first for something odd. */
export class World {
  private constructor(
    readonly t: TestApp,
    readonly here: FilledHouse,
    readonly there: FilledHouse,
    /** Another member of the first darkroom. */
    readonly other: Browser,
    /** A login that row security does not bind. */
    readonly root: postgres.Sql,
  ) {}

  static async open(): Promise<World> {
    const t = await TestApp.start({ MAIL_GRACE_S: '3600' }, [], { background: false });
    const here = await FilledHouse.open(t, 'here');
    const there = await FilledHouse.open(t, 'there');
    const root = postgres(t.db.superUrl, { max: 1, onnotice: () => undefined });
    return new World(t, here, there, await here.house.member('Jonas here'), root);
  }

  async close(): Promise<void> {
    await this.root.end();
    await this.t.close();
  }

  get house(): StockHouse {
    return this.here.house;
  }
  get ids(): Ids {
    return this.here.ids;
  }
  get manager(): Browser {
    return this.house.manager;
  }
  get technician(): Browser {
    return this.house.technician;
  }
  get member(): Browser {
    return this.here.member;
  }

  url(path: string): string {
    return this.house.url(path);
  }

  /** Stops the clock where it stands, so that a bound can be met to the millisecond. @returns how to let it go on */
  stopClock(at = this.t.clock.now()): () => void {
    const now = jest.spyOn(this.t.clock, 'now').mockImplementation(() => new Date(at));
    return () => now.mockRestore();
  }

  /** So much later; everybody is still signed in. */
  async later(ms: number): Promise<void> {
    this.t.clock.advance(ms);
    for (const browser of [this.manager, this.technician, this.member, this.other])
      await browser.post('/api/sign-in/refresh').expect(204);
  }

  ago(ms: number): Date {
    return new Date(this.t.clock.now().getTime() - ms);
  }

  told(content: Content, { at, deviceNow }: Telling = {}) {
    const now = (deviceNow ?? this.t.clock.now()).toISOString();
    return {
      content: { v: 1, happenedAt: at?.toISOString() ?? now, ...content },
      envelope: { sentAt: now, deviceNow: now, queued: false },
    };
  }

  put(browser: Browser, what: string, content: Content, telling: Telling = {}) {
    return browser.put(this.url(`${what}/${telling.id ?? v7()}`)).send(this.told(content, telling));
  }

  /** A request whose body is sent letter by letter, for what no JSON.stringify writes. */
  putText(browser: Browser, path: string, text: string) {
    return browser.put(this.url(path)).set('content-type', 'application/json').send(text);
  }

  film(change: Content = {}): Content {
    return { format: '135-36', count: 1, filmClass: 'conventional', ...change };
  }

  load(change: Content = {}): Content {
    return { bottleIds: [this.ids.bottleId], material: 'film', film: [this.film()], ...change };
  }

  mix(change: Content = {}): Content {
    return {
      bottleId: v7(),
      chemistryVersionId: this.house.version,
      volumeUl: 1_000_000,
      container: { sizeUl: 1_000_000_000, kind: 'tank' },
      material: 'film',
      from: { kind: 'hand' },
      ...change,
    };
  }

  receiptLine(change: Content = {}): Content {
    const printed = { lotNumber: 'B-7', expiresOn: '2029-01-12' };
    return { packId: this.house.concentrate, lotId: v7(), ...printed, count: 1, ...change };
  }

  receipt(change: Content = {}): Content {
    return { lines: [this.receiptLine(change)] };
  }

  draft(change: Content = {}): Content {
    const line = { id: v7(), supplierPackId: this.house.soldConcentrate, count: 1, ...change };
    return { orderId: v7(), supplierId: this.house.supplier, lines: [line] };
  }

  /** A fresh bottle of its own. */
  async bottle(): Promise<string> {
    const bottleId = v7();
    await this.put(this.technician, 'mixes', this.mix({ bottleId })).expect(201);
    return bottleId;
  }
}
