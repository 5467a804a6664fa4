import { events, lots, mails, orderLines, orders, packs, supplierPacks, suppliers } from '@wetside/db';
import { and, asc, eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import type { Tx } from '../../platform/database/database.js';
import { touched } from '../../platform/ledger/void-handlers.js';
import { TestApp } from '../../testing/test-app.js';
import type { Cause } from './crossing.js';
import { WarningsService } from './warnings.service.js';

describe('warnings about the shelf', () => {
  let test: TestApp;
  let darkroomId: string;
  const packId = v7();
  const [lotA, lotB, supplierPackId] = [v7(), v7(), v7()];

  beforeAll(async () => {
    test = await TestApp.start({ MAIL_GRACE_S: '3600', SWEEP_S: '86400' });
  });
  afterAll(() => test.close());

  const inDarkroom = <T>(work: (tx: Tx) => Promise<T>) => test.database.inDarkroom({ darkroomId }, work);
  const settle = (tx: Tx, cause: Cause) =>
    test.app
      .get(WarningsService)
      .settle(
        tx,
        { darkroomId, zone: 'Europe/Vienna', now: test.clock.now(), cause },
        touched({ packIds: [packId] }),
      );

  const shelf = (lotId: string, unopened: number, cause: Cause = 'action'): Promise<void> =>
    inDarkroom(async (tx) => {
      await tx.update(lots).set({ unopened }).where(eq(lots.id, lotId));
      await settle(tx, cause);
    });

  async function order(state: 'sent' | 'cancelled', orderId: string): Promise<void> {
    await inDarkroom(async (tx) => {
      await tx
        .update(orders)
        .set({ state })
        .where(and(eq(orders.darkroomId, darkroomId), eq(orders.id, orderId)));
      await settle(tx, state === 'sent' ? 'action' : 'retraction');
    });
  }

  async function provision(shortName: string): Promise<string> {
    const ada = await test.person(`Ada ${shortName}`);
    darkroomId = await test.darkroom(shortName, ada);
    const membershipId = await test.join(darkroomId, await test.person(`Tomas ${shortName}`), 'technician');
    const [supplierId, orderId] = [v7(), v7()];
    await inDarkroom(async (tx) => {
      const own = { darkroomId };
      await tx.insert(packs).values({
        ...own,
        id: packId,
        name: 'Rapid fixer',
        form: 'concentrate',
        reorderPoint: 1,
        reorderUpTo: 3,
      });
      await tx.insert(lots).values(
        [lotA, lotB].map((id) => ({
          ...own,
          id,
          packId,
          lotNumber: id,
          expiryIsGuess: false,
          unopened: 1,
        })),
      );
      await tx
        .insert(suppliers)
        .values({ ...own, id: supplierId, name: 'Nadir', email: 'orders@nadir.example', currency: 'EUR' });
      await tx
        .insert(supplierPacks)
        .values({ ...own, id: supplierPackId, supplierId, packId, supplierName: 'RF 1 L' });
      await tx.insert(orders).values({
        ...own,
        id: orderId,
        number: 1,
        supplierId,
        state: 'draft',
        currency: 'EUR',
        revision: 1,
        draftedBy: membershipId,
        draftedAt: test.clock.now(),
      });
      await tx.insert(orderLines).values({
        ...own,
        id: v7(),
        orderId,
        supplierPackId,
        position: 0,
        count: 3,
        received: 0,
        cancelled: 1,
      });
      await settle(tx, 'action');
    });
    return orderId;
  }

  const found = () =>
    inDarkroom((tx) =>
      tx.select().from(events).where(eq(events.darkroomId, darkroomId)).orderBy(asc(events.id)),
    );
  const waiting = async () => {
    const rows = await inDarkroom((tx) =>
      tx
        .select()
        .from(mails)
        .where(and(eq(mails.darkroomId, darkroomId), eq(mails.state, 'waiting'))),
    );
    return [...new Set(rows.map(({ subject }) => subject))];
  };

  it('opens at the reorder point, ends with the order that is sent, and is the same again when that is cancelled', async () => {
    const orderId = await provision('north');
    expect(await found()).toEqual([]);
    await shelf(lotA, 0);
    expect(await found()).toMatchObject([{ kind: 'reorder-point', crossing: 1, endedAt: null }]);
    expect(await waiting()).toEqual(['Rapid fixer: 1 on the shelf, reorder at 1']);
    await order('sent', orderId);
    expect(await found()).toMatchObject([{ kind: 'reorder-point', endedBy: 'action' }]);
    expect(await waiting()).toEqual([]);
    await order('cancelled', orderId);
    expect(await found()).toMatchObject([{ kind: 'reorder-point', crossing: 1, endedAt: null }]);
    expect(await waiting()).toHaveLength(1);
  });

  it('says that none is on the shelf whatever is on order, and what to do about it', async () => {
    const orderId = await provision('south');
    await order('sent', orderId);
    await shelf(lotA, 0);
    expect(await found()).toEqual([]);
    await shelf(lotB, 0);
    expect(await found()).toMatchObject([{ kind: 'none-on-shelf', endedAt: null }]);
    expect(await waiting()).toEqual(['Rapid fixer: none on the shelf']);
    await shelf(lotB, 2);
    expect(await found()).toMatchObject([{ kind: 'none-on-shelf', endedBy: 'action' }]);
  });

  it('misses nothing when two take the last of two lots at once', async () => {
    await provision('east');
    await Promise.all([shelf(lotA, 0), shelf(lotB, 0)]);
    expect((await found()).map(({ kind, endedAt }) => [kind, endedAt])).toEqual(
      expect.arrayContaining([
        ['reorder-point', null],
        ['none-on-shelf', null],
      ]),
    );
  });
});
