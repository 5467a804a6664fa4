import { starterCatalogue, type ChemistryDocument } from '@wetside/chemistry';
import { bottleTotals, chemistryVersions } from '@wetside/db';
import { eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import type { Browser, TestApp, TestPerson } from './test-app.js';

/** When an action is told for and by which clock; left out: now, by the server's. */
export interface Telling {
  id?: string;
  happenedAt?: Date;
  deviceNow?: Date;
}

export const MINUTE = 60_000;
export const HOUR = 60 * MINUTE;
export const DAY = 24 * HOUR;

/** A darkroom with the starter catalogue, a manager, a technician and two members, and short ways to tell it things. */
export class LedgerHouse {
  private constructor(
    readonly t: TestApp,
    readonly id: string,
    readonly people: { manager: TestPerson; technician: TestPerson; member: TestPerson; other: TestPerson },
    private readonly versions: ReadonlyMap<string, string>,
  ) {}

  static async open(t: TestApp, shortName: string): Promise<LedgerHouse> {
    const manager = await t.person(`Mara ${shortName}`);
    const technician = await t.person(`Theo ${shortName}`);
    const member = await t.person(`Ada ${shortName}`);
    const other = await t.person(`Jonas ${shortName}`);
    const id = await t.darkroom(shortName, manager);
    await t.join(id, technician, 'technician');
    await t.join(id, member, 'member');
    await t.join(id, other, 'member');
    const rows = await t.database.inDarkroom({ darkroomId: id }, (tx) =>
      tx.select().from(chemistryVersions).where(eq(chemistryVersions.darkroomId, id)),
    );
    const idOf = (document: ChemistryDocument) =>
      rows.find((row) => row.document.name === document.name)?.id ?? '';
    const versions = new Map(starterCatalogue.map(({ key, document }) => [key, idOf(document)]));
    return new LedgerHouse(t, id, { manager, technician, member, other }, versions);
  }

  url(path: string): string {
    return `/api/darkrooms/${this.id}/${path}`;
  }

  /** An action's body, as a phone sends it. */
  told(content: object, { happenedAt, deviceNow }: Telling = {}) {
    const now = deviceNow ?? this.t.clock.now();
    const at = happenedAt ?? now;
    return {
      content: { v: 1, happenedAt: at.toISOString(), ...content },
      envelope: { sentAt: now.toISOString(), deviceNow: now.toISOString(), queued: false },
    };
  }

  /** A request, not sent before it is awaited. */
  put(browser: Browser, what: string, content: object, telling: Telling = {}) {
    return browser.put(this.url(`${what}/${telling.id ?? v7()}`)).send(this.told(content, telling));
  }

  /** A litre of rapid fixer (20 rolls) in a full bottle, measured by hand. @returns bottle, action and code */
  async mix(
    technician: Browser,
    telling: Telling = {},
  ): Promise<{ bottleId: string; actionId: string; code: string }> {
    const bottleId = v7();
    const actionId = telling.id ?? v7();
    const answer = await this.put(technician, 'mixes', this.mixOf(bottleId), {
      ...telling,
      id: actionId,
    }).expect(201);
    return { bottleId, actionId, code: (answer.body as { bottle: { code: string } }).bottle.code };
  }

  mixOf(bottleId: string, volumeUl = 1_000_000): object {
    return {
      bottleId,
      chemistryVersionId: this.versions.get('rapid-fixer'),
      volumeUl,
      container: { sizeUl: volumeUl, kind: 'bottle', material: 'glass' },
      material: 'film',
      from: { kind: 'hand' },
    };
  }

  /** So many rolls of 135-36 through these bottles. */
  loadOf(bottleIds: string[], count = 1): object {
    return { bottleIds, material: 'film', film: [{ format: '135-36', count, filmClass: 'conventional' }] };
  }

  async totals(): Promise<Map<string, (typeof bottleTotals.$inferSelect)['totals']>> {
    const rows = await this.t.database.inDarkroom({ darkroomId: this.id }, (tx) =>
      tx.select().from(bottleTotals).where(eq(bottleTotals.darkroomId, this.id)),
    );
    return new Map(rows.map((row) => [row.bottleId, row.totals]));
  }
}
