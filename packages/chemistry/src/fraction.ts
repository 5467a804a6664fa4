/** An exact fraction in whole-number text, as it is stored. The denominator is positive. */
export interface FractionText {
  num: string;
  den: string;
}

/** An exact fraction to reckon with: no rounding happens until somebody asks for it. */
export interface Fraction {
  num: bigint;
  den: bigint;
}

function gcd(a: bigint, b: bigint): bigint {
  let [x, y] = [a < 0n ? -a : a, b];
  while (y !== 0n) [x, y] = [y, x % y];
  return x;
}

/** num/den in lowest terms. Throws RangeError unless den is above zero. */
export function fraction(num: bigint | number, den: bigint | number = 1n): Fraction {
  const [n, d] = [BigInt(num), BigInt(den)];
  if (d <= 0n) throw new RangeError('a fraction needs a denominator above zero');
  const common = gcd(n, d) || 1n;
  return { num: n / common, den: d / common };
}

export const zero: Fraction = { num: 0n, den: 1n };
export const one: Fraction = { num: 1n, den: 1n };

export const plus = (a: Fraction, b: Fraction): Fraction =>
  fraction(a.num * b.den + b.num * a.den, a.den * b.den);

export const minus = (a: Fraction, b: Fraction): Fraction =>
  fraction(a.num * b.den - b.num * a.den, a.den * b.den);

export const times = (a: Fraction, b: Fraction): Fraction => fraction(a.num * b.num, a.den * b.den);

/** Negative, zero or positive as a is below, equal to or above b. */
export function compare(a: Fraction, b: Fraction): number {
  const difference = a.num * b.den - b.num * a.den;
  return difference < 0n ? -1 : difference > 0n ? 1 : 0;
}

/** The greatest whole number not above the fraction. */
export function floor(a: Fraction): number {
  const quotient = a.num / a.den;
  return Number(a.num < 0n && quotient * a.den !== a.num ? quotient - 1n : quotient);
}

/** The least whole number not below the fraction. */
export const ceil = (a: Fraction): number => -floor({ num: -a.num, den: a.den });

export const toText = (a: Fraction): FractionText => ({
  num: a.num.toString(),
  den: a.den.toString(),
});

export const fromText = (a: FractionText): Fraction => fraction(BigInt(a.num), BigInt(a.den));

/** floor(value × num ÷ den) in whole numbers that may pass 2^53 on the way. */
export const scaleDown = (value: number, num: number, den: number): number =>
  floor(fraction(BigInt(value) * BigInt(num), den));

/** ceil(value × num ÷ den) in whole numbers that may pass 2^53 on the way. */
export const scaleUp = (value: number, num: number, den: number): number =>
  ceil(fraction(BigInt(value) * BigInt(num), den));
