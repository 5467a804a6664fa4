import { memberships } from '@wetside/db';
import { and, eq, sql } from 'drizzle-orm';
import { v7 } from 'uuid';
import { TestApp } from '../../testing/test-app.js';
import { hotQuery, isAnyOf } from './hot-query.js';

let t: TestApp;
let darkroomId: string;
beforeAll(async () => {
  t = await TestApp.start();
  darkroomId = await t.darkroom('cellar', await t.person('Ada'));
});
afterAll(() => t.close());

const named = hotQuery('named_members', (db) =>
  db
    .select({ id: memberships.id, name: memberships.displayName, joinedAt: memberships.joinedAt })
    .from(memberships)
    .where(and(eq(memberships.darkroomId, sql.placeholder('darkroomId')), isAnyOf(memberships.id, 'ids'))),
);

describe('a query that was written down once', () => {
  it('runs in the transaction that it is given: it sees what that one wrote, and is gone with it', async () => {
    const id = await t.join(darkroomId, await t.person('Bo'), 'member');
    const undone = new Error('taken back');
    const inside = t.database.inDarkroom({ darkroomId }, async (tx) => {
      await tx.update(memberships).set({ displayName: 'Beau' }).where(eq(memberships.id, id));
      expect(await named(tx, { darkroomId, ids: [id, v7()] })).toEqual([
        { id, name: 'Beau', joinedAt: expect.any(Date) as Date },
      ]);
      throw undone;
    });
    await expect(inside).rejects.toBe(undone);
    const after = await t.database.inDarkroom({ darkroomId }, (tx) => named(tx, { darkroomId, ids: [id] }));
    expect(after.map(({ name }) => name)).toEqual(['Bo']);
  });

  it('sees only the darkroom that its transaction is in', async () => {
    const id = await t.join(darkroomId, await t.person('Cy'), 'member');
    const other = await t.darkroom('attic', await t.person('Di'));
    const found = t.database.inDarkroom({ darkroomId: other }, (tx) => named(tx, { darkroomId, ids: [id] }));
    expect(await found).toEqual([]);
  });

  it('is refused when a value is missing, and takes a list of none', async () => {
    await t.database.inDarkroom({ darkroomId }, async (tx) => {
      expect(await named(tx, { darkroomId, ids: [] })).toEqual([]);
      await expect(named(tx, { darkroomId })).rejects.toThrow('No value for placeholder "ids"');
    });
  });

  it('is several at once on several connections, each its own', async () => {
    const ids = await Promise.all(
      ['Ed', 'Fi', 'Gus', 'Hal'].map(async (name) => t.join(darkroomId, await t.person(name), 'member')),
    );
    const found = await Promise.all(
      ids.map((id) =>
        t.database.inDarkroom({ darkroomId }, async (tx) => {
          await tx
            .update(memberships)
            .set({ displayName: `new ${id}` })
            .where(eq(memberships.id, id));
          return named(tx, { darkroomId, ids: [id] });
        }),
      ),
    );
    expect(found.map(([row]) => row?.name)).toEqual(ids.map((id) => `new ${id}`));
  });
});
