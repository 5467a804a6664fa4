import type { ChemistryDocument } from '../document.js';

/** Counted and dated like every bottle, and never the reason that a line closes. */
export const wettingAgent: ChemistryDocument = {
  schema: 1,
  name: 'Wetting agent 1+200',
  role: 'wetting-agent',
  processes: ['black-and-white'],
  use: 're-used',
  dilution: { kind: 'plus', parts: [{ name: 'wetting agent concentrate', parts: 1 }], water: 200 },
  dilutionSources: [{ source: 'custom', note: '1 mL to 200 mL' }],
  water: 'distilled',
  materials: [{ material: 'film', capacity: [] }],
  filmFactors: [],
  timeRows: [],
  keeping: [{ state: 'full', from: 'mixing', keeps: { count: 7, unit: 'days' }, source: 'keeping-memory' }],
  concentrateKeeping: [],
  tests: [],
  parts: [{ name: 'wetting agent concentrate', form: 'liquid', divisible: true }],
  cheapToRenew: true,
  cautions: ["Rinse splashes. The supplier's safety data sheet goes before anything said here."],
  hazardNote:
    "Hazard statements differ between suppliers: type them in from the supplier's safety data sheet.",
  waste: { route: 'other', note: "By the supplier's safety data sheet and the local sewer authority." },
  sources: {
    custom: { kind: 'common-practice', text: 'common practice, no source' },
    'keeping-memory': { kind: 'memory', text: 'from memory, check your own data sheet' },
  },
};
