import { mails } from '@wetside/db';
import { and, eq } from 'drizzle-orm';
import { TestApp } from '../../testing/test-app.js';
import { OutgoingMail } from './outgoing-mail.service.js';

const HOUR_MS = 3_600_000;

describe('a mail that waits', () => {
  let world: TestApp;
  let darkroomId: string;

  beforeAll(async () => {
    world = await TestApp.start();
    darkroomId = await world.darkroom('riverside', await world.person('Ada'));
  });
  afterAll(() => world.close());

  const post = (dedupeKey: string) =>
    world.database.inDarkroom({ darkroomId }, (tx) =>
      world.app.get(OutgoingMail).post(tx, {
        darkroomId,
        kind: 'order',
        toAddress: 'orders@quayside.example',
        subject: 'Order 0001',
        body: '2 × rapid fixer',
        dedupeKey,
        dueAt: new Date(world.clock.now().getTime() + HOUR_MS),
      }),
    );
  const withdraw = (dedupeKey: string) =>
    world.database.inDarkroom({ darkroomId }, (tx) =>
      world.app.get(OutgoingMail).withdraw(tx, darkroomId, dedupeKey, 'the order was cancelled'),
    );
  const isIt = (dedupeKey: string) => and(eq(mails.darkroomId, darkroomId), eq(mails.dedupeKey, dedupeKey));

  it('is taken back while nobody has tried to send it, once', async () => {
    await post('order:1');
    expect(await withdraw('order:1')).toBe('unheard');
    expect(await withdraw('order:1')).toBeNull();
    const [row] = await world.database.inDarkroom({ darkroomId }, (tx) =>
      tx.select().from(mails).where(isIt('order:1')),
    );
    expect(row).toMatchObject({ state: 'withdrawn', withdrawnBecause: 'the order was cancelled' });
  });

  it('says so when it was tried: it may have arrived', async () => {
    await post('order:2');
    await world.database.inDarkroom({ darkroomId }, (tx) =>
      tx.update(mails).set({ attempts: 1 }).where(isIt('order:2')),
    );
    expect(await withdraw('order:2')).toBe('tried');
  });
});
