import { rapidFixer } from '@wetside/chemistry';
import { bottleTotals, events, mails } from '@wetside/db';
import { startMailCatcher, type MailCatcher } from '@wetside/mail-catcher';
import { and, eq, isNull } from 'drizzle-orm';
import { v7 } from 'uuid';
import { touched } from '../../platform/ledger/void-handlers.js';
import { SendMailTask } from '../../platform/mail/send-mail.task.js';
import { makeBottle } from '../../testing/bottle-factory.js';
import { TestApp, type TestPerson } from '../../testing/test-app.js';
import { ProvisionService } from '../darkrooms/provision.service.js';
import { Sweeper } from './sweeper.js';
import { WarningsService } from './warnings.service.js';

/**
 * A bottle that keeps two months. `near` and `past` are worked out by hand: the first instant of the seventh day before
 * the last, and of the day after it, by the zone's rules in the IANA time zone database (published:
 * https://www.iana.org/time-zones; Santiago needs 2022f or later).
 */
const CASES = [
  {
    zone: 'Pacific/Kiritimati',
    mixed: '2026-12-28T02:00:00.000Z',
    near: '2027-02-20T10:00:00.000Z',
    past: '2027-02-28T10:00:00.000Z',
    last: '28 Feb',
  },
  {
    zone: 'Pacific/Pago_Pago',
    mixed: '2026-12-28T20:00:00.000Z',
    near: '2027-02-21T11:00:00.000Z',
    past: '2027-03-01T11:00:00.000Z',
    last: '28 Feb',
  },
  // Two months from 31 December end with February.
  {
    zone: 'America/St_Johns',
    mixed: '2026-12-31T15:00:00.000Z',
    near: '2027-02-21T03:30:00.000Z',
    past: '2027-03-01T03:30:00.000Z',
    last: '28 Feb',
  },
  {
    zone: 'Asia/Kathmandu',
    mixed: '2027-12-31T06:00:00.000Z',
    near: '2028-02-21T18:15:00.000Z',
    past: '2028-02-29T18:15:00.000Z',
    last: '29 Feb',
  },
  // The last day has 23 hours, and 25.
  {
    zone: 'Europe/Vienna',
    mixed: '2027-01-28T11:00:00.000Z',
    near: '2027-03-20T23:00:00.000Z',
    past: '2027-03-28T22:00:00.000Z',
    last: '28 Mar',
  },
  {
    zone: 'Europe/Vienna',
    mixed: '2027-08-31T10:00:00.000Z',
    near: '2027-10-23T22:00:00.000Z',
    past: '2027-10-31T23:00:00.000Z',
    last: '31 Oct',
  },
  // The day after the last has no midnight.
  {
    zone: 'Asia/Beirut',
    mixed: '2027-01-27T10:00:00.000Z',
    near: '2027-03-19T22:00:00.000Z',
    past: '2027-03-27T22:00:00.000Z',
    last: '27 Mar',
  },
  {
    zone: 'America/Santiago',
    mixed: '2027-07-04T16:00:00.000Z',
    near: '2027-08-28T04:00:00.000Z',
    past: '2027-09-05T04:00:00.000Z',
    last: '4 Sep',
  },
] as const;
type Case = (typeof CASES)[number];

const SECOND_MS = 1_000;
const earlier = (instant: string): string => new Date(Date.parse(instant) - SECOND_MS).toISOString();

interface Seen {
  open: string[];
  nextLookAt: string | null;
  /** Subjects of the mails that have arrived. */
  subjects: string[];
}

describe('dates in darkrooms of different zones, in one program', () => {
  let world: TestApp;
  let catcher: MailCatcher;
  let ada: TestPerson;
  const houses = new Map<Case, { darkroomId: string; code: string; bottleId: string }>();
  const seen = new Map<string, Seen>();

  /** The machine's time stands still, so that the second before midnight is that second for as long as it takes. */
  function moveTo(instant: string): void {
    world.clock.advance(Date.parse(instant) - world.clock.now().getTime());
  }

  function houseOf(one: Case) {
    const house = houses.get(one);
    if (!house) throw new Error(`${one.zone} has no darkroom`);
    return house;
  }

  async function open(one: Case, n: number): Promise<void> {
    const darkroomId = v7();
    const { personId, name } = ada;
    const order = { darkroomId, shortName: `house-${n}`, name: `House ${n}`, zone: one.zone };
    await world.database.inDarkroom({ darkroomId, personId }, (tx) =>
      world.app
        .get(ProvisionService)
        .provisionDarkroom(tx, { ...order, manager: { personId, displayName: name } }),
    );
    houses.set(one, { darkroomId, code: `FX-${n}`, bottleId: '' });
  }

  async function mix(one: Case): Promise<void> {
    const house = houseOf(one);
    const { darkroomId, code } = house;
    await world.database.inDarkroom({ darkroomId }, async (tx) => {
      const { memberships } = tx.query;
      const [manager] = await memberships.findMany({ where: (row) => eq(row.darkroomId, darkroomId) });
      const now = world.clock.now();
      const hand = { darkroomId, membershipId: manager?.id ?? '', zone: one.zone, now };
      const bottle = await makeBottle(tx, hand, { code, document: rapidFixer, volumeUl: 1_000_000 });
      const at = { darkroomId, zone: one.zone, now, cause: 'action' as const };
      await world.app.get(WarningsService).settle(tx, at, touched({ bottleIds: [bottle.id] }));
      house.bottleId = bottle.id;
    });
  }

  /** The sweep of a server, and every mail that then waits in that darkroom. */
  async function sweepAndSend(one: Case): Promise<void> {
    await world.app.get(Sweeper).runOnce();
    const { darkroomId } = houseOf(one);
    const waiting = await world.database.inDarkroom({ darkroomId }, (tx) =>
      tx
        .select({ id: mails.id })
        .from(mails)
        .where(and(eq(mails.darkroomId, darkroomId), eq(mails.state, 'waiting'))),
    );
    for (const { id } of waiting) await world.app.get(SendMailTask).run({ darkroomId, mailId: id });
  }

  async function look(one: Case): Promise<Seen> {
    const { darkroomId, code, bottleId } = houseOf(one);
    return world.database.inDarkroom({ darkroomId }, async (tx) => {
      const isOpen = and(eq(events.darkroomId, darkroomId), isNull(events.endedAt));
      const open = await tx.select({ kind: events.kind }).from(events).where(isOpen);
      const isIt = and(eq(bottleTotals.darkroomId, darkroomId), eq(bottleTotals.bottleId, bottleId));
      const [totals] = await tx.select().from(bottleTotals).where(isIt);
      return {
        open: open.map(({ kind }) => kind),
        nextLookAt: totals?.nextLookAt?.toISOString() ?? null,
        subjects: catcher.messages({ subject: `${code} ` }).map(({ subject }) => subject),
      };
    });
  }

  const key = (one: Case, moment: string): string => `${CASES.indexOf(one)} ${moment}`;
  const at = (one: Case, moment: string): Seen | undefined => seen.get(key(one, moment));

  /** All moments of all darkrooms in the order in which they come. */
  beforeAll(async () => {
    jest.spyOn(Date, 'now').mockReturnValue(Date.parse('2026-12-01T10:00:00.000Z'));
    catcher = await startMailCatcher({ smtpPort: 0, httpPort: 0 });
    const variables = { SMTP_URL: `smtp://127.0.0.1:${catcher.smtpPort}`, MAIL_GRACE_S: '0' };
    world = await TestApp.start(variables, [], { background: false });
    ada = await world.person('Ada');
    for (const [n, one] of CASES.entries()) await open(one, n + 1);
    const moments = CASES.flatMap((one) => [
      { one, moment: 'mixed', instant: one.mixed },
      { one, moment: 'before near', instant: earlier(one.near) },
      { one, moment: 'near', instant: one.near },
      { one, moment: 'before past', instant: earlier(one.past) },
      { one, moment: 'past', instant: one.past },
    ]);
    for (const { one, moment, instant } of moments.sort((a, b) => a.instant.localeCompare(b.instant))) {
      moveTo(instant);
      if (moment === 'mixed') await mix(one);
      await sweepAndSend(one);
      seen.set(key(one, moment), await look(one));
      // Nothing is left for a second sweep at the same moment.
      await sweepAndSend(one);
      expect(await look(one)).toEqual(seen.get(key(one, moment)));
    }
  }, 120_000);
  afterAll(async () => {
    await world.close();
    await catcher.close();
    jest.restoreAllMocks();
  });

  it.each(CASES)('$zone: near its date from $near, good to the last second of $last', (one) => {
    const { code } = houseOf(one);
    const told = `${code} fixer is near its date: it keeps to ${one.last}`;
    expect(at(one, 'mixed')).toEqual({ open: [], nextLookAt: one.near, subjects: [] });
    expect(at(one, 'before near')).toEqual({ open: [], nextLookAt: one.near, subjects: [] });
    const near = { open: ['near-date'], nextLookAt: one.past, subjects: [told] };
    expect(at(one, 'near')).toEqual(near);
    expect(at(one, 'before past')).toEqual(near);
  });

  it.each(CASES)('$zone: past its date at $past, told once, with the local date', (one) => {
    const { code } = houseOf(one);
    expect(at(one, 'past')).toEqual({
      open: ['past-date'],
      nextLookAt: null,
      subjects: [
        `${code} fixer is near its date: it keeps to ${one.last}`,
        `${code} fixer is past its date since ${one.last}`,
      ],
    });
  });

  it('shows three dates at one instant: today, and in the log', async () => {
    moveTo('2028-06-01T10:30:00.000Z');
    const browser = await world.signedIn(ada);
    const dates = await Promise.all(
      [0, 4, 1].map(async (n) => {
        const { darkroomId, bottleId } = houseOf(CASES[n] ?? CASES[0]);
        const url = `/api/darkrooms/${darkroomId}`;
        const now = world.clock.nowIso();
        const content = { v: 1, happenedAt: now, bottleId, reason: 'cloudy' };
        const envelope = { sentAt: now, deviceNow: now, queued: false };
        await browser.put(`${url}/holds/${v7()}`).send({ content, envelope }).expect(201);
        const bottles = await browser.get(`${url}/bottles`).expect(200);
        const log = await browser.get(`${url}/log`).expect(200);
        return [String(bottles.body.today), String(log.body.entries[0].action.happenedOn)];
      }),
    );
    // At 00:30 in Kiritimati, at 12:30 in Vienna, at 23:30 in Pago Pago.
    expect(dates).toEqual([
      ['2028-06-02', '2028-06-02'],
      ['2028-06-01', '2028-06-01'],
      ['2028-05-31', '2028-05-31'],
    ]);
  });
});
