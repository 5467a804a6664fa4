import type { INestApplicationContext } from '@nestjs/common';
import { starterCatalogue } from '@wetside/chemistry';
import { chemistryVersions, lots, openedPacks, orders, packs, type ActionKind } from '@wetside/db';
import type { DemoAction, DemoDeed } from '@wetside/db/seed/demo-scenario';
import { idFor } from '@wetside/db/seed/ids';
import { and, eq, isNull, sql } from 'drizzle-orm';
import { HoldsService } from '../../features/holds/holds.service.js';
import { DecisionsService } from '../../features/loads/decisions.service.js';
import { LoadsService } from '../../features/loads/loads.service.js';
import { MixesService } from '../../features/mixes/mixes.service.js';
import { DraftsService } from '../../features/orders/drafts.service.js';
import { SendingService } from '../../features/orders/sending.service.js';
import { ReceiptsService } from '../../features/shelf/receipts.service.js';
import { VoidsService } from '../../features/voids/voids.service.js';
import type { PutAction } from '../../platform/ledger/action-recorder.js';
import { Database } from '../../platform/database/database.js';
import type { Entrance } from '../../platform/ledger/entrance.js';
import type { Cast } from './cast.js';

type Of<K extends DemoDeed['do']> = Extract<DemoDeed, { do: K }> & { day: number; at: string };
const LITRE_UL = 1_000_000;

/** Turns the scenario's names into ids and its deeds into the calls that the controllers make. */
export class Stage {
  private count = 0;

  private constructor(
    private readonly app: INestApplicationContext,
    private readonly cast: Cast,
    private readonly versionIds: ReadonlyMap<string, string>,
    private readonly packIds: ReadonlyMap<string, string>,
  ) {}

  static async set(app: INestApplicationContext, cast: Cast): Promise<Stage> {
    const { darkroomId } = cast;
    return app.get(Database).inDarkroom({ darkroomId }, async (tx) => {
      const versions = await tx
        .select()
        .from(chemistryVersions)
        .where(eq(chemistryVersions.darkroomId, darkroomId));
      const keyOf = new Map(starterCatalogue.map(({ key, document }) => [document.name, key]));
      const known = await tx.select().from(packs).where(eq(packs.darkroomId, darkroomId));
      return new Stage(
        app,
        cast,
        new Map(versions.map((version) => [keyOf.get(version.document.name) ?? '', version.id])),
        new Map(known.map((pack) => [pack.name, pack.id])),
      );
    });
  }

  async act(deed: DemoAction, at: Date): Promise<void> {
    const enter = this.cast.enter(deed.by);
    switch (deed.do) {
      case 'receive':
        return this.receive(enter, deed, at);
      case 'mix':
        return this.mix(enter, deed, at);
      case 'load':
        return this.load(enter, deed, at);
      case 'hold':
      case 'release': {
        const put = this.put(deed.do, deed, at, { bottleId: idFor(deed.bottle), reason: deed.reason });
        await this.app.get(HoldsService)[deed.do](enter, put);
        return;
      }
      case 'discard': {
        const { bottle, wasteRoute } = deed;
        await this.app
          .get(HoldsService)
          .discard(enter, this.put('discard', deed, at, { bottleId: idFor(bottle), wasteRoute }));
        return;
      }
      case 'void': {
        const content = { voidedActionId: idFor(`action ${deed.load}`), reason: deed.reason };
        await this.app.get(VoidsService).put(enter, this.put('void', deed, at, content));
        return;
      }
      case 'accept': {
        const content = {
          loadActionId: idFor(`action ${deed.load}`),
          decision: 'accept' as const,
          reason: deed.reason,
        };
        await this.app.get(DecisionsService).put(enter, this.put('decision', deed, at, content));
        return;
      }
      case 'draft':
        return this.draft(enter, deed, at);
      case 'send':
        return this.send(enter, deed, at);
    }
  }

  private async receive(enter: Entrance, deed: Of<'receive'>, at: Date): Promise<void> {
    const { lot, lotNumber, count, expiresOn, order } = deed;
    const packId = this.known(this.packIds, deed.pack);
    const line = { packId, lotId: idFor(`lot ${lot}`), lotNumber, count, expiresOn };
    const content = order
      ? { orderId: idFor(`order ${order}`), lines: [{ ...line, orderLineId: idFor(`order line ${order}`) }] }
      : { lines: [line] };
    await this.app.get(ReceiptsService).record(enter, this.put('receipt', deed, at, content));
  }

  private async mix(enter: Entrance, deed: Of<'mix'>, at: Date): Promise<void> {
    const volumeUl = deed.litres * LITRE_UL;
    const put = this.put('mix', deed, at, {
      bottleId: idFor(deed.bottle),
      chemistryVersionId: this.known(this.versionIds, deed.chemistry),
      volumeUl,
      container: { sizeUl: volumeUl, kind: 'bottle' as const, material: 'glass' as const },
      material: 'film' as const,
      from: await this.source(deed),
    });
    const { body } = await this.app.get(MixesService).put(enter, put);
    if (body.bottle.code !== deed.bottle)
      throw new Error(`The demo mixed ${body.bottle.code} where it told of ${deed.bottle}.`);
  }

  private async source(deed: Of<'mix'>) {
    const lotId = idFor(`lot ${deed.lot ?? ''}`);
    if (deed.from === 'hand') return { kind: 'hand' as const };
    if (deed.from === 'new pack') return { kind: 'lot' as const, lotId };
    return { kind: 'opened' as const, openedPackIds: await this.openedOf(lotId) };
  }

  /** The parts of the pack that was opened last of that lot. */
  private async openedOf(lotId: string): Promise<string[]> {
    const { darkroomId } = this.cast;
    const rows = await this.app.get(Database).inDarkroom({ darkroomId }, (tx) =>
      tx
        .selectDistinctOn([openedPacks.packPartId], { id: openedPacks.id })
        .from(openedPacks)
        .innerJoin(lots, and(eq(lots.darkroomId, openedPacks.darkroomId), eq(lots.id, openedPacks.lotId)))
        .where(
          and(
            eq(openedPacks.darkroomId, darkroomId),
            eq(openedPacks.lotId, lotId),
            isNull(openedPacks.voidedAt),
          ),
        )
        .orderBy(openedPacks.packPartId, sql`coalesce(${openedPacks.leftUl}, ${openedPacks.leftMg}) desc`),
    );
    return rows.map((row) => row.id);
  }

  private async load(enter: Entrance, deed: Of<'load'>, at: Date): Promise<void> {
    const { load, bottles, format, count, filmClass = 'conventional' } = deed;
    const content = {
      bottleIds: bottles.map(idFor),
      material: 'film' as const,
      film: [{ format, count, filmClass }],
    };
    await this.app.get(LoadsService).put(enter, this.put('load', deed, at, content, idFor(`action ${load}`)));
  }

  private async draft(enter: Entrance, deed: Of<'draft'>, at: Date): Promise<void> {
    const { order, supplier, pack, count } = deed;
    const lines = [
      { id: idFor(`order line ${order}`), supplierPackId: idFor(`supplier pack ${supplier} ${pack}`), count },
    ];
    const content = { orderId: idFor(`order ${order}`), supplierId: idFor(`supplier ${supplier}`), lines };
    await this.app.get(DraftsService).record(enter, this.put('order-draft', deed, at, content));
  }

  private async send(enter: Entrance, deed: Of<'send'>, at: Date): Promise<void> {
    const orderId = idFor(`order ${deed.order}`);
    const { darkroomId } = this.cast;
    const [row] = await this.app.get(Database).inDarkroom({ darkroomId }, (tx) =>
      tx
        .select({ revision: orders.revision })
        .from(orders)
        .where(and(eq(orders.darkroomId, darkroomId), eq(orders.id, orderId))),
    );
    const content = { orderId, revision: row?.revision ?? 0 };
    await this.app.get(SendingService).send(enter, this.put('order-send', deed, at, content));
  }

  private put<C>(
    kind: ActionKind,
    deed: { do: string; day: number; at: string },
    at: Date,
    detail: C,
    id?: string,
  ): PutAction & { content: C & { v: 1; happenedAt: string } } {
    this.count += 1;
    const happenedAt = at.toISOString();
    const content = { v: 1 as const, happenedAt, ...detail };
    const envelope = { sentAt: happenedAt, deviceNow: happenedAt, queued: false };
    return {
      id: id ?? idFor(`action ${this.count} ${deed.do} ${deed.day} ${deed.at}`),
      kind,
      content,
      raw: content,
      envelope,
    };
  }

  private known(map: ReadonlyMap<string, string>, name: string): string {
    const id = map.get(name);
    if (!id) throw new Error(`The demo knows no ${name}.`);
    return id;
  }
}
