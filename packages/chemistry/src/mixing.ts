import { fraction, floor } from './fraction.js';
import { UL_PER_L } from './units.js';

/** How the mix is made. Ratios are 'so many parts and so many of water'; an ambiguous 1:n is never written. */
export type Dilution =
  | { kind: 'ready-to-use' }
  | { kind: 'plus'; parts: { name: string; parts: number }[]; water: number }
  | { kind: 'percent'; name: string; haveE4: number; wantE4: number }
  | { kind: 'packet'; name: string; makesUl: number; startWaterUl?: number; waterCc?: number }
  | {
      kind: 'weighed';
      parts: { name: string; mgPerLitre?: number; ulPerLitre?: number }[];
      startWaterUlPerLitre: number;
      waterCc?: number;
    };

export interface MeasuredPart {
  name: string;
  volumeUl?: number;
  massMg?: number;
  packets?: number;
}

/** What to measure out, in the order to add it, and the water. */
export interface Measured {
  parts: MeasuredPart[];
  /** toMake: fill up to the volume; volumeUl is then that part of it which no liquid fills. */
  water: { volumeUl: number; toMake: boolean; startUl?: number; temperatureCc?: number };
  volumeUl: number;
}

/** A volume that this dilution cannot make. */
export class MixingError extends Error {
  override name = 'MixingError';
}

const nearest = (value: number, num: number, den: number): number =>
  floor(fraction(2n * BigInt(value) * BigInt(num) + BigInt(den), 2n * BigInt(den)));

function share(parts: readonly { name: string; parts: number }[], water: number, volumeUl: number): Measured {
  const total = parts.reduce((sum, part) => sum + part.parts, water);
  const measured = parts.map(({ name, parts: n }) => ({ name, volumeUl: nearest(volumeUl, n, total) }));
  const last = measured.at(-1);
  const poured = measured.reduce((sum, part) => sum + part.volumeUl, 0);
  // With no water in the ratio the last part takes what rounding leaves.
  if (water === 0 && last) last.volumeUl += volumeUl - poured;
  return {
    parts: measured,
    water: { volumeUl: water === 0 ? 0 : volumeUl - poured, toMake: false },
    volumeUl,
  };
}

function packets(dilution: Dilution & { kind: 'packet' }, volumeUl: number): Measured {
  if (volumeUl % dilution.makesUl !== 0) {
    throw new MixingError('a powder packet is mixed whole: choose a volume that whole packets make');
  }
  const count = volumeUl / dilution.makesUl;
  const water: Measured['water'] = { volumeUl, toMake: true };
  if (dilution.startWaterUl !== undefined) water.startUl = dilution.startWaterUl * count;
  if (dilution.waterCc !== undefined) water.temperatureCc = dilution.waterCc;
  return { parts: [{ name: dilution.name, packets: count }], water, volumeUl };
}

function weigh(dilution: Dilution & { kind: 'weighed' }, volumeUl: number): Measured {
  const parts = dilution.parts.map(({ name, mgPerLitre, ulPerLitre }): MeasuredPart => {
    if (mgPerLitre !== undefined) return { name, massMg: nearest(volumeUl, mgPerLitre, UL_PER_L) };
    return { name, volumeUl: nearest(volumeUl, ulPerLitre ?? 0, UL_PER_L) };
  });
  const liquid = parts.reduce((sum, part) => sum + (part.volumeUl ?? 0), 0);
  if (liquid > volumeUl) throw new MixingError('the liquids alone are more than the volume asked for');
  const water: Measured['water'] = {
    volumeUl: volumeUl - liquid,
    toMake: true,
    startUl: nearest(volumeUl, dilution.startWaterUlPerLitre, UL_PER_L),
  };
  if (dilution.waterCc !== undefined) water.temperatureCc = dilution.waterCc;
  return { parts, water, volumeUl };
}

/**
 * What to measure out for so many microlitres: each part to the nearest microlitre or milligram, the remainder
 * into the water, so that the volumes add up exactly. Throws MixingError where the dilution cannot make it.
 */
export function measureOut(dilution: Dilution, volumeUl: number): Measured {
  if (!Number.isSafeInteger(volumeUl) || volumeUl <= 0) {
    throw new MixingError('a mix has a volume above zero, in whole microlitres');
  }
  switch (dilution.kind) {
    case 'ready-to-use':
      return {
        parts: [{ name: 'ready to use', volumeUl }],
        water: { volumeUl: 0, toMake: false },
        volumeUl,
      };
    case 'plus':
      return share(dilution.parts, dilution.water, volumeUl);
    case 'percent': {
      const { name, haveE4, wantE4 } = dilution;
      if (wantE4 > haveE4) throw new MixingError('water cannot make a solution stronger');
      return share([{ name, parts: wantE4 }], haveE4 - wantE4, volumeUl);
    }
    case 'packet':
      return packets(dilution, volumeUl);
    case 'weighed':
      return weigh(dilution, volumeUl);
  }
}

/** '1+4', '1+1+8', 'ready to use', …: the ratio as it is printed on a label. */
export function showDilution(dilution: Dilution): string {
  switch (dilution.kind) {
    case 'ready-to-use':
      return 'ready to use';
    case 'plus': {
      const ratio = dilution.parts.map((part) => part.parts);
      return (dilution.water === 0 ? ratio : [...ratio, dilution.water]).join('+');
    }
    case 'percent':
      return `${dilution.haveE4 / 100} % to ${dilution.wantE4 / 100} %`;
    case 'packet':
      return `whole packet to ${dilution.makesUl / UL_PER_L} L`;
    case 'weighed':
      return 'by weight, water to make the volume';
  }
}
