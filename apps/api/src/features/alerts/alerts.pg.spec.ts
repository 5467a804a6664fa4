import { rapidFixer, stopBathSb5, type ChemistryDocument } from '@wetside/chemistry';
import { events, mails, notices } from '@wetside/db';
import { startMailCatcher, type MailCatcher } from '@wetside/mail-catcher';
import { asc, eq } from 'drizzle-orm';
import { touched, type Touched } from '../../platform/ledger/void-handlers.js';
import { TestApp } from '../../testing/test-app.js';
import type { Tx } from '../../platform/database/database.js';
import {
  makeBottle,
  makeHold,
  makeLoad,
  makeVoid,
  type Hand,
  type MadeBottle,
} from '../../testing/bottle-factory.js';
import { until } from '../../testing/until.js';
import type { Cause } from './crossing.js';
import { Sweeper } from './sweeper.js';
import { WarningsService } from './warnings.service.js';

const DAY = 86_400_000;
/** A litre of rapid fixer 1+4: 20 rolls (packages/chemistry, capacity-faq, second-hand), so low from 4 left. */
const LITRE = 1_000_000;

describe('warnings', () => {
  let test: TestApp;
  let catcher: MailCatcher;
  let darkroomId: string;
  let membershipId: string;
  let numbers = 0;

  async function start(graceS: number): Promise<void> {
    catcher = await startMailCatcher({ smtpPort: 0, httpPort: 0 });
    const variables = {
      SMTP_URL: `smtp://127.0.0.1:${catcher.smtpPort}`,
      MAIL_GRACE_S: String(graceS),
      MAIL_BACKOFF_S: '0',
      SWEEP_S: '86400',
    };
    test = await TestApp.start(variables);
    const ada = await test.person('Ada');
    darkroomId = await test.darkroom('cellar', ada);
    await test.join(darkroomId, await test.person('Tomas'), 'technician');
    membershipId = await test.join(darkroomId, await test.person('Ines'), 'member');
  }

  afterEach(async () => {
    await test.close();
    await catcher.close();
  });

  const hand = (): Hand => ({ darkroomId, membershipId, zone: 'Europe/Vienna', now: test.clock.now() });
  const inDarkroom = <T>(work: (tx: Tx) => Promise<T>) => test.database.inDarkroom({ darkroomId }, work);

  function settle(tx: Tx, moved: Partial<Touched>, cause: Cause = 'action'): Promise<void> {
    const at = { darkroomId, zone: 'Europe/Vienna', now: test.clock.now(), cause };
    return test.app.get(WarningsService).settle(tx, at, touched(moved));
  }

  const bottle = (document: ChemistryDocument = rapidFixer): Promise<MadeBottle> =>
    inDarkroom(async (tx) => {
      const code = `FX-${(numbers += 1)}`;
      const made = await makeBottle(tx, hand(), { code, document, volumeUl: LITRE });
      await settle(tx, { bottleIds: [made.id] });
      return made;
    });

  const load = (made: MadeBottle, rolls: number): Promise<string> =>
    inDarkroom(async (tx) => {
      const id = await makeLoad(tx, hand(), made, rolls);
      await settle(tx, { bottleIds: [made.id], loadActionIds: [id] });
      return id;
    });

  const takeBack = (made: MadeBottle, actionId: string): Promise<void> =>
    inDarkroom(async (tx) => {
      await makeVoid(tx, hand(), made, actionId);
      await settle(tx, { bottleIds: [made.id], loadActionIds: [actionId] }, 'retraction');
    });

  const hold = (made: MadeBottle, change: 'hold' | 'release'): Promise<string> =>
    inDarkroom(async (tx) => {
      const id = await makeHold(tx, hand(), made, change, 'cloudy');
      await settle(tx, { bottleIds: [made.id] });
      return id;
    });

  const allMails = () =>
    inDarkroom((tx) =>
      tx.select().from(mails).where(eq(mails.darkroomId, darkroomId)).orderBy(asc(mails.id)),
    );
  const allEvents = () =>
    inDarkroom((tx) =>
      tx.select().from(events).where(eq(events.darkroomId, darkroomId)).orderBy(asc(events.id)),
    );
  const states = async () => (await allMails()).map(({ state }) => state);
  const caught = (part: string) => catcher.messages().filter(({ subject }) => subject.includes(part));
  const allIn = (state: string, count: number) =>
    until(async () => (await states()).filter((one) => one === state).length === count);
  const sweep = () => test.app.get(Sweeper).runOnce();

  it('says once that a bottle runs low, to each technician and manager', async () => {
    await start(0);
    const fixer = await bottle();
    await load(fixer, 15);
    expect(await allEvents()).toEqual([]);
    await load(fixer, 1);
    await allIn('sent', 2);
    await load(fixer, 1);

    expect(await allEvents()).toMatchObject([{ kind: 'low', crossing: 1, endedAt: null }]);
    expect(
      catcher
        .messages()
        .map(({ to }) => to.join())
        .sort(),
    ).toEqual(['ada@darkroom.example', 'tomas@darkroom.example']);
    const [mail] = catcher.messages();
    expect(mail).toMatchObject({ subject: `${fixer.code} fixer is running low: 4 rolls left`, html: null });
    expect(mail?.text).toContain('20 rolls rated, 16 used');
    expect(mail?.text).toContain(`http://localhost:55500/d/cellar/bottles/${fixer.code}`);
    expect(mail?.headers['auto-submitted']).toBe('auto-generated');
    expect(mail?.messageId).toBe(
      (await allMails()).find(({ toAddress }) => toAddress === mail?.to[0])?.messageId,
    );
    expect(await inDarkroom((tx) => tx.select().from(notices))).toHaveLength(2);
  });

  it('withdraws the mail when the load is taken back in time, and sends it after all when it comes again', async () => {
    await start(60);
    const fixer = await bottle();
    const sixteenth = await load(fixer, 16);
    expect(await states()).toEqual(['waiting', 'waiting']);
    await takeBack(fixer, sixteenth);
    expect(await states()).toEqual(['withdrawn', 'withdrawn']);
    expect(await allEvents()).toMatchObject([{ kind: 'low', endedBy: 'retraction' }]);

    await load(fixer, 17);
    expect(await allEvents()).toMatchObject([{ kind: 'low', crossing: 1, endedAt: null }]);
    expect(await states()).toEqual(['waiting', 'waiting']);
    test.clock.advance(61_000);
    await sweep();
    await allIn('sent', 2);
    expect(caught('3 rolls left')).toHaveLength(2);
    expect(catcher.messages()).toHaveLength(2);
  });

  it('says nothing twice of a crossing that was only taken back, and speaks again of a new one', async () => {
    await start(0);
    const fixer = await bottle();
    const held = await hold(fixer, 'hold');
    await allIn('sent', 2);
    await takeBack(fixer, held);
    await hold(fixer, 'hold');
    expect(await allEvents()).toMatchObject([{ kind: 'on-hold', crossing: 1, endedAt: null }]);
    expect(await states()).toEqual(['sent', 'sent']);

    await hold(fixer, 'release');
    await hold(fixer, 'hold');
    expect(await allEvents()).toMatchObject([
      { crossing: 1, endedBy: 'action' },
      { crossing: 2, endedAt: null },
    ]);
    await allIn('sent', 4);
    expect(catcher.messages()).toHaveLength(4);
  });

  it('says only the gravest: a mail about less that waits is withdrawn, and sent when the graver is over', async () => {
    await start(60);
    const fixer = await bottle();
    await load(fixer, 17);
    const last = await load(fixer, 3);
    const subjects = async (state: string) =>
      (await allMails()).filter((one) => one.state === state).map(({ subject }) => subject);
    expect(await subjects('waiting')).toEqual(
      Array(2).fill(`${fixer.code} fixer is spent: 20 of 20 rolls used`),
    );
    expect(await subjects('withdrawn')).toHaveLength(2);
    await takeBack(fixer, last);
    expect(await subjects('waiting')).toEqual(
      Array(2).fill(`${fixer.code} fixer is running low: 3 rolls left`),
    );
    expect(await allEvents()).toMatchObject([
      { kind: 'low', endedAt: null },
      { kind: 'spent', endedBy: 'retraction' },
    ]);
  });

  it('shows what is cheap to renew and never mails it', async () => {
    await start(0);
    const stop = await bottle(stopBathSb5);
    await hold(stop, 'hold');
    expect(await allEvents()).toMatchObject([{ kind: 'on-hold', endedAt: null }]);
    expect(await allMails()).toEqual([]);
  });

  it('keeps trying while the mail server refuses, and delivers each mail once', async () => {
    await start(0);
    catcher.setBehaviour({ mode: 'refuse', times: 3 });
    await hold(await bottle(), 'hold');
    await allIn('sent', 2);
    expect(catcher.behaviour()).toMatchObject({ refused: 3, accepted: 2 });
    expect(catcher.messages()).toHaveLength(2);
    const tries = (await allMails()).map(({ attempts }) => attempts);
    expect(tries.reduce((sum, one) => sum + one, 0)).toBe(5);
  });

  it('finds by time alone that a bottle is near its date, then past it', async () => {
    await start(0);
    const fixer = await bottle();
    await sweep();
    expect(await allEvents()).toEqual([]);

    // It keeps two months, 59 to 62 days.
    test.clock.advance(56 * DAY);
    await sweep();
    await allIn('sent', 2);
    expect(await allEvents()).toMatchObject([{ kind: 'near-date', endedAt: null }]);

    await sweep();
    test.clock.advance(9 * DAY);
    await sweep();
    await allIn('sent', 4);
    expect(await allEvents()).toMatchObject([
      { kind: 'near-date', endedBy: 'time' },
      { kind: 'past-date', endedAt: null },
    ]);
    expect(caught(`${fixer.code} fixer is near its date`)).toHaveLength(2);
    expect(caught(`${fixer.code} fixer is past its date since`)).toHaveLength(2);
  });

  it('takes up a mail whose sender died, under the same Message-ID', async () => {
    await start(60);
    await hold(await bottle(), 'hold');
    const gone = { state: 'leased' as const, leaseUntil: test.clock.now(), leaseId: darkroomId, attempts: 1 };
    await inDarkroom((tx) => tx.update(mails).set(gone).where(eq(mails.darkroomId, darkroomId)));
    test.clock.advance(61_000);
    await sweep();
    await allIn('sent', 2);
    expect(
      catcher
        .messages()
        .map(({ messageId }) => messageId)
        .sort(),
    ).toEqual((await allMails()).map((one) => one.messageId).sort());
  });

  it('asks a technician about a load that went where it should not, until it is taken back', async () => {
    await start(0);
    const fixer = await bottle();
    const id = await inDarkroom(async (tx) => {
      const made = await makeLoad(tx, hand(), fixer, 2, ['past_date', 'over_capacity']);
      await settle(tx, { bottleIds: [fixer.id], loadActionIds: [made] });
      return made;
    });
    await allIn('sent', 2);
    expect(caught(`A load went through ${fixer.code} after its date`)).toHaveLength(2);
    await takeBack(fixer, id);
    expect(await allEvents()).toMatchObject([{ kind: 'load-to-decide', endedBy: 'retraction' }]);
  });

  it('lists under Needs you what is open, bottles that nobody should load first', async () => {
    await start(0);
    const [low, held] = [await bottle(), await bottle()];
    await load(low, 16);
    await load(held, 17);
    await hold(held, 'hold');
    await allIn('sent', 6);
    const browser = await test.signedIn({ personId: '', email: 'tomas@darkroom.example', name: 'Tomas' });
    const answer = await browser.get('/api/darkrooms/cellar/needs-you').expect(200);
    expect((answer.body as { open: unknown }).open).toMatchObject([
      {
        kind: 'on-hold',
        also: 'low',
        verb: 'release',
        mailedTo: 2,
        bottle: { code: held.code },
        sentence: `${held.code} fixer is on hold by Ines: cloudy`,
      },
      {
        kind: 'low',
        verb: 'mix',
        mailedTo: 2,
        crossing: 1,
        why: expect.stringContaining('Mailed to 2') as string,
      },
    ]);
    const member = await test.signedIn({ personId: '', email: 'ines@darkroom.example', name: 'Ines' });
    await member.get('/api/darkrooms/cellar/needs-you').expect(403);
  });
});
