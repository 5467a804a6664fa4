import { assess } from './assess.js';
import { type Assessment, defaultThresholds } from './assess-types.js';
import { rapidFixer, stopBathSb5, wettingAgent } from './catalogue/starter-catalogue.js';
import type { ChemistryDocument } from './document.js';
import { fold } from './fold.js';
import type { BottleFact } from './ledger.js';
import { freshLitre, litreBottle, rolls, story } from './testing/bottle-story.js';

function stands(
  document: ChemistryDocument,
  facts: BottleFact[],
  today: string,
  tankUl = 300_000,
): Assessment {
  const totals = fold(document, facts);
  if (!totals) throw new Error('the bottle is not there');
  return assess(document, totals, {
    now: `${today}T12:00:00Z`,
    today,
    zone: 'UTC',
    smallestTankUl: tankUl,
    thresholds: defaultThresholds,
  });
}

describe('a re-used bottle', () => {
  it('is open while no limit is reached', () => {
    const found = stands(
      rapidFixer,
      story(['2026-03-01', freshLitre], ['2026-03-02', rolls(6)]),
      '2026-03-03',
    );
    expect(found).toMatchObject({
      verdict: 'open',
      closed: false,
      conditions: [],
      governs: 'capacity',
      leftE4: { film: 140_000 },
      overE4: {},
      lastDay: '2026-05-01',
      daysLeft: 59,
      reasons: [],
      sentence: '14 rolls left, to 1 May',
      nextLookAt: '2026-04-24T00:00:00.000Z',
    });
  });

  it.each([
    [15, 'open'],
    [16, 'low'],
    [20, 'spent'],
    [22, 'spent'],
  ])('after %d of 20 rolls is %s', (count, verdict) => {
    const found = stands(
      rapidFixer,
      story(['2026-03-01', freshLitre], ['2026-03-02', rolls(count)]),
      '2026-03-03',
    );
    expect(found.verdict).toBe(verdict);
    expect(found.closed).toBe(verdict === 'spent');
  });

  it('tells what is over apart from what is left', () => {
    const found = stands(
      rapidFixer,
      story(['2026-03-01', freshLitre], ['2026-03-02', rolls(22)]),
      '2026-03-03',
    );
    expect(found.leftE4.film).toBe(0);
    expect(found.overE4.film).toBe(20_000);
    expect(found.sentence).toBe('Spent: 22 of 20 rolls used, 2 over');
  });

  it('of few rolls is low from half, not from three rolls', () => {
    const small = { ...freshLitre, volumeUl: 200_000, container: { ...litreBottle, sizeUl: 200_000 } };
    const after = (count: number): string =>
      stands(rapidFixer, story(['2026-03-01', small], ['2026-03-02', rolls(count)]), '2026-03-03', 100_000)
        .verdict;
    expect([after(1), after(2), after(4)]).toEqual(['open', 'low', 'spent']);
  });

  it('is good through the whole of its last day and past it on the next', () => {
    const facts = story(['2026-03-01', freshLitre]);
    const verdicts = ['2026-04-23', '2026-04-24', '2026-05-01', '2026-05-02'].map(
      (today) => stands(rapidFixer, facts, today).verdict,
    );
    expect(verdicts).toEqual(['open', 'near-date', 'near-date', 'past-date']);
    expect(stands(rapidFixer, facts, '2026-05-01')).toMatchObject({ closed: false, daysLeft: 0 });
    expect(stands(rapidFixer, facts, '2026-05-02')).toMatchObject({ closed: true, daysLeft: -1 });
    expect(stands(rapidFixer, facts, '2026-05-02').sentence).toBe('Past its date since 1 May');
    expect(stands(rapidFixer, facts, '2026-05-01').nextLookAt).toBe('2026-05-02T00:00:00.000Z');
    expect(stands(rapidFixer, facts, '2026-05-02').nextLookAt).toBeNull();
  });

  it('past its date and spent says both', () => {
    const found = stands(
      rapidFixer,
      story(['2026-03-01', freshLitre], ['2026-03-02', rolls(20)]),
      '2026-05-02',
    );
    expect(found.conditions).toEqual(['past-date', 'spent']);
    expect(found.sentence).toBe('Past its date since 1 May. Spent: 20 of 20 rolls used');
  });

  it('on hold is closed whatever is left', () => {
    const facts = story(['2026-03-01', freshLitre], ['2026-03-02', { kind: 'hold', reason: 'cloudy' }]);
    const found = stands(rapidFixer, facts, '2026-03-03');
    expect(found).toMatchObject({
      verdict: 'on-hold',
      closed: true,
      governs: 'hold',
      sentence: 'On hold: cloudy',
    });
    const released = [...facts, ...story(['2026-03-03', { kind: 'release' as const }])].map(
      (fact, index) => ({
        ...fact,
        seq: index,
      }),
    );
    expect(stands(rapidFixer, released, '2026-03-03').verdict).toBe('open');
  });

  it('discarded is the end', () => {
    const found = stands(
      rapidFixer,
      story(['2026-03-01', freshLitre], ['2026-03-02', { kind: 'discard' }]),
      '2026-09-03',
    );
    expect(found).toMatchObject({ verdict: 'discarded', closed: true, conditions: [], nextLookAt: null });
  });

  it('with too little for the smallest tank is closed', () => {
    const poured = story(['2026-03-01', freshLitre], ['2026-03-02', rolls(1, 500_000)]);
    const found = stands(rapidFixer, poured, '2026-03-03', 600_000);
    expect(found).toMatchObject({ verdict: 'volume-short', closed: true, governs: 'volume' });
    expect(found.sentence).toBe('500 mL. The smallest tank needs 600 mL');
  });

  it('is not ready before it has cooled', () => {
    const cooling: ChemistryDocument = {
      ...rapidFixer,
      readyAfter: { seconds: 10_800, why: 'it has to cool', source: 'capacity-faq' },
    };
    const found = stands(cooling, story(['2026-03-01', freshLitre]), '2026-03-01');
    expect(found).toMatchObject({
      verdict: 'not-ready',
      closed: true,
      nextLookAt: '2026-03-01T13:00:00.000Z',
    });
    expect(found.sentence).toBe('Ready from 13:00: it has to cool');
  });

  it('says about when nobody saw it mixed', () => {
    const standing = {
      ...freshLitre,
      kind: 'standing' as const,
      about: true as const,
      mixedOn: '2026-02-20',
      usedE4: { film: 40_000 },
    };
    expect(stands(rapidFixer, story(['2026-03-01', standing]), '2026-03-02').sentence).toBe(
      'About 16 rolls left, to 20 Apr',
    );
  });

  it('the date governs where the greater share of it is gone', () => {
    const facts = story(['2026-03-01', freshLitre], ['2026-03-02', rolls(4)]);
    expect(stands(rapidFixer, facts, '2026-03-08').governs).toBe('capacity');
    expect(stands(rapidFixer, facts, '2026-04-10').governs).toBe('date');
  });
});

describe('what is not known', () => {
  it('an unknown capacity makes no verdict and is said', () => {
    const facts = story(['2026-12-01', freshLitre], ['2026-12-02', rolls(7)]);
    const found = stands(wettingAgent, facts, '2026-12-03');
    expect(found).toMatchObject({
      verdict: 'open',
      leftE4: { film: null },
      ratedE4: { film: null },
      governs: 'date',
    });
    expect(found.sentence).toBe('Capacity not known. 7 rolls so far. Age governs: 8 Dec');
  });

  it('an unknown keeping time gives no date', () => {
    const found = stands(
      stopBathSb5,
      story(['2026-03-01', freshLitre], ['2026-03-02', rolls(5)]),
      '2027-03-03',
    );
    expect(found).toMatchObject({ verdict: 'open', lastDay: null, daysLeft: null, nextLookAt: null });
    expect(found.sentence).toBe('7 rolls left, keeping time not known');
  });
});

describe('tests', () => {
  const tested = (shareE4: number, after = 0): Assessment =>
    stands(
      rapidFixer,
      story(
        ['2026-03-01', freshLitre],
        ['2026-03-02', rolls(4)],
        ['2026-03-03', { kind: 'reading', shareE4: { film: shareE4 } }],
        ['2026-03-04', rolls(after)],
      ),
      '2026-03-05',
    );

  it('take life away and never give it', () => {
    expect(tested(10_000).leftE4.film).toBe(160_000);
    expect(tested(5_000).leftE4.film).toBe(100_000);
    expect(tested(5_000).governs).toBe('test');
    expect(tested(5_000, 3).leftE4.film).toBe(70_000);
    const better = story(
      ['2026-03-01', freshLitre],
      ['2026-03-02', { kind: 'reading', shareE4: { film: 5_000 } }],
      ['2026-03-03', { kind: 'reading', shareE4: { film: 10_000 } }],
    );
    expect(stands(rapidFixer, better, '2026-03-05').leftE4.film).toBe(100_000);
    expect(tested(0)).toMatchObject({ verdict: 'spent', sentence: 'Spent: the last test leaves nothing' });
  });
});

describe('film and paper in one chemistry', () => {
  const both: ChemistryDocument = {
    ...rapidFixer,
    materials: [
      ...rapidFixer.materials,
      { material: 'rc-paper', capacity: [{ per: 'litre', rollsE4: 400_000, source: 'capacity-faq' }] },
    ],
  };

  it('use of one wears the other by its share', () => {
    const found = stands(both, story(['2026-03-01', freshLitre], ['2026-03-02', rolls(5)]), '2026-03-03');
    expect(found.leftE4).toEqual({ film: 150_000, 'rc-paper': 300_000 });
  });
});

describe('the other ways of use', () => {
  it('one-shot counts what the volume is good for', () => {
    const stock: ChemistryDocument = {
      ...rapidFixer,
      role: 'developer',
      use: 'one-shot',
      oneShot: { leastStockPerRollUl: 100_000, source: 'capacity-faq' },
    };
    const found = stands(
      stock,
      story(['2026-03-01', freshLitre], ['2026-03-02', rolls(1, 300_000)]),
      '2026-03-03',
    );
    expect(found.leftE4.film).toBe(20_000);
    const out = stands(
      stock,
      story(['2026-03-01', freshLitre], ['2026-03-02', rolls(1, 800_000)]),
      '2026-03-03',
    );
    expect(out).toMatchObject({ verdict: 'volume-short', closed: true, conditions: ['spent'] });
  });

  it('replenished tells what is owed and no rolls left', () => {
    const tank: ChemistryDocument = {
      ...rapidFixer,
      role: 'developer',
      use: 'replenished',
      replenishment: { ulPerRoll: 70_000, source: 'capacity-faq' },
    };
    const facts = story(
      ['2026-03-01', freshLitre],
      ['2026-03-02', rolls(10)],
      ['2026-03-03', { kind: 'top-up', addedUl: 560_000, replenisher: true }],
    );
    const found = stands(tank, facts, '2026-03-03');
    expect(found).toMatchObject({ leftE4: { film: null }, owedUl: 140_000 });
    expect(found.sentence).toBe('Owed 140 mL. 0.6 turnovers, to 1 May');
  });
});
