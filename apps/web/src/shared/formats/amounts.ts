import { roundLeftDown, roundUsedUp } from '@wetside/chemistry';

/** '1 roll', '2 rolls', '1.5 rolls'. */
export const countOf = (count: number | string, one: string, many = `${one}s`): string =>
  `${count} ${String(count) === '1' ? one : many}`;

/** '11 rolls': what is left, rounded down. */
export const rollsLeft = (leftE4: number): string => countOf(roundLeftDown(leftE4), 'roll');

/** '1.5 rolls': what a load counts, rounded up. */
export const rollsUsed = (usedE4: number): string => countOf(roundUsedUp(usedE4), 'roll');

/** 'EUR 84.00'. */
export function showMoney(minor: number | null, currency: string): string {
  if (minor === null) return 'no price known';
  const digits =
    new Intl.NumberFormat('en-GB', { style: 'currency', currency }).resolvedOptions().maximumFractionDigits ??
    2;
  return `${currency} ${(minor / 10 ** digits).toFixed(digits)}`;
}

/** Millilitres, typed as a whole number in plain digits, to microlitres; null when it is none. */
export function ulFromMl(text: string): number | null {
  const ml = /^\d{1,9}$/.test(text.trim()) ? Number(text) : 0;
  return ml > 0 ? ml * 1_000 : null;
}

/** 'FX-01, SB-02 and WT-03'. */
export function listOf(words: readonly string[], joint = 'and'): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} ${joint} ${words.at(-1) ?? ''}`;
}
