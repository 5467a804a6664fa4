import { LedgerHouse, MINUTE } from '../../testing/ledger-house.js';
import { TestApp, type Browser } from '../../testing/test-app.js';

interface Entry {
  action: { id: string; kind: string; canUndo: boolean; voidedBy: { displayName: string } | null };
  sentence: string;
  codes: string[];
  flags: string[];
  voidsActionId?: string;
}
interface Page {
  entries: Entry[];
  nextCursor: string | null;
}

describe('the log', () => {
  let t: TestApp;
  let house: LedgerHouse;
  let technician: Browser;
  let member: Browser;

  beforeAll(async () => {
    t = await TestApp.start();
    house = await LedgerHouse.open(t, 'log');
    technician = await t.signedIn(house.people.technician);
    member = await t.signedIn(house.people.member);
  });
  afterAll(() => t.close());

  const read = async (query = ''): Promise<Page> => {
    const answer = await member.get(house.url(`log${query}`)).expect(200);
    return answer.body as Page;
  };

  it('says of a void what it took back, and strikes that', async () => {
    const { bottleId, code } = await house.mix(technician);
    const load = await house.put(member, 'loads', house.loadOf([bottleId], 2)).expect(201);
    const { action } = load.body as { action: { id: string } };
    await house.put(member, 'voids', { voidedActionId: action.id, reason: 'the other bottle' }).expect(201);
    const [first, second] = (await read()).entries;
    expect(first).toMatchObject({
      sentence: 'took back: 2 rolls of 135, conventional (the other bottle)',
      codes: [code],
      voidsActionId: action.id,
      action: { kind: 'void', canUndo: false },
    });
    expect(second).toMatchObject({
      sentence: '2 rolls of 135, conventional',
      action: { id: action.id, canUndo: false, voidedBy: { displayName: 'Ada log' } },
    });
  });

  it('keeps it with a load that was reported afterwards', async () => {
    const { bottleId } = await house.mix(technician);
    await house.put(member, 'loads', { ...house.loadOf([bottleId]), reported: true }).expect(201);
    expect((await read('?limit=1')).entries[0]?.flags).toEqual(['reported']);
  });

  it('pages by cursor, newest first, each entry once, whatever comes in meanwhile', async () => {
    const { bottleId } = await house.mix(technician);
    for (let index = 0; index < 7; index += 1) {
      await house.put(member, 'loads', house.loadOf([bottleId])).expect(201);
    }
    const whole = (await read('?limit=100')).entries.map((entry) => entry.action.id);
    const paged: string[] = [];
    let page = await read('?limit=3');
    for (;;) {
      paged.push(...page.entries.map((entry) => entry.action.id));
      if (page.nextCursor === null) break;
      await house.put(member, 'loads', house.loadOf([bottleId])).expect(201);
      page = await read(`?limit=3&cursor=${page.nextCursor}`);
    }
    expect(paged).toEqual(whole);
  });

  it('puts what was told late at its time, and names bottles in the order of a line', async () => {
    const { bottleId } = await house.mix(technician);
    t.clock.advance(90 * MINUTE);
    member = await t.signedIn(house.people.member);
    await house.put(member, 'loads', house.loadOf([bottleId], 3)).expect(201);
    const earlier = new Date(t.clock.now().getTime() - 80 * MINUTE);
    await house.put(member, 'loads', house.loadOf([bottleId], 4), { happenedAt: earlier }).expect(201);
    const [first, second] = (await read()).entries;
    expect(first?.sentence).toBe('3 rolls of 135, conventional');
    expect(second).toMatchObject({ sentence: '4 rolls of 135, conventional', flags: ['late'] });
  });

  it('refuses a cursor that no page gave out', async () => {
    await member.get(house.url('log?cursor=nonsense')).expect(400);
    await member.get(house.url('log?limit=0')).expect(400);
  });
});
