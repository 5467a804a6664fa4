import type { ChemistryDocument } from '../document.js';

/** Every figure names where it was read; none of them belongs to a product. */
export const rapidFixer: ChemistryDocument = {
  schema: 1,
  name: 'Rapid fixer 1+4, film',
  role: 'fixer',
  processes: ['black-and-white'],
  use: 're-used',
  dilution: { kind: 'plus', parts: [{ name: 'rapid fixer concentrate', parts: 1 }], water: 4 },
  dilutionSources: [{ source: 'capacity-faq' }],
  water: 'tap',
  materials: [{ material: 'film', capacity: [{ per: 'litre', rollsE4: 200_000, source: 'capacity-faq' }] }],
  filmFactors: [
    {
      filmClass: 'tabular-grain',
      factorE4: 20_000,
      source: 'capacity-faq',
      note: '1.4 to 2 times as fast; the greater counts',
    },
  ],
  timeRows: [],
  keeping: [
    { state: 'full', from: 'mixing', keeps: { count: 2, unit: 'months' }, source: 'oldest-to-keep' },
    { state: 'full', from: 'mixing', keeps: { count: 6, unit: 'months' }, source: 'maker-quoted' },
    { state: 'floating-lid', from: 'mixing', keeps: { count: 2, unit: 'months' }, source: 'maker-quoted' },
    { state: 'part-full', from: 'mixing', keeps: { count: 1, unit: 'months' }, source: 'maker-quoted' },
    { state: 'open-tray', from: 'mixing', keeps: { count: 7, unit: 'days' }, source: 'maker-quoted' },
  ],
  keepingNote: 'Less above 29 °C (85 °F).',
  concentrateKeeping: [
    { opened: false, keeps: { count: 24, unit: 'months' }, source: 'maker-quoted' },
    { opened: true, keeps: { count: 6, unit: 'months' }, source: 'maker-quoted' },
  ],
  tests: [
    { kind: 'clip', spentAtFactorE4: 20_000, toleranceCc: 100, source: 'clip-test' },
    {
      kind: 'iodide',
      method: '10.0 mL of 4 to 5 % potassium iodide in 100.0 mL of fixer: a precipitate means spent',
      source: 'oldest-to-keep',
    },
  ],
  endsAtOnce: ['It has turned yellow.', 'It has a white deposit.', 'It smells of sulfur.'],
  parts: [{ name: 'rapid fixer concentrate', form: 'liquid', divisible: true }],
  cheapToRenew: false,
  cautions: [
    'Wear gloves and eye protection, and keep the room aired.',
    'Never mix with strong acid: it gives off sulfur dioxide.',
    'Never mix with strong alkali: ammonium fixer gives off ammonia.',
    "The supplier's safety data sheet goes before anything said here.",
  ],
  hazardNote:
    "Hazard statements differ between suppliers: type them in from the supplier's safety data sheet.",
  waste: {
    route: 'fixer-silver',
    note: 'It holds silver. Keep it apart, for recovery or collection, as the local sewer authority says.',
  },
  sources: {
    'capacity-faq': { kind: 'second-hand', text: "Tyrrell, Analogue Photography FAQ, 'Fixer capacity'" },
    'oldest-to-keep': { kind: 'published', text: 'Anchell, The Darkroom Cookbook, 3rd ed. 2008, p. 108' },
    'maker-quoted': { kind: 'second-hand', text: "a Usenet post of 2005 quoting the maker's sheet" },
    'clip-test': { kind: 'second-hand', text: 'Tyrrell, Analogue Photography FAQ; NAVEDTRA 14209' },
  },
};
