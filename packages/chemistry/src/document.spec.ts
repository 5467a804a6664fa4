import { rapidFixer, starterCatalogue, stopBathSb5 } from './catalogue/starter-catalogue.js';
import type { ChemistryDocument } from './document.js';
import { ChemistryDocumentError, parseChemistryDocument } from './document-parse.js';
import { chemistryDocumentSchema } from './document-schema.js';
import { faultIn } from './schema.js';

/** Every field that schema 1 knows, filled in. */
const everything: ChemistryDocument = {
  ...rapidFixer,
  useRule: {
    kind: 'percent-per-rolls',
    growthE4: 1_000,
    everyRollsE4: 40_000,
    perLitre: true,
    source: 'capacity-faq',
  },
  timeRows: [
    {
      film: 'a conventional film',
      exposureIndex: 400,
      material: 'film',
      dilution: '1+1',
      agitation: 'rotary',
      temperatureCc: 2_000,
      toleranceCc: 15,
      seconds: 525,
      toSeconds: 600,
      bound: 'at-least',
      source: 'capacity-faq',
    },
  ],
  steps: [{ name: 'wash', seconds: 300, temperatureCc: 2_000, toleranceCc: 300, source: 'capacity-faq' }],
  tests: [
    ...rapidFixer.tests,
    { kind: 'silver', limitMgPerL: 500, material: 'fb-paper', source: 'clip-test' },
    { kind: 'indicator', fresh: 'yellow', turning: 'turning', spent: 'purple', source: 'clip-test' },
    { kind: 'control-strip', what: 'density', source: 'clip-test' },
    { kind: 'control-clip', what: 'a fogged strip', source: 'clip-test' },
  ],
  readyAfter: { seconds: 3_600, why: 'it has to cool', source: 'clip-test' },
  replenishment: { ulPerRoll: 70_000, needsStarter: true, source: 'clip-test' },
  oneShot: {
    leastStockPerRollUl: 100_000,
    workingDilution: { kind: 'plus', parts: [{ name: 'stock', parts: 1 }], water: 1 },
    source: 'clip-test',
  },
};

describe('chemistry documents', () => {
  it.each(starterCatalogue)('$key is one', ({ document }) => {
    expect(faultIn(chemistryDocumentSchema, document)).toBeNull();
    expect(parseChemistryDocument(JSON.parse(JSON.stringify(document)))).toEqual(document);
  });

  it('may fill in every field', () => {
    expect(parseChemistryDocument(everything)).toBe(everything);
  });

  it.each<[string, unknown, string]>([
    ['no object', null, 'the document is no object'],
    ['another schema', { ...rapidFixer, schema: 2 }, '/schema is not 1'],
    ['a misspelt field', { ...rapidFixer, keepings: [] }, '/keepings is not known'],
    ['no name', { ...rapidFixer, name: undefined }, '/name is no string'],
    ['an unknown role', { ...rapidFixer, role: 'soup' }, '/role is none of developer'],
    [
      'half a µL',
      { ...rapidFixer, oneShot: { leastStockPerRollUl: 0.5, source: 'x' } },
      '/oneShot/leastStockPerRollUl',
    ],
    [
      'a capacity without a source',
      { ...rapidFixer, materials: [{ material: 'film', capacity: [{ per: 'litre', rollsE4: 1 }] }] },
      '/materials/0/capacity/0/source is missing',
    ],
    ['a source that is not there', { ...rapidFixer, sources: {} }, 'names no source of the document'],
    [
      'a material twice',
      { ...rapidFixer, materials: [0, 0].map(() => rapidFixer.materials[0]) },
      '/materials/1',
    ],
    [
      'water that strengthens',
      { ...stopBathSb5, dilution: { kind: 'percent', name: 'acid', haveE4: 100, wantE4: 200 } },
      '/dilution/wantE4',
    ],
  ])('says where: %s', (_what, value, where) => {
    expect(() => parseChemistryDocument(value)).toThrow(ChemistryDocumentError);
    expect(() => parseChemistryDocument(value)).toThrow(where);
  });
});
