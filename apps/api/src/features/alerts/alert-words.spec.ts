import {
  assess,
  defaultThresholds,
  fold,
  rapidFixer,
  type BottleFact,
  type StepFlag,
} from '@wetside/chemistry';
import type { EventKind } from '@wetside/db';
import { alertWords, bottleName } from './alert-words.js';
import { bottleSubject, loadSubject, packSubject } from './conditions.js';
import { warningMail } from './warning-mail.js';

/** A litre takes 20 rolls and keeps two months when full (packages/chemistry: capacity-faq second-hand, oldest-to-keep published). */
const MIXED: BottleFact = {
  actionId: 'a1',
  seq: 1,
  happenedAt: '2026-03-01T10:00:00.000Z',
  happenedOn: '2026-03-01',
  kind: 'mix',
  volumeUl: 1_000_000,
  container: { sizeUl: 1_000_000, kind: 'bottle' },
  material: 'film',
};
const later = (seq: number) => ({
  actionId: `a${seq}`,
  seq,
  happenedAt: `2026-03-0${seq}T10:00:00.000Z`,
  happenedOn: `2026-03-0${seq}`,
});
const load = (rolls: number): BottleFact => ({
  ...later(2),
  kind: 'load',
  charges: [{ material: 'film', countedE4: rolls * 10_000, takenUl: 0 }],
});
const HOLD: BottleFact = { ...later(3), kind: 'hold', reason: 'cloudy' };

function words(facts: BottleFact[], kinds: EventKind[], today: string, holdBy: string | null = null) {
  const totals = fold(rapidFixer, [MIXED, ...facts]);
  const context = {
    now: `${today}T12:00:00.000Z`,
    today,
    zone: 'Europe/Vienna',
    smallestTankUl: null,
    thresholds: defaultThresholds,
  };
  const subject = bottleSubject({ id: 'b', code: 'FX-31', document: rapidFixer, totals, holdBy }, context);
  expect(
    totals &&
      assess(rapidFixer, totals, context).conditions.map((one) => (one === 'near' ? 'near-date' : one)),
  ).toEqual(expect.arrayContaining(kinds));
  return { ...alertWords(subject, kinds, context), subject, context };
}

describe('what a warning says', () => {
  it.each<[string, BottleFact[], EventKind[], string, string]>([
    ['low', [load(16)], ['low'], '2026-03-05', 'FX-31 fixer is running low: 4 rolls left'],
    ['spent', [load(22)], ['spent'], '2026-03-05', 'FX-31 fixer is spent: 22 of 20 rolls used, 2 over'],
    ['near', [], ['near-date'], '2026-04-28', 'FX-31 fixer is near its date: it keeps to 1 May'],
    ['past', [], ['past-date'], '2026-05-02', 'FX-31 fixer is past its date since 1 May'],
    [
      'past and spent',
      [load(20)],
      ['past-date', 'spent'],
      '2026-05-02',
      'FX-31 fixer is past its date since 1 May, and spent: 20 of 20 rolls used',
    ],
    ['held', [HOLD], ['on-hold'], '2026-03-05', 'FX-31 fixer is on hold: cloudy'],
  ])('%s', (_name, facts, kinds, today, sentence) => {
    expect(words(facts, kinds, today).sentence).toBe(sentence);
  });

  it('names who put it on hold, and since when', () => {
    expect(words([HOLD], ['on-hold'], '2026-03-05', 'Tomas')).toMatchObject({
      sentence: 'FX-31 fixer is on hold by Tomas: cloudy',
      why: 'On hold since 3 Mar: nobody should load it',
    });
  });

  it('shows the figures', () => {
    expect(words([load(16)], ['low'], '2026-03-05').why).toBe('20 rolls rated, 16 used. Keeps to 1 May');
  });

  it('knows roles of two words', () => {
    const named = (role: typeof rapidFixer.role) =>
      bottleName({ id: 'b', code: 'X-1', document: { ...rapidFixer, role }, totals: null, holdBy: null });
    expect([named('stop-bath'), named('bleach-fix')]).toEqual(['X-1 stop bath', 'X-1 bleach-fix']);
  });

  it('tells whether a pack is on its way', () => {
    const pack = (unopened: number, onOrder: number, kind: EventKind) =>
      alertWords(packSubject({ id: 'p', name: 'Rapid fixer', unopened, onOrder, reorderPoint: 1 }), [kind], {
        today: '2026-03-05',
        zone: 'UTC',
      });
    expect(pack(1, 0, 'reorder-point')).toEqual({
      sentence: 'Rapid fixer: 1 on the shelf, reorder at 1',
      why: '1 unopened, 0 on order, reorder at 1',
      advice: 'Order it.',
    });
    expect(pack(0, 2, 'none-on-shelf')).toMatchObject({
      sentence: 'Rapid fixer: none on the shelf',
      advice: expect.stringContaining('on order') as string,
    });
  });

  it('tells where a load went', () => {
    const steps: { code: string; flags: StepFlag[] }[] = [
      { code: 'DV-14', flags: ['over_capacity'] },
      { code: 'SB-20', flags: ['past_date', 'on_hold'] },
    ];
    const film = [{ format: '135-36', count: 2, widthMm: null, heightMm: null }];
    const facts = {
      id: 'l',
      by: 'Marek',
      happenedOn: '2026-03-04',
      voided: false,
      decided: false,
      steps,
      film,
    };
    expect(
      alertWords(loadSubject(facts), ['load-to-decide'], { today: '2026-03-05', zone: 'UTC' }),
    ).toMatchObject({
      sentence: 'A load went through SB-20 after its date and while it was on hold',
      why: '2 rolls of 135, by Marek on 4 Mar',
    });
  });
});

describe('a warning as a mail', () => {
  const house = { shortName: 'cellar', darkroomName: 'The cellar' };

  it('says what, why, what to do and where, and keeps its subject on one line', () => {
    const { subject, context } = words(
      [{ ...HOLD, reason: `smells\r\nBcc: x ${'y'.repeat(300)}` }],
      ['on-hold'],
      '2026-03-05',
    );
    const all = {
      darkroomId: 'd',
      zone: 'UTC',
      thresholds: defaultThresholds,
      smallestTankUl: null,
      temperatureUnit: 'C' as const,
      volumeUnit: 'mL' as const,
      currency: 'EUR',
      ...house,
    };
    const mail = warningMail(subject, ['on-hold'], {
      house: all,
      origin: 'https://darkroom.example',
      day: context,
    });
    expect(mail.subject).toMatch(/^FX-31 fixer is on hold: smells Bcc: x y+…$/);
    expect(mail.body).toContain(
      'Why: On hold since 3 Mar: nobody should load it.\nWhat to do: Test it, then release it or discard it.',
    );
    expect(mail.body).toContain('\nhttps://darkroom.example/d/cellar/bottles/FX-31\n');
    expect(mail.body).toContain('https://darkroom.example/d/cellar/needs-you');
  });
});
