import type { PackForm } from '@wetside/db';

/** A pack that a new darkroom's shelf knows of. Sizes in microlitres or milligrams. */
export interface StarterPack {
  /** The chemistry of the starter catalogue that it makes. */
  makes: string;
  makesUl: number;
  wholeOnly: boolean;
  name: string;
  form: PackForm;
  /** Null where nobody knows: then no expiry is guessed. */
  keepsUnopenedMonths: number | null;
  parts: { name: string; sizeUl?: number; sizeMg?: number; keepsOpenedMonths: number | null }[];
}

/**
 * Generic packs in the sizes of common practice, no source; the darkroom's own come beside them. A rapid fixer's
 * concentrate: 2 years unopened, 6 months opened (second-hand: a Usenet post of 2005 quoting the maker's sheet).
 */
export const starterPacks: StarterPack[] = [
  {
    makes: 'rapid-fixer',
    makesUl: 5_000_000,
    wholeOnly: false,
    name: 'Rapid fixer concentrate, 1 L',
    form: 'concentrate',
    keepsUnopenedMonths: 24,
    parts: [{ name: 'concentrate', sizeUl: 1_000_000, keepsOpenedMonths: 6 }],
  },
  {
    makes: 'stop-bath-sb5',
    makesUl: 5_000_000,
    wholeOnly: false,
    name: 'Stop bath SB-5 kit, 5 L',
    form: 'kit',
    keepsUnopenedMonths: null,
    parts: [
      { name: 'A: acetic acid, 28 %', sizeUl: 160_000, keepsOpenedMonths: null },
      { name: 'B: sodium sulfate, anhydrous', sizeMg: 225_000, keepsOpenedMonths: null },
    ],
  },
  {
    makes: 'wetting-agent',
    makesUl: 50_250_000,
    wholeOnly: false,
    name: 'Wetting agent concentrate, 250 mL',
    form: 'concentrate',
    keepsUnopenedMonths: null,
    parts: [{ name: 'concentrate', sizeUl: 250_000, keepsOpenedMonths: null }],
  },
];
