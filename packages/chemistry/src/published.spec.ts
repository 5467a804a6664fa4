import { assess } from './assess.js';
import { defaultThresholds } from './assess-types.js';
import { rapidFixer, stopBathSb5 } from './catalogue/starter-catalogue.js';
import { chargeFor } from './charge.js';
import { clipShareE4 } from './clip-test.js';
import type { Container } from './container.js';
import type { ChemistryDocument } from './document.js';
import { rollsE4 } from './film.js';
import { addDuration, lastDay } from './keeping.js';
import { fold } from './fold.js';
import type { BottleFact } from './ledger.js';
import { measureOut } from './mixing.js';
import { ratedE4 } from './rated.js';
import { celsiusCc, E4, fluidOunces, litres, millilitres, ROLL_CM2, rollsOfArea } from './units.js';

const full: Container = { sizeUl: litres(1), kind: 'bottle', material: 'glass' };
const mixed = (container: Container = full, volumeUl = litres(1), on = '2026-03-01'): BottleFact => ({
  kind: 'mix',
  actionId: 'mix',
  seq: 1,
  happenedAt: `${on}T10:00:00Z`,
  happenedOn: on,
  volumeUl,
  container,
  material: 'film',
});

function lastDayOf(document: ChemistryDocument, ...facts: BottleFact[]): string | null {
  const totals = fold(document, facts);
  return totals && lastDay(document, totals);
}

describe('film as area', () => {
  it('one roll is 80 in², 516.128 cm²', () => {
    // published: Anchell, The Darkroom Cookbook, 3rd ed. 2008, p. 108; 1 in = 2.54 cm by definition
    expect(Math.abs(80 * 2.54 * 2.54 - ROLL_CM2)).toBeLessThan(0.001);
    expect(rollsOfArea(516.128)).toBe(1);
  });

  it.each([
    // second-hand: Tyrrell, Analogue Photography FAQ, 'Fixer capacity'
    ['135-36', 1],
    ['120', 1],
    ['220', 2],
    ['4x5', 0.25],
    ['8x10', 1],
    // ratio of area
    ['5x7', 0.4375],
    ['11x14', 1.925],
  ] as const)('%s is %d roll', (format, rolls) => {
    expect(rollsE4(format, 1)).toBe(rolls * E4);
  });

  it('adds up a mixed load to 19.625 rolls', () => {
    // arithmetic on the rows above
    const row = { filmClass: 'conventional' as const };
    const films = [
      { ...row, format: '135-36' as const, count: 1 },
      { ...row, format: '120' as const, count: 2 },
      { ...row, format: '4x5' as const, count: 12 },
      { ...row, format: '8x10' as const, count: 4 },
      { ...row, format: '11x14' as const, count: 5 },
    ];
    expect(chargeFor(rapidFixer, films, 'film').countedE4).toBe(196_250);
  });

  it.each([
    // second-hand: encyclopaedia, '120 film' (standard: ISO 732); 61 mm wide, 760 to 840 mm long
    [61, 760, 464],
    [61, 840, 512],
  ])('%d × %d mm is %d cm², within 1 cm²', (widthMm, heightMm, cm2) => {
    expect(Math.abs((rollsE4({ widthMm, heightMm }, 1) / E4) * ROLL_CM2 - cm2)).toBeLessThan(1);
  });

  it('a sheet of 8 × 10 inches by its millimetres is the 8×10 of the table', () => {
    // definition: 203.2 × 254 mm
    expect(rollsE4({ widthMm: 203.2, heightMm: 254 }, 1)).toBe(E4);
  });
});

describe('capacity and tests', () => {
  const per = (rolls: number, source: string): ChemistryDocument => ({
    ...rapidFixer,
    materials: [{ material: 'film', capacity: [{ per: 'litre', rollsE4: rolls * E4, source }] }],
  });

  it('an acid fixer of unknown capacity: 20 rolls a litre, 80 in 4 L; an alkaline one 25', () => {
    // published: Anchell, p. 108
    expect(ratedE4(per(20, 'oldest-to-keep'), 'film', litres(4))).toBe(80 * E4);
    expect(ratedE4(per(25, 'oldest-to-keep'), 'film', litres(1))).toBe(25 * E4);
  });

  it('stop bath SB-5: 12 rolls a litre, 600 mL are 7.2, so 7 whole rolls', () => {
    // published: Anchell, p. 268
    expect(ratedE4(stopBathSb5, 'film', litres(1))).toBe(12 * E4);
    const rated = ratedE4(stopBathSb5, 'film', millilitres(600));
    expect(rated).toBe(72_000);
    expect(Math.floor((rated ?? 0) / E4)).toBe(7);
  });

  it('print fixer: 200 8×10 prints a US gallon are 52.8 a litre', () => {
    // second-hand: US Navy NAVEDTRA 14209, ch. 10; 1 US gallon = 128 fl oz
    const gallon: ChemistryDocument = {
      ...rapidFixer,
      materials: [
        {
          material: 'fb-paper',
          capacity: [{ per: 'bottle', rollsE4: 200 * E4, bottleUl: fluidOunces(128), source: 'clip-test' }],
        },
      ],
    };
    expect(Math.floor((ratedE4(gallon, 'fb-paper', litres(1)) ?? 0) / 1_000)).toBe(528);
  });

  it('rapid fixer 1+4: 20 rolls a litre; after 13 rolls 7 are left, 35 %', () => {
    // second-hand: Tyrrell FAQ
    const thirteen: BottleFact = {
      kind: 'load',
      actionId: 'load',
      seq: 2,
      happenedAt: '2026-03-02T10:00:00Z',
      happenedOn: '2026-03-02',
      charges: [{ material: 'film', countedE4: rollsE4('135-36', 13), takenUl: 0 }],
    };
    const totals = fold(rapidFixer, [mixed(), thirteen]);
    expect(totals).not.toBeNull();
    if (!totals) return;
    const found = assess(rapidFixer, totals, {
      now: '2026-03-02T12:00:00Z',
      today: '2026-03-02',
      zone: 'UTC',
      smallestTankUl: null,
      thresholds: defaultThresholds,
    });
    expect(found.ratedE4.film).toBe(20 * E4);
    expect(found.leftE4.film).toBe(7 * E4);
    expect(found.limits.find((limit) => limit.kind === 'capacity')?.shareLeftE4).toBe(3_500);
    expect(found.sentence).toBe('7 rolls left, to 1 May');
  });

  it('tabular-grain film alone gets 10 of the 20 rolls, the safe end of 10 to 14', () => {
    // second-hand: Tyrrell FAQ, 50 to 70 % of the capacity
    const ten = [{ format: '135-36' as const, count: 10, filmClass: 'tabular-grain' as const }];
    expect(chargeFor(rapidFixer, ten, 'film')).toEqual({
      nominalE4: 10 * E4,
      factorE4: 20_000,
      countedE4: 20 * E4,
    });
  });

  it('clearing fresh in 45 s: nothing is lost at 45 s, two thirds are left at 60 s, spent at 90 s', () => {
    // second-hand: Tyrrell FAQ; NAVEDTRA 14209: spent at twice fresh. The share between is 2 − clearing ÷ fresh.
    expect([45, 60, 90, 120].map((seconds) => clipShareE4(seconds, 45))).toEqual([10_000, 6_666, 0, 0]);
  });
});

describe('keeping', () => {
  /** As a darkroom holds it that has that sheet for its own product. */
  const quoted: ChemistryDocument = {
    ...rapidFixer,
    keeping: rapidFixer.keeping.map((figure) => ({
      ...figure,
      sheetInHand: figure.source === 'maker-quoted',
    })),
  };

  it.each([
    // second-hand: a Usenet post of 2005 quoting the maker's sheet
    ['full', full, litres(1), '2026-09-01'],
    ['floating lid', { ...full, kind: 'floating-lid' } as const, litres(1), '2026-05-01'],
    ['part full', full, millilitres(600), '2026-04-01'],
    ['open tray', { ...full, kind: 'tray' } as const, litres(1), '2026-03-08'],
  ])('rapid fixer mixed 2026-03-01, %s: %#', (_state, container, volumeUl, expected) => {
    expect(lastDayOf(quoted, mixed(container, volumeUl))).toBe(expected);
  });

  it('with both figures held and no sheet in hand the shorter one counts: 2 months', () => {
    // published: Anchell, p. 108: working fixer, oldest to keep
    expect(lastDayOf(rapidFixer, mixed())).toBe('2026-05-01');
  });

  it('the concentrate: unopened 2 years, opened 6 months', () => {
    // second-hand: the same Usenet post
    const [unopened, opened] = rapidFixer.concentrateKeeping;
    expect(unopened && addDuration('2026-03-01', unopened.keeps)).toBe('2028-03-01');
    expect(opened && addDuration('2026-03-01', opened.keeps)).toBe('2026-09-01');
  });

  it.each([
    // calendar months, clamped to the month's end
    ['2026-01-31', '2026-02-28'],
    ['2028-01-31', '2028-02-29'],
  ])('mixed on %s, keeps 1 month: %s', (on, expected) => {
    expect(lastDayOf(rapidFixer, mixed(full, millilitres(600), on))).toBe(expected);
  });

  it('a life half used in one state is half used in the next', () => {
    // 1 − Σ days in state ÷ keeping days of that state, by hand: 92 of 184 days full, then 15 of 30 days part full
    const poured: BottleFact = {
      kind: 'container-change',
      actionId: 'pour',
      seq: 2,
      happenedAt: '2026-06-01T10:00:00Z',
      happenedOn: '2026-06-01',
      container: { ...full, sizeUl: litres(2) },
    };
    expect(lastDayOf(quoted, mixed(), poured)).toBe('2026-06-16');
  });
});

describe('temperature', () => {
  it.each([
    // definition: (°F − 32) × 5 ÷ 9
    [65, 1_833],
    [68, 2_000],
    [70, 2_111],
    [72, 2_222],
    [75, 2_389],
    [80, 2_667],
    [85, 2_944],
    [100, 3_778],
  ])('%d °F is %d hundredths of a °C', (fahrenheit, cc) => {
    expect(celsiusCc(fahrenheit * 100)).toBe(cc);
  });
});

describe('mixing', () => {
  const onePlus = (water: number, ul: number): number | undefined =>
    measureOut({ kind: 'plus', parts: [{ name: 'concentrate', parts: 1 }], water }, ul).parts[0]?.volumeUl;

  it('1+200 to 1 L is 4.975 mL and 995.025; one part in 200 is 5.000 and 995', () => {
    // definition
    const agent = [{ name: 'concentrate', parts: 1 }];
    const plus = measureOut({ kind: 'plus', parts: agent, water: 200 }, litres(1));
    expect([plus.parts[0]?.volumeUl, plus.water.volumeUl]).toEqual([4_975, 995_025]);
    const inTwoHundred = measureOut({ kind: 'plus', parts: agent, water: 199 }, litres(1));
    expect([inTwoHundred.parts[0]?.volumeUl, inTwoHundred.water.volumeUl]).toEqual([5_000, 995_000]);
  });

  it.each([
    // definition
    [4, 1_000, 200],
    [9, 1_000, 100],
    [19, 1_000, 50],
    [31, 600, 18.75],
    [1, 500, 250],
  ])('1+%d to %d mL takes %d mL', (water, ml, expected) => {
    expect(onePlus(water, millilitres(ml))).toBe(expected * 1_000);
  });

  it('28 % acid to 1 % is 1 + 27', () => {
    // second-hand: a percent-dilution note (criss-cross)
    const acid = measureOut(
      { kind: 'percent', name: 'acetic acid, 28 %', haveE4: 2_800, wantE4: 100 },
      millilitres(28),
    );
    expect([acid.parts[0]?.volumeUl, acid.water.volumeUl]).toEqual([millilitres(1), millilitres(27)]);
  });

  it('SB-5 takes 32 mL of 28 % acid a litre, which is 0.896 %', () => {
    // published: Anchell, p. 268
    const acid = measureOut(stopBathSb5.dilution, litres(1)).parts[0]?.volumeUl ?? 0;
    expect(acid).toBe(millilitres(32));
    expect((acid * 28) / litres(1)).toBeCloseTo(0.896, 12);
  });

  it('240 g of crystalline hypo as anhydrous at 64 % is 153.6 g', () => {
    // published: Anchell, p. 268; 20 g/L: two-percent sulfite wash aid, second-hand
    const weighed = { kind: 'weighed' as const, startWaterUlPerLitre: 500_000 };
    const hypo = measureOut({ ...weighed, parts: [{ name: 'hypo', mgPerLitre: 240_000 * 0.64 }] }, litres(1));
    expect(hypo.parts[0]?.massMg).toBe(153_600);
    const aid = measureOut({ ...weighed, parts: [{ name: 'sulfite', mgPerLitre: 20_000 }] }, litres(2));
    expect(aid.parts[0]?.massMg).toBe(40_000);
  });

  it('3 % of a US gallon is 3.84 fl oz', () => {
    // second-hand: US Army subcourse SS0514
    expect(fluidOunces(128 * 0.03)).toBe(fluidOunces(3.84));
  });
});
