import postgres from 'postgres';
import { v7 } from 'uuid';
import { reconcile } from '../../cli/reconcile/reconcile.js';
import { HOUR, LedgerHouse, MINUTE } from '../../testing/ledger-house.js';
import { TestApp, type Browser } from '../../testing/test-app.js';

let t: TestApp;
let house: LedgerHouse;
let technician: Browser;
let member: Browser;
let other: Browser;

beforeAll(async () => {
  t = await TestApp.start({ SWEEP_S: '3600' });
  house = await LedgerHouse.open(t, 'undo');
}, 60_000);

/** Signed in anew each time: the tests move the clock past the life of a session's tokens. */
beforeEach(async () => {
  technician = await t.signedIn(house.people.technician);
  member = await t.signedIn(house.people.member);
  other = await t.signedIn(house.people.other);
});

afterEach(async () => {
  expect((await reconcile(t.db.adminUrl, t.clock.now())).differences).toEqual([]);
});

afterAll(() => t?.close());

async function load(browser: Browser, bottleIds: string[], rolls = 1): Promise<string> {
  const id = v7();
  await house.put(browser, 'loads', house.loadOf(bottleIds, rolls), { id }).expect(201);
  return id;
}

const takeBack = (browser: Browser, voidedActionId: string, id = v7()) =>
  house.put(browser, 'voids', { voidedActionId, reason: 'misread' }, { id });

const used = async (bottleId: string) => (await house.totals()).get(bottleId)?.usedE4.film ?? 0;

describe('taking back', () => {
  it('is counted in every bottle at once, and both stay in the log', async () => {
    const { bottleId: first } = await house.mix(technician);
    const { bottleId: second } = await house.mix(technician);
    await load(other, [first], 3);
    const id = await load(member, [second, first], 2);
    const answer = await takeBack(member, id).expect(201);
    expect(answer.body).toMatchObject({ voided: { id, canUndo: false, voidedBy: { reason: 'misread' } } });
    expect([await used(first), await used(second)]).toEqual([30_000, 0]);
  });

  it('of one load twice is answered 409, and the same void sent again 200', async () => {
    const { bottleId } = await house.mix(technician);
    const id = await load(member, [bottleId]);
    const voidId = v7();
    const body = house.told({ voidedActionId: id });
    await member
      .put(house.url(`voids/${voidId}`))
      .send(body)
      .expect(201);
    await member
      .put(house.url(`voids/${voidId}`))
      .send(body)
      .expect(200);
    expect((await takeBack(technician, id).expect(409)).body).toMatchObject({ code: 'already-voided' });
    expect(await used(bottleId)).toBe(0);
  });

  it('of one load by two people at once leaves one void', async () => {
    const { bottleId } = await house.mix(technician);
    const id = await load(member, [bottleId]);
    const both = await Promise.all([takeBack(member, id), takeBack(technician, id)]);
    expect(both.map(({ status }) => status).sort()).toEqual([201, 409]);
  });

  it('of a void is refused', async () => {
    const { bottleId } = await house.mix(technician);
    const voidId = v7();
    await takeBack(member, await load(member, [bottleId]), voidId).expect(201);
    expect((await takeBack(technician, voidId).expect(422)).body).toMatchObject({ code: 'void-of-void' });
  });

  it('of a mix waits for what leans on it, and names it', async () => {
    const { bottleId, actionId, code } = await house.mix(technician);
    const first = await load(member, [bottleId]);
    const second = await load(member, [bottleId]);
    const holdId = v7();
    await house.put(member, 'holds', { bottleId, reason: 'cloudy' }, { id: holdId }).expect(201);
    const answer = await takeBack(technician, actionId).expect(409);
    expect(answer.body).toMatchObject({
      code: 'leans-on-it',
      detail: `${code} has 2 loads, a hold or a discard on it. Take those back first.`,
    });
    for (const id of [first, second, holdId]) await takeBack(technician, id).expect(201);
    await takeBack(technician, actionId).expect(201);
    expect((await house.totals()).get(bottleId)).toBeNull();
    const gone = await house.put(member, 'loads', house.loadOf([bottleId])).expect(422);
    expect(gone.body).toMatchObject({ code: 'bottle-taken-back' });
  });

  it('of a discard gives the bottle back as it stood, with what went through it since', async () => {
    const { bottleId } = await house.mix(technician);
    const id = v7();
    await house.put(technician, 'discards', { bottleId, wasteRoute: 'fixer-silver' }, { id }).expect(201);
    await load(member, [bottleId]);
    await takeBack(technician, id).expect(201);
    expect((await house.totals()).get(bottleId)).toMatchObject({ discardedAt: null, loads: 1 });
  });
});

describe('who may take back', () => {
  it('not another member', async () => {
    const { bottleId } = await house.mix(technician);
    const id = await load(member, [bottleId]);
    expect((await takeBack(other, id).expect(403)).body).toMatchObject({ code: 'not-allowed' });
    expect(await used(bottleId)).toBe(10_000);
  });

  it('oneself for 12 hours, from any device; after that a technician', async () => {
    const { bottleId } = await house.mix(technician);
    const [early, late] = [await load(member, [bottleId]), await load(member, [bottleId])];
    t.clock.advance(12 * HOUR - MINUTE);
    await takeBack(await t.signedIn(house.people.member), early).expect(201);
    t.clock.advance(2 * MINUTE);
    const anew = await t.signedIn(house.people.member);
    expect((await takeBack(anew, late).expect(403)).body).toMatchObject({ code: 'undo-too-late' });
    await takeBack(await t.signedIn(house.people.technician), late).expect(201);
    expect(await used(bottleId)).toBe(0);
  });
});

describe('another darkroom', () => {
  it('has no bottle, no load and no member of this one', async () => {
    const elsewhere = await LedgerHouse.open(t, 'elsewhere');
    const stranger = await t.signedIn(elsewhere.people.technician);
    const { bottleId } = await house.mix(technician);
    const { bottleId: theirs } = await elsewhere.mix(stranger);
    const id = await load(member, [bottleId]);
    await house.put(stranger, 'loads', house.loadOf([bottleId])).expect(404);
    await elsewhere.put(stranger, 'loads', elsewhere.loadOf([bottleId])).expect(404);
    await elsewhere.put(stranger, 'loads', elsewhere.loadOf([theirs, bottleId])).expect(404);
    await elsewhere.put(stranger, 'holds', { bottleId, reason: 'cloudy' }).expect(404);
    await elsewhere.put(stranger, 'discards', { bottleId, wasteRoute: 'other' }).expect(404);
    await elsewhere.put(stranger, 'voids', { voidedActionId: id }).expect(404);
    expect(await used(bottleId)).toBe(10_000);
    expect((await elsewhere.totals()).get(theirs)).toMatchObject({ loads: 0 });
  });
});

describe('the program’s own login', () => {
  const tables = [
    'actions',
    'mixes',
    'mix_draws',
    'loads',
    'load_film',
    'load_steps',
    'holds',
    'discards',
    'voids',
    'bottles',
  ];

  it.each(tables)('may neither change nor delete a row of %s', async (table) => {
    const sql = postgres(t.db.appUrl, { max: 1 });
    try {
      for (const statement of [
        sql`update ${sql(table)} set darkroom_id = darkroom_id`,
        sql`delete from ${sql(table)}`,
      ]) {
        await expect(statement.execute()).rejects.toMatchObject({ code: '42501' });
      }
    } finally {
      await sql.end();
    }
  });
});
