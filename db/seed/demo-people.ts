import type { MemberRole } from '../schema/people.js';

export interface DemoPerson {
  key: 'ada' | 'tomas' | 'ines' | 'marek';
  name: string;
  email: string;
  role: MemberRole;
  /** Printed for whoever tries the demo: one sign-in for each role. */
  printed: boolean;
}

/** Invented. The passphrase is the demo's own and printed by npm start: it guards nothing. */
export const demoPassphrase = 'red lamp over the sink';

export const demoPeople: DemoPerson[] = [
  { key: 'ada', name: 'Ada Holm', email: 'ada@harbourlane.example', role: 'manager', printed: true },
  {
    key: 'tomas',
    name: 'Tomas Brehm',
    email: 'tomas@harbourlane.example',
    role: 'technician',
    printed: true,
  },
  { key: 'ines', name: 'Ines Carvalho', email: 'ines@harbourlane.example', role: 'member', printed: true },
  { key: 'marek', name: 'Marek Zielski', email: 'marek@harbourlane.example', role: 'member', printed: false },
];

export const demoDarkroom = {
  shortName: 'harbour-lane',
  name: 'Harbour Lane Darkroom',
  zone: 'Europe/Dublin',
  currency: 'EUR',
  smallestTankUl: 300_000,
};

/** Invented suppliers and what they ask for the starter catalogue's packs (by the pack's name), in cents. */
export const demoSuppliers = [
  {
    key: 'quayside',
    name: 'Quayside Photographic Supply',
    email: 'orders@quayside.example',
    minimumMinor: 3_000,
    leadDays: 6,
    packs: [
      {
        pack: 'Rapid fixer concentrate, 1 L',
        supplierName: 'QPS 4410 rapid fixer conc. 1 L',
        priceMinor: 1_150,
      },
      {
        pack: 'Wetting agent concentrate, 250 mL',
        supplierName: 'QPS 4490 wetting agent 250 mL',
        priceMinor: 780,
      },
      { pack: 'Stop bath SB-5 kit, 5 L', supplierName: 'QPS 4302 stop bath kit 5 L', priceMinor: 990 },
    ],
  },
  {
    key: 'tern',
    name: 'Tern and Daughters',
    email: 'trade@ternanddaughters.example',
    minimumMinor: null,
    leadDays: null,
    packs: [{ pack: 'Rapid fixer concentrate, 1 L', supplierName: 'Fixer, rapid, litre', priceMinor: 1_290 }],
  },
] as const;

export type DemoSupplier = (typeof demoSuppliers)[number]['key'];
