import { rapidFixer } from '@wetside/chemistry';
import {
  chemistries,
  chemistryVersions,
  lots,
  makes,
  openedPacks,
  packParts,
  packs,
  stockMovements,
  supplierPacks,
  suppliers,
  voids,
} from '@wetside/db';
import { and, eq, isNull } from 'drizzle-orm';
import { v7 } from 'uuid';
import type { NeedsYouRowView, NeedsYouView } from '../features/alerts/needs-you.dto.js';
import type { MixAnswer } from '../features/mixes/mix.dto.js';
import type { OneOrderAnswer, OrderActionAnswer, OrdersAnswer } from '../features/orders/order.view.js';
import type { ReceiptAnswer } from '../features/shelf/receipt.dto.js';
import type { PackView, ShelfView } from '../features/shelf/shelf.view.js';
import type { SuppliersAnswer } from '../features/suppliers/suppliers.dto.js';
import type { ProblemDocument } from '../platform/errors/problem.js';
import type { Browser, TestApp, TestPerson } from './test-app.js';

interface Bodies {
  mix: MixAnswer;
  'needs-you': NeedsYouView;
  order: OneOrderAnswer;
  'order-action': OrderActionAnswer;
  orders: OrdersAnswer;
  problem: ProblemDocument;
  receipt: ReceiptAnswer;
  shelf: ShelfView;
  suppliers: SuppliersAnswer;
}

/** The body of an answer, as the contract says that it is. */
export const told = <K extends keyof Bodies>(_kind: K, answer: { body: unknown }): Bodies[K] =>
  answer.body as Bodies[K];

/** A draft of some concentrates and one kit, with the ids of its lines. */
export interface Draft {
  orderId: string;
  concentrate: string;
  kit: string;
}

/** A darkroom with a fixer concentrate of one part, a kit of two parts and a powder packet, from one supplier. */
export class StockHouse {
  readonly concentrate = v7();
  readonly kit = v7();
  readonly powder = v7();
  readonly kitParts = { a: v7(), b: v7() };
  readonly supplier = v7();
  readonly soldConcentrate = v7();
  readonly soldKit = v7();
  readonly version = v7();

  private constructor(
    readonly t: TestApp,
    readonly id: string,
    readonly manager: Browser,
    readonly technician: Browser,
  ) {}

  static async open(t: TestApp, shortName: string): Promise<StockHouse> {
    const ines = await t.person(`Ines ${shortName}`);
    const tomas = await t.person(`Tomas ${shortName}`);
    const id = await t.darkroom(shortName, ines);
    await t.join(id, tomas, 'technician');
    const house = new StockHouse(t, id, await t.signedIn(ines), await t.signedIn(tomas));
    await house.stock();
    return house;
  }

  async member(name: string): Promise<Browser> {
    const person: TestPerson = await this.t.person(name);
    await this.t.join(this.id, person, 'member');
    return this.t.signedIn(person);
  }

  url(path: string): string {
    return `/api/darkrooms/${this.id}/${path}`;
  }

  /** Something that happens now. */
  act(browser: Browser, what: string, content: object, actionId = v7()) {
    const now = this.t.clock.nowIso();
    return browser.put(this.url(`${what}/${actionId}`)).send({
      content: { v: 1, happenedAt: now, ...content },
      envelope: { sentAt: now, deviceNow: now, queued: false },
    });
  }

  /** Packs that came by hand, as a lot of their own. @returns the lot and the action */
  async receive(
    packId: string,
    count: number,
    more: object = {},
  ): Promise<{ lotId: string; actionId: string }> {
    const lotId = v7();
    const actionId = v7();
    const line = { packId, lotId, lotNumber: '0611', expiresOn: '2029-01-12', count, ...more };
    await this.act(this.technician, 'receipts', { lines: [line] }, actionId).expect(201);
    return { lotId, actionId };
  }

  mix(from: object, volumeUl: number, actionId = v7()) {
    return this.act(
      this.technician,
      'mixes',
      {
        bottleId: v7(),
        chemistryVersionId: this.version,
        volumeUl,
        container: { sizeUl: 10_000_000, kind: 'bottle' },
        material: 'film',
        from,
      },
      actionId,
    );
  }

  /** The reason for which that was refused. */
  async refused(
    answer: PromiseLike<{ status: number; body: unknown }>,
    status: number,
  ): Promise<ProblemDocument> {
    const got = await answer;
    expect(got.status).toBe(status);
    return told('problem', got);
  }

  void(voidedActionId: string, browser = this.technician) {
    return this.act(browser, 'voids', { voidedActionId, reason: 'wrong box' });
  }

  async pack(id: string): Promise<PackView> {
    const { packs: all } = told('shelf', await this.technician.get(this.url('shelf')).expect(200));
    const found = all.find((pack) => pack.id === id);
    if (!found) throw new Error('The shelf does not show the pack.');
    return found;
  }

  async draft(count = 2, actionId = v7()): Promise<Draft> {
    const draft = { orderId: v7(), concentrate: v7(), kit: v7() };
    const lines = [
      { id: draft.concentrate, supplierPackId: this.soldConcentrate, count },
      { id: draft.kit, supplierPackId: this.soldKit, count: 1 },
    ];
    const content = { orderId: draft.orderId, supplierId: this.supplier, lines };
    await this.act(this.technician, 'order-drafts', content, actionId).expect(201);
    return draft;
  }

  send(orderId: string, revision = 1, actionId = v7()) {
    return this.act(this.manager, 'order-sendings', { orderId, revision }, actionId);
  }

  async order(id: string): Promise<OneOrderAnswer> {
    return told('order', await this.technician.get(this.url(`orders/${id}`)).expect(200));
  }

  /** Open warnings about that pack. */
  async warnings(packId: string): Promise<NeedsYouRowView[]> {
    const { open } = told('needs-you', await this.technician.get(this.url('needs-you')).expect(200));
    return open.filter(({ pack }) => pack?.id === packId);
  }

  /** Sentences about a lot or an opened pack whose running figure is not the sum of its movements. */
  async complaints(): Promise<string[]> {
    return this.t.database.inDarkroom({ darkroomId: this.id }, async (tx) => {
      const moved = await tx
        .select({ row: stockMovements })
        .from(stockMovements)
        .leftJoin(
          voids,
          and(
            eq(voids.darkroomId, stockMovements.darkroomId),
            eq(voids.voidedActionId, stockMovements.actionId),
          ),
        )
        .where(and(eq(stockMovements.darkroomId, this.id), isNull(voids.actionId)));
      const sum = (id: string) =>
        moved
          .filter(({ row }) => row.lotId === id || row.openedPackId === id)
          .reduce(
            (total, { row }) =>
              total + (row.lotId === id ? row.unopenedDelta : (row.deltaUl ?? row.deltaMg ?? 0)),
            0,
          );
      const lotRows = await tx.select().from(lots).where(eq(lots.darkroomId, this.id));
      const openedRows = await tx.select().from(openedPacks).where(eq(openedPacks.darkroomId, this.id));
      return [
        ...lotRows.map(({ id, unopened }) => ({ id, figure: unopened })),
        ...openedRows.map(({ id, leftUl, leftMg }) => ({ id, figure: leftUl ?? leftMg ?? 0 })),
      ].flatMap(({ id, figure }) =>
        figure === sum(id) ? [] : [`${id} says ${figure}, its movements ${sum(id)}`],
      );
    });
  }

  private async stock(): Promise<void> {
    const darkroomId = this.id;
    const chemistryId = v7();
    const pack = (id: string, name: string, form: 'concentrate' | 'kit' | 'powder') => {
      const watched = { keepsUnopenedMonths: 24, reorderPoint: 1, reorderUpTo: 2 };
      return { darkroomId, id, name, form, ...watched };
    };
    const part = (id: string, packId: string, position: number, name: string, size: object) => {
      return { darkroomId, id, packId, position, name, ...size };
    };
    const make = (packId: string, volumeUl: number, wholeOnly: boolean) => {
      return { darkroomId, id: v7(), packId, chemistryId, volumeUl, wholeOnly };
    };
    const sold = (id: string, packId: string, supplierName: string, priceMinor: number) => {
      return { darkroomId, id, supplierId: this.supplier, packId, supplierName, priceMinor };
    };
    await this.t.database.inDarkroom({ darkroomId }, async (tx) => {
      const createdAt = this.t.clock.now();
      await tx.insert(chemistries).values({ darkroomId, id: chemistryId, createdAt });
      const version = {
        darkroomId,
        id: this.version,
        chemistryId,
        number: 1,
        document: rapidFixer,
        createdAt,
      };
      await tx.insert(chemistryVersions).values(version);
      await tx
        .insert(packs)
        .values([
          pack(this.concentrate, 'Fixer concentrate 1 L', 'concentrate'),
          pack(this.kit, 'Fixer kit 5 L', 'kit'),
          pack(this.powder, 'Fixer powder 1 L', 'powder'),
        ]);
      await tx
        .insert(packParts)
        .values([
          part(v7(), this.concentrate, 1, 'concentrate', { sizeUl: 1_000_000 }),
          part(this.kitParts.a, this.kit, 1, 'part A', { sizeUl: 500_000 }),
          part(this.kitParts.b, this.kit, 2, 'part B', { sizeMg: 100_000 }),
          part(v7(), this.powder, 1, 'powder', { sizeMg: 250_000 }),
        ]);
      await tx
        .insert(makes)
        .values([
          make(this.concentrate, 5_000_000, false),
          make(this.kit, 3_000_000, false),
          make(this.powder, 1_000_000, true),
        ]);
      await tx.insert(suppliers).values({
        darkroomId,
        id: this.supplier,
        name: 'Bromide Street Supplies',
        email: 'orders@bromide-street.example',
        currency: 'EUR',
      });
      await tx
        .insert(supplierPacks)
        .values([
          sold(this.soldConcentrate, this.concentrate, 'Fix-1000', 1150),
          sold(this.soldKit, this.kit, 'Fix kit', 6100),
        ]);
    });
  }
}
