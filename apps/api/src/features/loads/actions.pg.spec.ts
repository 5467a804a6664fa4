import { v7 } from 'uuid';
import { DAY, HOUR, LedgerHouse, MINUTE } from '../../testing/ledger-house.js';
import { TestApp, type Browser } from '../../testing/test-app.js';
import { reconcile } from '../../cli/reconcile/reconcile.js';
import type { LoadAnswer } from './load.view.js';

let t: TestApp;
let house: LedgerHouse;
let technician: Browser;
let member: Browser;
let other: Browser;

beforeAll(async () => {
  t = await TestApp.start({ SWEEP_S: '3600' });
  house = await LedgerHouse.open(t, 'ledger');
  technician = await t.signedIn(house.people.technician);
  member = await t.signedIn(house.people.member);
  other = await t.signedIn(house.people.other);
}, 60_000);

afterEach(async () => {
  expect((await reconcile(t.db.adminUrl, t.clock.now())).differences).toEqual([]);
});

afterAll(() => t?.close());

const ago = (ms: number): Date => new Date(t.clock.now().getTime() - ms);
const ahead = (ms: number): Date => ago(-ms);
const loadFrom = (answer: { body: unknown }): LoadAnswer => answer.body as LoadAnswer;

describe('an action sent again', () => {
  it('with the same content is answered 200 with the row as it is now', async () => {
    const { bottleId } = await house.mix(technician);
    const id = v7();
    const body = house.told(house.loadOf([bottleId], 2));
    const first = loadFrom(
      await member
        .put(house.url(`loads/${id}`))
        .send(body)
        .expect(201),
    );
    await house.put(other, 'loads', house.loadOf([bottleId], 3)).expect(201);
    const again = { ...body, envelope: { ...body.envelope, sentAt: t.clock.nowIso(), queued: true } };
    const second = loadFrom(
      await member
        .put(house.url(`loads/${id}`))
        .send(again)
        .expect(200),
    );
    expect(second.action).toEqual(first.action);
    expect(second.load).toEqual(first.load);
    expect(first.bottles[0]?.totals).toMatchObject({ usedE4: { film: 20_000 }, loads: 1 });
    expect(second.bottles[0]?.totals).toMatchObject({ usedE4: { film: 50_000 }, loads: 2 });
  });

  it('with its keys in another order is the same', async () => {
    const { bottleId } = await house.mix(technician);
    const id = v7();
    const { content, envelope } = house.told(house.loadOf([bottleId]));
    await member
      .put(house.url(`loads/${id}`))
      .send({ content, envelope })
      .expect(201);
    const turned = Object.fromEntries(Object.entries(content).reverse());
    await member
      .put(house.url(`loads/${id}`))
      .send({ envelope, content: turned })
      .expect(200);
  });

  it('with other content, as another kind or by another person is answered 409 and changes nothing', async () => {
    const { bottleId } = await house.mix(technician);
    const id = v7();
    const telling = { id, happenedAt: ago(MINUTE) };
    await house.put(member, 'loads', house.loadOf([bottleId]), telling).expect(201);
    const refused = await house.put(member, 'loads', house.loadOf([bottleId], 2), telling).expect(409);
    expect(refused.body).toMatchObject({ code: 'action-differs' });
    await house.put(other, 'loads', house.loadOf([bottleId]), telling).expect(409);
    await house.put(member, 'holds', { bottleId, reason: 'cloudy' }, telling).expect(409);
    expect((await house.totals()).get(bottleId)).toMatchObject({ usedE4: { film: 10_000 }, hold: null });
  });

  it('keeps the first correction of its time', async () => {
    const { bottleId } = await house.mix(technician, { happenedAt: ago(2 * DAY) });
    const id = v7();
    const body = house.told(house.loadOf([bottleId]), { happenedAt: ago(HOUR), deviceNow: ago(10 * MINUTE) });
    const first = loadFrom(
      await member
        .put(house.url(`loads/${id}`))
        .send(body)
        .expect(201),
    );
    const again = { ...body, envelope: { ...body.envelope, deviceNow: ago(3 * HOUR).toISOString() } };
    const second = loadFrom(
      await member
        .put(house.url(`loads/${id}`))
        .send(again)
        .expect(200),
    );
    expect(second.action.happenedAt).toBe(first.action.happenedAt);
  });
});

describe('the time that is told', () => {
  it('is kept where the device is up to 2 minutes off, and moved by the difference beyond', async () => {
    const { bottleId } = await house.mix(technician, { happenedAt: ago(2 * DAY) });
    for (const [offMs, movedMs] of [
      [MINUTE + 50_000, 0],
      [2 * MINUTE + 20_000, 2 * MINUTE + 20_000],
      [-(MINUTE + 50_000), 0],
      [-10 * MINUTE, -10 * MINUTE],
    ] as const) {
      const happenedAt = ago(30 * MINUTE);
      const telling = { happenedAt, deviceNow: ago(offMs) };
      const { action } = loadFrom(
        await house.put(member, 'loads', house.loadOf([bottleId]), telling).expect(201),
      );
      const shift = Date.parse(action.happenedAt) - happenedAt.getTime();
      // The request itself takes a moment, which the difference of the clocks then holds.
      expect(shift).toBeGreaterThanOrEqual(movedMs);
      expect(shift).toBeLessThan(movedMs + (movedMs === 0 ? 1 : 20_000));
    }
  });

  it('may be up to 5 minutes ahead; beyond, a load stands at now and is unsure', async () => {
    const { bottleId } = await house.mix(technician);
    const near = ahead(4 * MINUTE);
    const just = loadFrom(
      await house
        .put(member, 'loads', house.loadOf([bottleId]), { happenedAt: near, deviceNow: ago(0) })
        .expect(201),
    );
    expect(just.action.happenedAt).toBe(near.toISOString());
    expect(just.load.flags).toEqual([]);
    const telling = { happenedAt: ahead(6 * MINUTE), deviceNow: ago(0) };
    const far = loadFrom(await house.put(member, 'loads', house.loadOf([bottleId]), telling).expect(201));
    expect(far.action.happenedAt).toBe(far.action.recordedAt);
    expect(far.load.flags).toEqual(['time_unsure']);
  });

  it('more than 5 minutes ahead is refused for anything else', async () => {
    const { bottleId } = await house.mix(technician);
    const hold = { bottleId, reason: 'cloudy' };
    const far = { happenedAt: ahead(6 * MINUTE), deviceNow: ago(0) };
    const refused = await house.put(member, 'holds', hold, far).expect(422);
    expect(refused.body).toMatchObject({ code: 'in-the-future' });
    await house.put(member, 'holds', hold, { happenedAt: ahead(4 * MINUTE), deviceNow: ago(0) }).expect(201);
  });

  it('up to 24 hours before the mix puts a load at the mix, unsure; earlier is refused', async () => {
    const mixedAt = ago(2 * DAY);
    const { bottleId, code } = await house.mix(technician, { happenedAt: mixedAt });
    const before = (ms: number) => ({ happenedAt: new Date(mixedAt.getTime() - ms), deviceNow: ago(0) });
    const close = before(DAY - MINUTE);
    const { action, load } = loadFrom(
      await house.put(member, 'loads', house.loadOf([bottleId]), close).expect(201),
    );
    expect(action.happenedAt).toBe(mixedAt.toISOString());
    expect(load.flags).toEqual(['time_unsure', 'late']);
    const refused = await house
      .put(member, 'loads', house.loadOf([bottleId]), before(DAY + MINUTE))
      .expect(422);
    expect(refused.body).toMatchObject({
      code: 'before-the-mix',
      detail: expect.stringContaining(code) as string,
    });
    expect((await house.totals()).get(bottleId)).toMatchObject({ loads: 1 });
  });

  it('over 30 days ago takes a technician', async () => {
    const { bottleId } = await house.mix(technician, { happenedAt: ago(40 * DAY) });
    const load = house.loadOf([bottleId]);
    const long = { happenedAt: ago(30 * DAY + MINUTE), deviceNow: ago(0) };
    const refused = await house.put(member, 'loads', load, long).expect(403);
    expect(refused.body).toMatchObject({ code: 'too-long-ago' });
    await house
      .put(member, 'loads', load, { happenedAt: ago(30 * DAY - MINUTE), deviceNow: ago(0) })
      .expect(201);
    await house.put(technician, 'loads', load, long).expect(201);
  });
});

describe('a load told late', () => {
  it('is flagged as the bottle stood then, not as it stands now', async () => {
    const { bottleId } = await house.mix(technician, { happenedAt: ago(3 * DAY) });
    const at = (ms: number) => ({ happenedAt: ago(ms), deviceNow: ago(0) });
    const flagsAt = async (ms: number, rolls = 1): Promise<string[]> => {
      const answer = await house.put(member, 'loads', house.loadOf([bottleId], rolls), at(ms)).expect(201);
      return loadFrom(answer).load.steps.flatMap(({ flags }) => flags);
    };
    await house.put(member, 'holds', { bottleId, reason: 'cloudy' }, at(20 * HOUR)).expect(201);
    expect(await flagsAt(30 * HOUR)).toEqual([]);
    expect(await flagsAt(10 * HOUR)).toEqual(['on_hold']);
    await house.put(technician, 'releases', { bottleId, reason: 'clear again' }, at(5 * HOUR)).expect(201);
    expect(await flagsAt(10 * HOUR)).toEqual(['on_hold']);
    expect(await flagsAt(4 * HOUR)).toEqual([]);
    // A litre rates 20 rolls: 4 are counted by now. Told for a time when there was one, 18 went in without a flag.
    expect(await flagsAt(20.5 * HOUR, 18)).toEqual([]);
    expect(await flagsAt(HOUR)).toEqual(['over_capacity']);
    await house
      .put(technician, 'discards', { bottleId, wasteRoute: 'fixer-silver' }, at(0.5 * HOUR))
      .expect(201);
    expect(await flagsAt(0.75 * HOUR)).toEqual(['over_capacity']);
    expect(await flagsAt(0)).toEqual(['over_capacity', 'after_discard']);
  });

  it('is stored and counted after the bottle was discarded', async () => {
    const { bottleId } = await house.mix(technician);
    await house.put(technician, 'discards', { bottleId, wasteRoute: 'fixer-silver' }).expect(201);
    const { load, bottles } = loadFrom(
      await house.put(member, 'loads', house.loadOf([bottleId])).expect(201),
    );
    expect(load.steps[0]?.flags).toEqual(['after_discard']);
    expect(bottles[0]?.totals).toMatchObject({ usedE4: { film: 10_000 }, loads: 1 });
    expect(bottles[0]?.totals.discardedAt).not.toBeNull();
  });
});
