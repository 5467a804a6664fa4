import { mails } from '@wetside/db';
import { and, eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import { TestApp } from '../../testing/test-app.js';
import { until } from '../../testing/until.js';
import type { Tx } from '../database/database.js';
import { problem } from '../errors/problem.js';
import { MailingServer } from './killed-server.fixture.js';
import { MailsRepository, type MailKey, type MailRow } from './mails.repository.js';
import { OutgoingMail, type NewMail } from './outgoing-mail.service.js';
import { MailCase } from './sender.fixture.js';

/** Longer than a lease of a minute. */
const LEASE_OVER_S = 61;
const HOUR_MS = 3_600_000;

/** Takes a mail whoever has it in hand. */
class NoLeaseCheck extends MailsRepository {
  override async takeDue(tx: Tx, { darkroomId, mailId }: MailKey): Promise<MailRow | null> {
    const isIt = and(eq(mails.darkroomId, darkroomId), eq(mails.id, mailId));
    const [row] = await tx.select().from(mails).where(isIt).for('update');
    return row ?? null;
  }
}

/** Takes a dead lease over as if nobody had held it. */
class NoCount extends MailsRepository {
  override async lease(tx: Tx, key: MailKey, lease: { leaseId: string; leaseUntil: Date }): Promise<void> {
    await super.lease(tx, key, lease);
    const isIt = and(eq(mails.darkroomId, key.darkroomId), eq(mails.id, key.mailId));
    await tx.update(mails).set({ unclearTries: 0 }).where(isIt);
  }
}

/** Marks whatever comes, whoever holds the lease. */
class NoLeaseAtMark extends MailsRepository {
  override async settle(
    tx: Tx,
    { darkroomId, mailId }: MailKey,
    _leaseId: string,
    { state, dueAt }: Parameters<MailsRepository['settle']>[3],
  ): Promise<boolean> {
    const isIt = and(eq(mails.darkroomId, darkroomId), eq(mails.id, mailId));
    const due = dueAt ? { dueAt } : {};
    await tx
      .update(mails)
      .set({ ...(state ? { state } : {}), ...due, leaseId: null, leaseUntil: null })
      .where(isIt);
    return true;
  }
}

/** Leaves a mail that is leased alone, however long ago that was. */
class NoTakeover extends MailsRepository {
  override async takeDue(tx: Tx, key: MailKey, now: Date): Promise<MailRow | null> {
    const row = await super.takeDue(tx, key, now);
    return row?.state === 'waiting' ? row : null;
  }
}

/** Its database has no place the first times that a mail is to be marked. */
class BusyAtMark extends MailsRepository {
  times = 2;
  override settle(...args: Parameters<MailsRepository['settle']>): Promise<boolean> {
    this.times -= 1;
    return this.times >= 0 ? Promise.reject(problem('busy')) : super.settle(...args);
  }
}

describe('a mail that changes hands', () => {
  let world: TestApp;
  let darkroomId: string;
  const cases: MailCase[] = [];
  const servers: MailingServer[] = [];

  beforeAll(async () => {
    world = await TestApp.start({ MAIL_BACKOFF_S: '30' }, [], { background: false });
    darkroomId = await world.darkroom('cellar', await world.person('Ada'));
  });
  afterAll(async () => {
    await Promise.all(servers.map((server) => server.stop()));
    await Promise.all(cases.map(({ smtp }) => smtp.close()));
    await world.close();
  });

  async function post(options: Parameters<typeof MailCase.post>[2] = {}): Promise<MailCase> {
    const mail = await MailCase.post(world, darkroomId, options);
    cases.push(mail);
    return mail;
  }
  it('does not, while its sender lives and only the database was busy: the mark is made a little later', async () => {
    const mail = await post();
    const busy = new BusyAtMark();
    await mail.run(mail.sender(0, busy));
    expect(busy.times).toBe(-1);
    expect(await mail.row()).toMatchObject({ state: 'sent', attempts: 1, unclearTries: 0 });
  });

  describe('because the server that had it was killed', () => {
    let greeting: MailCase;
    let end: MailCase;
    let later: MailCase;
    let afterKill: MailRow[];

    /** One server has all three in hand when it dies; the next finds them by its own sweep. */
    beforeAll(async () => {
      later = await post({ inMs: HOUR_MS });
      const { smtp } = later;
      smtp.setFault({ stage: 'greeting', how: 'hang' });
      greeting = await post({ smtp });
      const first = start(later);
      await smtp.standing(1);
      smtp.setFault({ stage: 'end', how: 'hang' });
      end = await post({ smtp });
      await smtp.standing(2);
      await first.kill();
      smtp.setFault(null);
      // While their leases live nobody else takes them.
      for (const mail of [greeting, end]) await mail.run(mail.sender());
      afterKill = await Promise.all([greeting, end, later].map((mail) => mail.row()));
      const next = start(later, { CLOCK_OFFSET: 'PT2H' });
      await Promise.all([greeting, end, later].map(isSent));
      await next.stop();
    }, 120_000);

    function start(mail: MailCase, variables: Record<string, string> = {}): MailingServer {
      const server = MailingServer.start(world.db, { SMTP_URL: mail.url, ...variables });
      servers.push(server);
      return server;
    }
    const isSent = (mail: MailCase) => until(async () => (await mail.row()).state === 'sent');

    it('leaves what it had as it was', () => {
      expect(afterKill).toMatchObject([
        { state: 'leased', attempts: 1, unclearTries: 0 },
        { state: 'leased', attempts: 1, unclearTries: 0 },
        { state: 'waiting', attempts: 0, unclearTries: 0 },
      ]);
    });

    it.each([
      { at: 'before it took the mail', mail: () => later, tries: 1, arrives: 1, unclear: 0 },
      { at: 'at the greeting, the mail leased', mail: () => greeting, tries: 2, arrives: 1, unclear: 1 },
      { at: 'after the whole mail, before its mark', mail: () => end, tries: 2, arrives: 2, unclear: 1 },
    ])(
      'fault: the server is killed $at; tries $tries, arrives $arrives, unclear $unclear',
      async ({ mail, tries, arrives, unclear }) => {
        const row = await mail().row();
        expect(row).toMatchObject({ attempts: tries, unclearTries: unclear });
        const own = mail()
          .arrivedIds()
          .filter((id) => id === row.messageId);
        expect(own).toHaveLength(arrives);
        expect(mail().arrivedIds()).toHaveLength(4);
      },
    );
  });

  /** The first still waits for its answer when its lease runs out and a second takes over; then the first's comes. */
  async function overtake(
    mail: MailCase,
    repository?: MailsRepository,
    end: 'answer' | 'cut' = 'answer',
  ): Promise<void> {
    mail.smtp.setFault({ stage: 'end', how: 'hang' });
    const first = mail.run(mail.sender(0, repository));
    await mail.smtp.standing();
    mail.smtp.setFault(null);
    await mail.run(mail.sender(LEASE_OVER_S, repository));
    mail.smtp.release(end);
    await first;
  }

  it('fault: the lease runs out while its holder still sends; tries 2, arrives 2, unclear 1', async () => {
    const mail = await post();
    await overtake(mail);
    const row = await mail.row();
    expect(row).toMatchObject({ state: 'sent', attempts: 2, unclearTries: 1 });
    expect(mail.arrivedIds()).toEqual([row.messageId, row.messageId]);
  });

  it('fault: the lease runs out, and then its holder’s connection is cut; tries 2, arrives 2, unclear 1', async () => {
    const mail = await post();
    await overtake(mail, undefined, 'cut');
    expect(await mail.row()).toMatchObject({ state: 'sent', attempts: 2, unclearTries: 1 });
    expect(mail.arrivedIds()).toHaveLength(2);
  });

  it('fault: four senders at once; tries 1, arrives 1, unclear 0', async () => {
    const mail = await post();
    const senders = [0, 0, 0, 0].map(() => mail.sender());
    await Promise.all(senders.map((sender) => mail.run(sender)));
    expect(await mail.row()).toMatchObject({ state: 'sent', attempts: 1, unclearTries: 0 });
    expect(mail.arrivedIds()).toHaveLength(1);
  });

  describe('without what guards it', () => {
    it('mutant: without the check of the lease a second mail goes out while the first is under way', async () => {
      const mail = await post();
      mail.smtp.setFault({ stage: 'end', how: 'hang' });
      const first = mail.run(mail.sender());
      await mail.smtp.standing();
      mail.smtp.setFault(null);
      await mail.run(mail.sender());
      expect(mail.arrivedIds()).toHaveLength(1);
      await mail.run(mail.sender(0, new NoLeaseCheck()));
      expect(mail.arrivedIds()).toHaveLength(2);
      mail.smtp.release();
      await first;
    });

    it('mutant: without the lease at the mark what was sent goes back to waiting', async () => {
      const mail = await post();
      await overtake(mail, new NoLeaseAtMark(), 'cut');
      expect(await mail.row()).toMatchObject({ state: 'waiting' });
    });

    it('mutant: without the count at a takeover a second delivery is not told', async () => {
      const mail = await post();
      await overtake(mail, new NoCount());
      expect(mail.arrivedIds()).toHaveLength(2);
      expect(await mail.row()).toMatchObject({ state: 'sent', unclearTries: 0 });
    });

    /** The same mail handed in twice. @returns how many rows came of it */
    async function postTwice(change: (mail: NewMail) => NewMail): Promise<number> {
      const toAddress = `${v7()}@quayside.example`;
      const letter: NewMail = {
        darkroomId,
        kind: 'order',
        toAddress,
        subject: 'Order 0002',
        body: 'One kit.',
        dedupeKey: v7(),
        dueAt: new Date(world.clock.now().getTime() + 100 * HOUR_MS),
      };
      return world.database.inDarkroom({ darkroomId }, async (tx) => {
        const outgoing = world.app.get(OutgoingMail);
        await outgoing.post(tx, change(letter));
        await outgoing.post(tx, change(letter));
        return tx.$count(mails, and(eq(mails.darkroomId, darkroomId), eq(mails.toAddress, toAddress)));
      });
    }

    it('mutant: without the dedupe key the same mail is posted twice', async () => {
      expect(await postTwice((mail) => mail)).toBe(1);
      expect(await postTwice((mail) => ({ ...mail, dedupeKey: v7() }))).toBe(2);
    });

    it('mutant: without the takeover of dead leases what a killed server had is never sent', async () => {
      const mail = await post();
      const gone = { state: 'leased' as const, leaseUntil: world.clock.now(), leaseId: v7(), attempts: 1 };
      const isIt = eq(mails.id, mail.key.mailId);
      await world.database.inDarkroom({ darkroomId }, (tx) => tx.update(mails).set(gone).where(isIt));
      await mail.run(mail.sender(LEASE_OVER_S, new NoTakeover()));
      expect(await mail.row()).toMatchObject({ state: 'leased', attempts: 1 });
      await mail.run(mail.sender(LEASE_OVER_S));
      expect(await mail.row()).toMatchObject({ state: 'sent', attempts: 2, unclearTries: 1 });
    });
  });
});
