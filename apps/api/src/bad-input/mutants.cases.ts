import { LoadsRepository } from '../features/loads/loads.repository.js';
import { ReceiptVoids } from '../features/shelf/receipt-voids.js';
import { ActionsRepository } from '../platform/ledger/actions.repository.js';
import { OrdersRepository } from '../features/orders/orders.repository.js';
import { DraftsService } from '../features/orders/drafts.service.js';
import { problem } from '../platform/errors/problem.js';
import { orderRows } from './orders.rows.js';
import { judge, type Row } from './table.js';
import { bottleRows } from './bottles.rows.js';
import { voidRows } from './voids.rows.js';
import type { World } from './world.js';

const rowOf = (rows: readonly Row[], what: string): Row => {
  const found = rows.find((row) => row[0] === what);
  if (!found) throw new Error(`No case is called: ${what}`);
  return found;
};

/** The cases are seen red: each with the guard that it is about taken out. They leave things as no program would, so they come last. */
export function mutantsTopic(world: () => World): void {
  describe('the cases see it when a guard is gone', () => {
    afterEach(() => jest.restoreAllMocks());

    const red = (row: Row) => expect(judge(world(), row)).rejects.toThrow();

    it('mutant: a receipt taken back though its kit was used', async () => {
      const row = rowOf(voidRows, 'taking back a receipt whose kit was used');
      await judge(world(), row);
      jest.spyOn(world().t.app.get(ReceiptVoids), 'prepare').mockResolvedValue();
      await red(row);
    });

    it('mutant: a load decided on twice', async () => {
      const row = rowOf(bottleRows, 'a load decided on twice');
      await judge(world(), row);
      jest.spyOn(world().t.app.get(LoadsRepository), 'isDecided').mockResolvedValue(false);
      await red(row);
    });

    it('mutant: a draft taken back after it went out', async () => {
      const row = rowOf(voidRows, 'taking back a draft that went out');
      await judge(world(), row);
      jest.spyOn(world().t.app.get(DraftsService), 'prepare').mockResolvedValue();
      await red(row);
    });

    it('mutant: a refusal that has written something before', async () => {
      const row = rowOf(orderRows, 'a draft sent that somebody changed since it was seen');
      const wrote: Row = [
        row[0],
        async (w) => {
          await w.root`update counters set last = last + 1`;
          return { status: 404, type: 'application/problem+json', body: problem('not-found').toDocument() };
        },
        404,
      ];
      await red(wrote);
    });

    it('mutant: a refusal that shows the database', async () => {
      const leaks = { ...problem('broken').toDocument(), detail: 'Failed query: select 1 from actions.' };
      await red([
        'leak',
        () => Promise.resolve({ status: 500, type: 'application/problem+json', body: leaks }),
        500,
      ]);
    });

    it('mutant: a refusal that is no problem document', async () => {
      const body = problem('not-found').toDocument();
      await red(['page', () => Promise.resolve({ status: 404, type: 'text/html', body }), 404]);
    });

    it('mutant: an action that is not looked up before it is recorded', async () => {
      const again: Row = [
        'again',
        (w) => w.put(w.technician, 'voids', { voidedActionId: w.ids.void }, { id: w.ids.load }),
        409,
        'action-differs',
      ];
      await judge(world(), again);
      jest.spyOn(world().t.app.get(ActionsRepository), 'find').mockResolvedValue(null);
      await red(again);
    });

    it('mutant: a draft changed without a look at its revision', async () => {
      const row = rowOf(orderRows, 'a draft changed that somebody changed since');
      await judge(world(), row);
      const orders = world().t.app.get(OrdersRepository);
      const lock = orders.lock.bind(orders);
      jest.spyOn(orders, 'lock').mockImplementation(async (...asked) => {
        const order = await lock(...asked);
        return order && { ...order, revision: 1 };
      });
      await red(row);
    });
  });
}
