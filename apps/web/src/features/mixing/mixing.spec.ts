import { rapidFixer, stopBathSb5, wettingAgent } from '@wetside/chemistry';
import { describe, expect, it } from 'vitest';
import type { ChemistryView, Lot, ShelfPack } from '../../shared/api/types.js';
import { measureLines, showMeasured } from './measure-words.js';
import { checkSize, checkVolume, fieldOfMix, mixContent, type MixForm } from './mix-form.js';
import { lateWords } from './late-words.js';
import { mixSources } from './mix-sources.js';

const today = '2026-12-01';
const opened = (id: string, partId: string, leftUl: number, openedOn: string) => ({
  id,
  partId,
  partName: partId,
  openedOn,
  leftUl,
  leftMg: null,
});
const lot = (id: string, unopened: number, expiresOn: string | null, packs: Lot['opened'] = []): Lot => ({
  id,
  lotNumber: id.toUpperCase(),
  expiresOn,
  expiryIsGuess: false,
  unopened,
  opened: packs,
});
const pack = (lots: Lot[], parts = ['concentrate']): ShelfPack => ({
  id: 'p-1',
  name: 'Rapid fixer concentrate, 1 L',
  form: 'concentrate',
  reorderPoint: 1,
  reorderUpTo: 2,
  unopened: lots.reduce((sum, one) => sum + one.unopened, 0),
  onOrder: 0,
  advice: { due: false, quantity: 0, reason: '' },
  firstExpiry: null,
  parts: parts.map((id) => ({ id, name: id, sizeUl: 1_000_000, sizeMg: null })),
  makes: [],
  lots,
  soldBy: [],
});
const chemistry = (wholeOnly = false): ChemistryView => ({
  id: 'c-1',
  versionId: 'v-1',
  number: 1,
  document: rapidFixer,
  nextCode: 'FX-02',
  from: [{ packId: 'p-1', packName: 'Rapid fixer', form: 'concentrate', volumeUl: 5_000_000, wholeOnly }],
});
const form: MixForm = {
  chemistryId: 'c-1',
  from: 'hand',
  volumeMl: '600',
  sizeMl: '1000',
  kind: 'bottle',
  material: '',
  when: 'now',
  mixedAt: '',
  note: ' ',
};

describe('where a mix comes from', () => {
  it('offers what is opened first, then lots by their date, then by hand', () => {
    const late = lot('l-late', 1, '2028-04-24');
    const early = lot('l-early', 1, '2028-01-25', [opened('o-1', 'concentrate', 600_000, '2026-10-06')]);
    const sources = mixSources(chemistry(), [pack([late, early])], today);
    expect(sources.map(({ value }) => value)).toEqual(['opened:o-1', 'lot:l-early', 'lot:l-late', 'hand']);
    expect(sources.map(({ maxUl }) => maxUl)).toEqual([3_000_000, 5_000_000, 5_000_000, null]);
    expect(sources[0]?.note).toBe('600 mL left, opened 6 Oct: use first');
  });

  it('offers what has expired last, says since when, and never to use it first', () => {
    const old = lot('l-old', 2, '2020-05-01', [opened('o-1', 'concentrate', 600_000, '2019-10-06')]);
    const sources = mixSources(chemistry(), [pack([old, lot('l-new', 1, '2028-01-25')])], today);
    expect(sources.map(({ value, isPast }) => [value, isPast ?? false])).toEqual([
      ['lot:l-new', false],
      ['opened:o-1', true],
      ['lot:l-old', true],
      ['hand', false],
    ]);
    expect(sources[1]?.note).toBe('600 mL left, opened 6 Oct 2019, expired 1 May 2020');
    expect(sources[2]?.note).toBe('2 on the shelf, expired 1 May 2020');
  });

  it('says what it leaves, and whether that meets the reorder point', () => {
    const [source] = mixSources(chemistry(), [pack([lot('l-1', 2, null)])], today);
    expect(source?.leaves(1_000_000)).toBe(
      '1 on the shelf, which is its reorder point (1): order more and 800 mL in the opened pack',
    );
    const [open] = mixSources(
      chemistry(),
      [pack([lot('l-1', 0, null, [opened('o-1', 'concentrate', 600_000, today)])])],
      today,
    );
    expect(open?.leaves(1_000_000)).toBe('400 mL in the opened pack');
  });

  it('offers an opened kit only when every part of it stands open', () => {
    const partA = opened('a', 'A', 500_000, today);
    const partB = opened('b', 'B', 250_000, today);
    const kit = (packs: Lot['opened']) => pack([lot('l-1', 0, null, packs)], ['A', 'B']);
    expect(mixSources(chemistry(), [kit([partA])], today).map(({ value }) => value)).toEqual(['hand']);
    const [source] = mixSources(chemistry(), [kit([partA, partB])], today);
    expect(source).toMatchObject({ value: 'opened:a,b', maxUl: 1_250_000 });
  });
});

describe('the form of a mix', () => {
  const [source] = mixSources(chemistry(), [pack([lot('l-1', 1, null)])], today);
  const [whole] = mixSources(chemistry(true), [pack([lot('l-1', 1, null)])], today);

  it('says what to do about a volume that will not do', () => {
    expect(checkVolume('5001', chemistry(), source, 'film')).toBe('This makes 5 L; choose 5 L or less.');
    expect(checkVolume('1000', chemistry(true), whole, 'film')).toBe(
      'A powder is mixed whole: this makes 5 L.',
    );
    expect(checkVolume('a litre', chemistry(), source, 'film')).toBe('A whole number of mL, 1 or more.');
    expect(checkVolume('5000', chemistry(), source, 'film')).toBe(true);
    expect(checkSize('500', '600')).toBe('It must hold 600 mL at least.');
  });

  it('records whole microlitres, the material and no empty note', () => {
    expect(source && mixContent(form, 'b-1', chemistry(), source)).toEqual({
      bottleId: 'b-1',
      chemistryVersionId: 'v-1',
      volumeUl: 600_000,
      container: { sizeUl: 1_000_000, kind: 'bottle' },
      material: 'film',
      from: { kind: 'lot', lotId: 'l-1' },
    });
  });

  it('knows which field the server speaks of', () => {
    expect(fieldOfMix('volumeUl', 'invalid')).toBe('volumeMl');
    expect(fieldOfMix('', 'lot-empty')).toBe('from');
    expect(fieldOfMix('', 'volume-over-container')).toBe('sizeMl');
    expect(fieldOfMix('', 'broken')).toBeNull();
  });
});

describe('what is recorded late', () => {
  it('says what would be past its date already, and what is long ago', () => {
    expect(lateWords('2026-11-30', '2026-11-20', today)).toBe('It would be past its date already.');
    expect(lateWords('2026-12-01', '2026-11-01', today)).toBeNull();
    expect(lateWords(null, '2026-10-31', today)).toBe('That is 31 days ago. Is the day right?');
  });
});

describe('what to measure out', () => {
  it('puts the water first and adds up to the volume', () => {
    // 1+4 to 600 mL is 120 mL and 480 mL: arithmetic.
    expect(measureLines(rapidFixer, 'film', 600_000, 'C')).toEqual([
      '480 mL of tap water',
      '120 mL of rapid fixer concentrate',
    ]);
    expect(measureLines(wettingAgent, null, 1_000_000, 'C')[0]).toMatch(/of distilled water$/);
  });

  it('starts a formula with part of its water and fills up at the end', () => {
    const lines = measureLines(stopBathSb5, 'film', 1_000_000, 'C');
    expect(lines[0]).toMatch(/ of tap water.* to start with$/);
    expect(lines.at(-1)).toBe('tap water to make 1 L');
  });

  it('is as fine as a measuring glass', () => {
    expect([4_975, 99_960, 120_000, 999_600, 1_500_000].map(showMeasured)).toEqual([
      '5 mL',
      '100 mL',
      '120 mL',
      '1 L',
      '1.5 L',
    ]);
  });
});
