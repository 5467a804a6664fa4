import { rapidFixer } from './catalogue/starter-catalogue.js';
import { chargeFor, flagsFor } from './charge.js';
import type { ChemistryDocument } from './document.js';
import { lastDay } from './keeping.js';
import { apply, fold } from './fold.js';
import { type BottleFact, type BottleTotals, LedgerOrderError } from './ledger.js';
import { freshLitre, litreBottle, rolls, story } from './testing/bottle-story.js';

function totalsOf(facts: BottleFact[], document: ChemistryDocument = rapidFixer): BottleTotals {
  const totals = fold(document, facts);
  if (!totals) throw new Error('the bottle is not there');
  return totals;
}

const last = (...told: Parameters<typeof story>): string | null =>
  lastDay(rapidFixer, totalsOf(story(...told)));

describe('order', () => {
  it('apply refuses what is older, what is voided, and what finds no bottle', () => {
    const [mix, load] = story(['2026-03-01', freshLitre], ['2026-03-02', rolls(1)]);
    if (!mix || !load) throw new Error('the story is too short');
    const totals = apply(rapidFixer, apply(rapidFixer, null, mix), load);
    expect(() => apply(rapidFixer, totals, load)).toThrow(LedgerOrderError);
    expect(() => apply(rapidFixer, null, load)).toThrow(LedgerOrderError);
    expect(() => apply(rapidFixer, null, { ...mix, voided: true })).toThrow(LedgerOrderError);
    expect(() => apply(rapidFixer, totals, { ...mix, seq: 9, happenedAt: '2026-03-05T10:00:00Z' })).toThrow(
      LedgerOrderError,
    );
  });

  it('no bottle without a mix that stands', () => {
    const [mix, load] = story(['2026-03-01', freshLitre], ['2026-03-02', rolls(1)]);
    if (!mix || !load) throw new Error('the story is too short');
    expect(fold(rapidFixer, [load])).toBeNull();
    expect(fold(rapidFixer, [{ ...mix, voided: true }, load])).toBeNull();
  });

  it('of two things told for one instant the later sequence is the last', () => {
    const [mix, hold, release] = story(
      ['2026-03-01', freshLitre],
      ['2026-03-02', { kind: 'hold', reason: 'cloudy' }],
      ['2026-03-02', { kind: 'release' }],
    );
    if (!mix || !hold || !release) throw new Error('the story is too short');
    expect(totalsOf([release, hold, mix]).hold).toBeNull();
    expect(totalsOf([{ ...release, seq: 2 }, { ...hold, seq: 3 }, mix]).hold).not.toBeNull();
    const held = apply(rapidFixer, apply(rapidFixer, null, mix), hold);
    expect(apply(rapidFixer, held, release).hold).toBeNull();
  });

  it('the last hold or release wins', () => {
    const holds = story(
      ['2026-03-01', freshLitre],
      ['2026-03-02', { kind: 'hold', reason: 'cloudy' }],
      ['2026-03-03', { kind: 'hold', reason: 'smells wrong' }],
    );
    expect(totalsOf(holds).hold).toEqual({
      actionId: 'action-3',
      since: '2026-03-03T10:00:00.000Z',
      reason: 'smells wrong',
    });
    const [release] = story(['2026-03-04', { kind: 'release' }]);
    expect(totalsOf([...holds, { ...release, seq: 9 } as BottleFact]).hold).toBeNull();
  });
});

describe('volume, state and date', () => {
  it('a load that takes a bottle under three quarters shortens its date from that day', () => {
    expect(last(['2026-03-01', freshLitre], ['2026-03-02', rolls(1, 250_000)])).toBe('2026-05-01');
    // 1 of 61 days used, 60/61 of the 31 days from 2 March: 30 whole days
    expect(last(['2026-03-01', freshLitre], ['2026-03-02', rolls(1, 260_000)])).toBe('2026-04-01');
  });

  it('a top-up restores volume and moves no date', () => {
    const poured = story(
      ['2026-03-01', freshLitre],
      ['2026-03-02', rolls(4, 260_000)],
      ['2026-03-03', { kind: 'top-up', addedUl: 260_000 }],
    );
    const totals = totalsOf(poured);
    expect(totals).toMatchObject({
      volumeUl: 1_000_000,
      containerState: 'part-full',
      usedE4: { film: 40_000 },
    });
    expect(lastDay(rapidFixer, totals)).toBe('2026-04-01');
  });

  it('a smaller bottle makes it full again from now on, the life used is kept', () => {
    const smaller = { kind: 'container-change' as const, container: { ...litreBottle, sizeUl: 750_000 } };
    const part = { ...freshLitre, volumeUl: 700_000 };
    // 15 of 31 days used part full; 16/31 of the 61 days from 16 March: 31 whole days
    expect(last(['2026-03-01', part], ['2026-03-16', smaller])).toBe('2026-04-16');
  });

  it('no change of container brings back a life that is over', () => {
    const full = { kind: 'container-change' as const, container: { ...litreBottle, sizeUl: 700_000 } };
    const part = { ...freshLitre, volumeUl: 700_000 };
    expect(last(['2026-03-01', part], ['2026-04-02', full])).toBe('2026-04-01');
  });

  it('a change to a like container moves nothing', () => {
    const like = {
      kind: 'container-change' as const,
      container: { ...litreBottle, material: 'pet' as const },
    };
    expect(last(['2026-03-01', freshLitre], ['2026-03-20', like])).toBe('2026-05-01');
  });

  it('a clock from first use ends the bottle when it is the earlier', () => {
    const document: ChemistryDocument = {
      ...rapidFixer,
      keeping: [
        ...rapidFixer.keeping,
        { state: 'full', from: 'first-use', keeps: { count: 14, unit: 'days' }, source: 'maker-quoted' },
      ],
    };
    const used = totalsOf(story(['2026-03-01', freshLitre], ['2026-03-10', rolls(1)]), document);
    expect(lastDay(document, used)).toBe('2026-03-24');
    expect(lastDay(document, totalsOf(story(['2026-03-01', freshLitre]), document))).toBe('2026-05-01');
  });

  it('what keeps the day of its mixing ends with that day', () => {
    const document: ChemistryDocument = {
      ...rapidFixer,
      keeping: [{ state: 'full', from: 'mixing', keeps: { count: 0, unit: 'days' }, source: 'maker-quoted' }],
    };
    expect(lastDay(document, totalsOf(story(['2026-03-01', freshLitre]), document))).toBe('2026-03-01');
  });
});

describe('split, combine and adjust', () => {
  it('what is poured into another bottle takes its share along, and combining adds up', () => {
    const out = {
      kind: 'transfer-out' as const,
      volumeUl: 500_000,
      usedE4: { film: 20_000 },
      ceilingE4: { film: 50_000 },
    };
    const split = totalsOf(
      story(
        ['2026-03-01', freshLitre],
        ['2026-03-02', rolls(4)],
        ['2026-03-02', { kind: 'reading', shareE4: { film: 5_000 } }],
        ['2026-03-03', out],
      ),
    );
    expect(split).toMatchObject({
      ratedVolumeUl: 500_000,
      usedE4: { film: 20_000 },
      ceilingE4: { film: 50_000 },
    });
    const combined = totalsOf(
      story(
        ['2026-03-10', { ...freshLitre, volumeUl: 500_000 }],
        [
          '2026-03-12',
          { ...out, kind: 'transfer-in', mixedOn: '2026-03-01', lifeUsed: { num: '1', den: '2' } },
        ],
      ),
    );
    expect(combined).toMatchObject({
      volumeUl: 1_000_000,
      ratedVolumeUl: 1_000_000,
      mixedOn: '2026-03-01',
      usedE4: { film: 20_000 },
      lifeUsed: { num: '1', den: '2' },
      // its own 10 rolls, never tested, and the 5 that the test left of the other
      ceilingE4: { film: 150_000 },
    });
  });

  it('uncounted use counts, and only a raise gives back', () => {
    const base = { kind: 'adjustment' as const, material: 'film' as const, reason: 'silver reading' };
    const facts = story(
      ['2026-03-01', freshLitre],
      ['2026-03-02', { ...base, deltaE4: 30_000, kindOf: 'uncounted-use' }],
      ['2026-03-03', { ...base, deltaE4: 10_000, kindOf: 'raise' }],
    );
    expect(totalsOf(facts).usedE4.film).toBe(20_000);
  });
});

describe('charges and flags', () => {
  const row = { format: '135-36' as const, count: 1 };

  it('names a factor only when the classes share it', () => {
    const mixedLoad = [
      { ...row, filmClass: 'conventional' as const },
      { ...row, filmClass: 'tabular-grain' as const },
    ];
    expect(chargeFor(rapidFixer, mixedLoad, 'film')).toEqual({
      nominalE4: 20_000,
      factorE4: null,
      countedE4: 30_000,
    });
    const unsure = chargeFor(rapidFixer, [{ ...row, filmClass: 'not-sure' }], 'film');
    expect(unsure).toEqual({ nominalE4: 10_000, factorE4: 20_000, countedE4: 20_000 });
  });

  it('flags what was wrong as it stood', () => {
    const ctx = {
      happenedAt: '2026-05-02T10:00:00Z',
      happenedOn: '2026-05-02',
      material: 'rc-paper' as const,
    };
    const bad = totalsOf(
      story(
        ['2026-03-01', freshLitre],
        ['2026-03-02', rolls(20)],
        ['2026-03-03', { kind: 'hold', reason: 'cloudy' }],
        ['2026-03-04', { kind: 'discard' }],
      ),
    );
    const charge = { countedE4: 10_000, takenUl: 2_000_000 };
    expect(flagsFor(rapidFixer, bad, charge, { ...ctx, material: 'film' })).toEqual([
      'over_capacity',
      'past_date',
      'on_hold',
      'after_discard',
      'volume_short',
    ]);
    expect(flagsFor(rapidFixer, bad, charge, ctx)).toContain('wrong_material');
    const fresh = totalsOf(story(['2026-03-01', freshLitre]));
    const today = { ...ctx, happenedOn: '2026-03-01', material: 'film' as const };
    expect(flagsFor(rapidFixer, fresh, { countedE4: 200_000 }, today)).toEqual([]);
  });
});
