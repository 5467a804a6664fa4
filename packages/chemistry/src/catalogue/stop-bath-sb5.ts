import type { ChemistryDocument } from '../document.js';

/** The published formula SB-5. No keeping time was found for it, so none is given. */
export const stopBathSb5: ChemistryDocument = {
  schema: 1,
  name: 'Stop bath SB-5',
  role: 'stop-bath',
  processes: ['black-and-white'],
  use: 're-used',
  dilution: {
    kind: 'weighed',
    startWaterUlPerLitre: 500_000,
    parts: [
      { name: 'acetic acid, 28 %', ulPerLitre: 32_000 },
      { name: 'sodium sulfate, anhydrous', mgPerLitre: 45_000 },
    ],
  },
  dilutionSources: [
    { source: 'formula', note: '32 mL of 28 % acid in 1 L' },
    { source: 'memory', note: '45 g of sodium sulfate' },
  ],
  water: 'tap',
  materials: [{ material: 'film', capacity: [{ per: 'litre', rollsE4: 120_000, source: 'formula' }] }],
  filmFactors: [],
  timeRows: [],
  keeping: [],
  keepingNote: 'Keeping time not known. Usable up to 27 °C.',
  concentrateKeeping: [],
  tests: [{ kind: 'ph', spentAboveE2: 550, source: 'memory' }],
  parts: [
    { name: 'acetic acid, 28 %', form: 'liquid', divisible: true },
    { name: 'sodium sulfate, anhydrous', form: 'single-chemical', divisible: true },
  ],
  cheapToRenew: true,
  cautions: [
    'Acid into water, never the reverse.',
    'Wear gloves and eye protection, and keep the room aired.',
    'Keep it away from fixer beyond what film carries over: together they give off sulfur dioxide.',
    "The supplier's safety data sheet goes before anything said here.",
  ],
  hazardNote: "Hazard statements depend on the acid's strength: type them in from its safety data sheet.",
  waste: { route: 'stop-and-acids', note: 'Keep it apart from fixer. The local sewer authority decides.' },
  sources: {
    formula: { kind: 'published', text: 'Anchell, The Darkroom Cookbook, 3rd ed. 2008, p. 268' },
    memory: { kind: 'memory', text: 'from memory, check your own data sheet' },
  },
};
