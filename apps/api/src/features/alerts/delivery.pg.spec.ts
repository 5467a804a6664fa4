import { rapidFixer } from '@wetside/chemistry';
import { events, mails, memberships } from '@wetside/db';
import { startMailCatcher, type MailCatcher } from '@wetside/mail-catcher';
import { eq } from 'drizzle-orm';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { readEnvironment } from '../../config/environment.js';
import { createApp, startUp } from '../../create-app.js';
import { Clock } from '../../platform/clock/clock.js';
import { touched } from '../../platform/ledger/void-handlers.js';
import { OutgoingMail } from '../../platform/mail/outgoing-mail.service.js';
import { SendMailTask } from '../../platform/mail/send-mail.task.js';
import { ORIGIN, TestApp } from '../../testing/test-app.js';
import { makeBottle, makeHold } from '../../testing/bottle-factory.js';
import { until } from '../../testing/until.js';
import { Sweeper } from './sweeper.js';
import { WarningsService } from './warnings.service.js';

describe('the delivery of mail', () => {
  let test: TestApp;
  let catcher: MailCatcher;
  let darkroomId: string;
  let membershipId: string;
  let given: Record<string, string>;
  let second: NestExpressApplication | null = null;

  async function start(
    variables: Record<string, string>,
    { backoffS = 0, deadlineS = 40 } = {},
  ): Promise<void> {
    catcher = await startMailCatcher({ smtpPort: 0, httpPort: 0 });
    given = {
      SMTP_URL: `smtp://127.0.0.1:${catcher.smtpPort}`,
      SWEEP_S: '86400',
      MAIL_BACKOFF_S: String(backoffS),
      MAIL_DEADLINE_S: String(deadlineS),
      ...variables,
    };
    test = await TestApp.start(given);
    darkroomId = await test.darkroom('cellar', await test.person('Ada'));
    membershipId = await test.join(darkroomId, await test.person('Tomas'), 'technician');
  }

  afterEach(async () => {
    await second?.close();
    second = null;
    await test.close();
    await catcher.close();
  });

  /** Another server on the same database. */
  async function startSecond(): Promise<void> {
    const environment = readEnvironment({
      MODE: 'test',
      PUBLIC_ORIGIN: ORIGIN,
      DATABASE_URL: test.db.appUrl,
      DATABASE_JOBS_URL: test.db.jobsUrl,
      SESSION_SECRET: 'a secret that is only ever used in tests',
      ...given,
    });
    second = await createApp(environment);
    await startUp(second);
  }

  const servers = () => (second ? [test.app, second] : [test.app]);
  const advance = (ms: number) => servers().forEach((server) => server.get(Clock).advance(ms));
  const sweepBoth = () => Promise.all(servers().map((server) => server.get(Sweeper).runOnce()));
  const zone = 'Europe/Vienna';

  /** A hold on each of so many bottles: two mails each. */
  const holdBottles = (count: number): Promise<void> =>
    test.database.inDarkroom({ darkroomId }, async (tx) => {
      const now = test.clock.now();
      const hand = { darkroomId, membershipId, zone, now };
      for (let n = 1; n <= count; n += 1) {
        const bottle = await makeBottle(tx, hand, {
          code: `FX-${n}`,
          document: rapidFixer,
          volumeUl: 1_000_000,
        });
        await makeHold(tx, hand, bottle, 'hold', 'smells wrong');
        const at = { darkroomId, zone, now, cause: 'action' as const };
        await test.app.get(WarningsService).settle(tx, at, touched({ bottleIds: [bottle.id] }));
      }
    });

  const rows = () =>
    test.database.inDarkroom({ darkroomId }, (tx) =>
      tx.select().from(mails).where(eq(mails.darkroomId, darkroomId)),
    );
  const allSent = (count: number) =>
    until(async () => (await rows()).filter(({ state }) => state === 'sent').length === count);

  it('is once, with two servers on one database that both sweep and both work the queue', async () => {
    await start({ MAIL_GRACE_S: '60' });
    await startSecond();
    await holdBottles(5);
    advance(120_000);
    await sweepBoth();
    // The queue's own "look at this mail" a second time, from both.
    const keys = (await rows()).map(({ id }) => ({ darkroomId, mailId: id }));
    const tasks = servers().map((server) => server.get(SendMailTask));
    await Promise.all(keys.flatMap((key) => tasks.map((task) => task.run(key))));
    await allSent(10);
    expect((await rows()).map(({ attempts }) => attempts)).toEqual(Array(10).fill(1));
    expect(catcher.messages()).toHaveLength(10);
    expect(new Set(catcher.messages().map(({ messageId }) => messageId)).size).toBe(10);
  });

  it('is once for a date that two servers see pass', async () => {
    await start({ MAIL_GRACE_S: '0' });
    await startSecond();
    await holdBottles(3);
    await allSent(6);
    advance(70 * 86_400_000);
    await sweepBoth();
    await allSent(12);
    const found = await test.database.inDarkroom({ darkroomId }, (tx) =>
      tx.select({ kind: events.kind }).from(events),
    );
    expect(found.filter(({ kind }) => kind === 'past-date')).toHaveLength(3);
    expect(catcher.messages()).toHaveLength(12);
  });

  it('ends a conversation that does not come to its end, and tries again', async () => {
    await start({ MAIL_GRACE_S: '0' }, { deadlineS: 2 });
    catcher.setBehaviour({ mode: 'hang', times: 1 });
    await holdBottles(1);
    await allSent(2);
    expect(catcher.messages()).toHaveLength(2);
    expect((await rows()).map(({ attempts }) => attempts).sort()).toEqual([1, 2]);
  });

  it('goes once more under the same Message-ID when the answer to the end was lost', async () => {
    await start({ MAIL_GRACE_S: '0' });
    catcher.setBehaviour({ mode: 'drop-after-end', times: 1 });
    await holdBottles(1);
    await allSent(2);
    expect(catcher.messages()).toHaveLength(3);
    expect(new Set(catcher.messages().map(({ messageId }) => messageId)).size).toBe(2);
    expect((await rows()).map(({ unclearTries }) => unclearTries).sort()).toEqual([0, 1]);
    const browser = await test.signedIn({ personId: '', email: 'ada@darkroom.example', name: 'Ada' });
    const { body } = await browser.get('/api/darkrooms/cellar/needs-you').expect(200);
    expect(body.open[0].why).toContain('Mailed to 2. 1 mail may have arrived twice');
  });

  it('loses nothing while the mail server is away', async () => {
    await start({ MAIL_GRACE_S: '0' }, { backoffS: 30 });
    const port = catcher.smtpPort;
    await catcher.close();
    await holdBottles(1);
    await until(async () => (await rows()).every(({ lastAnswer }) => lastAnswer?.includes('ECONNREFUSED')));
    expect(await rows()).toMatchObject(Array(2).fill({ state: 'waiting', attempts: 1 }));
    catcher = await startMailCatcher({ smtpPort: port, httpPort: 0 });
    test.clock.advance(31_000);
    await test.app.get(Sweeper).runOnce();
    await allSent(2);
    expect(catcher.messages()).toHaveLength(2);
  });

  it('is given up after twelve tries, and says what the mail server said', async () => {
    await start({ MAIL_GRACE_S: '0' });
    catcher.setBehaviour({ mode: 'refuse' });
    await holdBottles(1);
    await until(async () => (await rows()).every(({ state }) => state === 'failed'));
    expect(await rows()).toMatchObject(
      Array(2).fill({ attempts: 12, lastAnswer: expect.stringContaining('451') as string }),
    );
  });

  it('does not reach somebody who has left meanwhile', async () => {
    await start({ MAIL_GRACE_S: '60' });
    await holdBottles(1);
    await test.database.inDarkroom({ darkroomId }, (tx) =>
      tx.update(memberships).set({ leftAt: test.clock.now() }).where(eq(memberships.id, membershipId)),
    );
    test.clock.advance(61_000);
    await test.app.get(Sweeper).runOnce();
    await allSent(1);
    await until(async () => (await rows()).some(({ state }) => state === 'withdrawn'));
    expect(catcher.messages().map(({ to }) => to.join())).toEqual(['ada@darkroom.example']);
  });

  it('is posted once under one key, goes at once, and answers to the sender', async () => {
    await start({ MAIL_GRACE_S: '60' });
    const dueAt = test.clock.now();
    const order = {
      darkroomId,
      kind: 'order' as const,
      toAddress: 'orders@supplier.example',
      replyTo: 'ada@darkroom.example',
      subject: 'Order 0007',
      body: 'Two concentrates.',
      dedupeKey: 'order:7',
      dueAt,
    };
    const post = () =>
      test.database.inDarkroom({ darkroomId }, (tx) => test.app.get(OutgoingMail).post(tx, order));
    await post();
    await post();
    await allSent(1);
    const [mail] = catcher.messages();
    expect(mail).toMatchObject({
      to: ['orders@supplier.example'],
      subject: 'Order 0007',
      text: expect.stringContaining('Two concentrates.') as string,
    });
    expect(mail?.headers['reply-to']).toContain('ada@darkroom.example');
  });
});
