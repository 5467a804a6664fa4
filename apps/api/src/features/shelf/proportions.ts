/** One part of a pack: how much a whole one holds, in µL or in mg. */
export interface PartSize {
  packPartId: string;
  sizeUl: number | null;
  sizeMg: number | null;
}

/** An amount of a part: µL of a liquid, or mg of a powder. */
export type Amount = { volumeUl: number } | { massMg: number };

export const figureOf = (amount: Amount): number => ('volumeUl' in amount ? amount.volumeUl : amount.massMg);

/** The same kind of amount with another figure. */
export const withFigure = (like: Amount, figure: number): Amount =>
  'volumeUl' in like ? { volumeUl: figure } : { massMg: figure };

/** Exact in whole numbers that pass 2^53 on the way. */
function proportion(value: number, num: number, den: number, addend: bigint): number {
  return Number((BigInt(value) * BigInt(num) + addend) / BigInt(den));
}

/** What a whole pack holds of that part. Throws RangeError for a part with no size. */
export function wholePart({ sizeUl, sizeMg }: PartSize): Amount {
  if (sizeUl !== null) return { volumeUl: sizeUl };
  if (sizeMg !== null) return { massMg: sizeMg };
  throw new RangeError('a part holds mL or g');
}

/**
 * What to take of a part for `makeUl` of the solution that a whole pack makes `packMakesUl` of: all parts in proportion,
 * exact where it divides, otherwise rounded up once, so that the mix is never short of one part.
 */
export function takenOf(part: PartSize, makeUl: number, packMakesUl: number): Amount {
  const whole = wholePart(part);
  return withFigure(whole, proportion(figureOf(whole), makeUl, packMakesUl, BigInt(packMakesUl) - 1n));
}

/** A pack's price for the share of it that was used, to the nearest minor unit, halves up. */
export function costShare(priceMinor: number, makeUl: number, packMakesUl: number): number {
  return proportion(2 * priceMinor, makeUl, 2 * packMakesUl, BigInt(packMakesUl));
}
