import { v7 } from 'uuid';
import type { LoadAnswer } from '../features/loads/load.view.js';
import { DAY, HOUR, MINUTE } from '../testing/ledger-house.js';
import { expectRefusal, table } from './table.js';
import { boundRows } from './times.rows.js';
import type { World } from './world.js';

const SECOND = 1_000;
const ahead = (ms: number) => -ms;

/** How long before now it is told for by the device, how much that device is behind, and how long before now it then stands. */
type Told = readonly [what: string, ago: number, behind: number, stands: number, flags: string[]];

const told: Told[] = [
  ['a clock that is right', 10 * MINUTE, 0, 10 * MINUTE, []],
  ['a clock 2 minutes behind is left alone', 12 * MINUTE, 2 * MINUTE, 12 * MINUTE, []],
  [
    'a clock 2 minutes and a second behind is corrected',
    12 * MINUTE,
    2 * MINUTE + SECOND,
    10 * MINUTE - SECOND,
    [],
  ],
  ['a clock 2 minutes ahead is left alone', 8 * MINUTE, ahead(2 * MINUTE), 8 * MINUTE, []],
  [
    'a clock 2 minutes and a second ahead is corrected',
    8 * MINUTE,
    ahead(2 * MINUTE + SECOND),
    10 * MINUTE + SECOND,
    [],
  ],
  ['a phone 10 minutes slow', 13 * MINUTE, 10 * MINUTE, 3 * MINUTE, []],
  ['a phone a day ahead', ahead(DAY) + 3 * MINUTE, ahead(DAY), 3 * MINUTE, []],
  ['a phone a year behind', 365 * DAY + 3 * MINUTE, 365 * DAY, 3 * MINUTE, []],
  ['5 minutes ahead stands as told', ahead(5 * MINUTE), 0, ahead(5 * MINUTE), []],
  [
    '5 minutes and a second ahead stands at now, and says so',
    ahead(5 * MINUTE + SECOND),
    0,
    0,
    ['time_unsure'],
  ],
  ['a day ahead stands at now, and says so', ahead(DAY), 0, 0, ['time_unsure']],
  ['an hour ago is in time', HOUR, 0, HOUR, []],
  ['an hour and a second ago is late', HOUR + SECOND, 0, HOUR + SECOND, ['late']],
  ['30 days ago, by a member', 30 * DAY, 0, 30 * DAY, ['late']],
];

export function timesTopic(world: () => World): void {
  describe(`times at their bounds (${told.length + 9} cases)`, () => {
    let goOn: () => void;
    let bottleId: string;

    beforeAll(async () => {
      const w = world();
      goOn = w.stopClock();
      bottleId = v7();
      await w
        .put(w.technician, 'mixes', w.mix({ bottleId }), { at: w.ago(60 * DAY), deviceNow: w.t.clock.now() })
        .expect(201);
    });
    afterAll(() => goOn());

    const load = async (browser: World['member'], ago: number, behind = 0, id = v7(), bottle = bottleId) => {
      const w = world();
      const telling = { id, at: w.ago(ago), deviceNow: w.ago(behind) };
      const answer = await w.put(browser, 'loads', w.load({ bottleIds: [bottle] }), telling);
      const [row] = await w.root<{ happened: Date; recorded: Date }[]>`
        select happened_at as happened, recorded_at as recorded from actions where id = ${id}`;
      return { answer, row, flags: (answer.body as LoadAnswer).load?.flags };
    };

    it.each(told)('%s', async (_what, ago, behind, stands, flags) => {
      const w = world();
      const found = await load(w.member, ago, behind);
      expect(found.answer.status).toBe(201);
      expect(found.row).toEqual({ happened: w.ago(stands), recorded: w.t.clock.now() });
      expect(found.flags).toEqual(flags);
    });

    it('a technician tells of 30 days and a second ago', async () => {
      const w = world();
      const { answer, row } = await load(w.technician, 30 * DAY + SECOND);
      expect(answer.status).toBe(201);
      expect(row?.happened).toEqual(w.ago(30 * DAY + SECOND));
    });

    it.each([
      ['a second before its mix', SECOND],
      ['a day before its mix', DAY],
    ])('a load %s stands at the mix’s time, and says so', async (_what, before) => {
      const w = world();
      const { answer, row, flags } = await load(w.member, before, 0, v7(), await w.bottle());
      expect(answer.status).toBe(201);
      expect(row?.happened).toEqual(w.t.clock.now());
      expect(flags).toContain('time_unsure');
    });

    it('a phone 10 minutes slow at a bottle mixed just now is corrected, not unsure', async () => {
      const w = world();
      const { row, flags } = await load(w.member, 10 * MINUTE, 10 * MINUTE, v7(), await w.bottle());
      expect(row?.happened).toEqual(w.t.clock.now());
      expect(flags).toEqual([]);
    });

    it('a load sent again keeps its first correction', async () => {
      const w = world();
      const id = v7();
      const body = w.told(w.load({ bottleIds: [bottleId] }), {
        at: w.ago(15 * MINUTE),
        deviceNow: w.ago(10 * MINUTE),
      });
      const send = (deviceNow: Date) =>
        w.member
          .put(w.url(`loads/${id}`))
          .send({ ...body, envelope: { ...body.envelope, deviceNow: deviceNow.toISOString() } });
      const first = await send(w.ago(10 * MINUTE)).expect(201);
      const again = await send(w.ago(3 * HOUR)).expect(200);
      expect(again.body).toEqual(first.body);
      expect((first.body as LoadAnswer).action.happenedAt).toBe(w.ago(5 * MINUTE).toISOString());
    });

    it('a mix’s time is corrected as a load’s is', async () => {
      const w = world();
      const id = v7();
      const telling = { id, at: w.ago(13 * MINUTE), deviceNow: w.ago(10 * MINUTE) };
      await w.put(w.technician, 'mixes', w.mix(), telling).expect(201);
      const [row] = await w.root<
        { happened: Date }[]
      >`select happened_at as happened from actions where id = ${id}`;
      expect(row?.happened).toEqual(w.ago(3 * MINUTE));
    });

    table('refused or taken at them', world, boundRows);
  });

  describe('taking back after 12 hours (4 cases)', () => {
    it('is open to the member up to 12 hours, then to a technician', async () => {
      const w = world();
      const [first, second] = [v7(), v7()];
      const goOn = w.stopClock();
      const recorded = w.t.clock.now();
      for (const id of [first, second]) await w.put(w.member, 'loads', w.load(), { id }).expect(201);
      goOn();
      const undo = (browser: World['member'], voidedActionId: string) =>
        w.put(browser, 'voids', { voidedActionId });
      await w.later(12 * HOUR);
      const atTwelve = w.stopClock(new Date(recorded.getTime() + 12 * HOUR));
      await undo(w.member, first).expect(201);
      atTwelve();
      const justAfter = w.stopClock(new Date(recorded.getTime() + 12 * HOUR + 1));
      const late = await undo(w.member, second);
      expectRefusal(late, [
        'late',
        () => undo(w.member, second),
        403,
        'undo-too-late',
        undefined,
        'A technician can still',
      ]);
      const others = await undo(w.other, second);
      expectRefusal(others, ['another’s', () => undo(w.other, second), 403, 'not-allowed']);
      await undo(w.technician, second).expect(201);
      justAfter();
    });
  });
}
