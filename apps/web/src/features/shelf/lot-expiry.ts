import { showDate, type LocalDate } from '@wetside/chemistry';
import type { Lot } from '../../shared/api/types.js';

/** The day it expires is still a day of its life. */
export const isExpired = ({ expiresOn }: Pick<Lot, 'expiresOn'>, today: LocalDate): boolean =>
  expiresOn !== null && expiresOn < today;

/** 'expires 24 Apr 2028', 'expired 1 May 2020 (a guess)'. */
export function expiryWords({ expiresOn, expiryIsGuess }: Lot, today: LocalDate): string {
  if (!expiresOn) return 'no expiry date known';
  const verb = expiresOn < today ? 'expired' : 'expires';
  return `${verb} ${showDate(expiresOn, today)}${expiryIsGuess ? ' (a guess)' : ''}`;
}

export const byExpiry = (a: Lot, b: Lot): number =>
  (a.expiresOn ?? '9999').localeCompare(b.expiresOn ?? '9999');

/** The lot to use before the others: the first to expire of several that can be used; an expired one never is. */
export function lotToUseFirst(lots: readonly Lot[], today: LocalDate): Lot | null {
  const usable = lots.filter((lot) => (lot.unopened > 0 || lot.opened.length > 0) && !isExpired(lot, today));
  return usable.length > 1 ? ([...usable].sort(byExpiry)[0] ?? null) : null;
}
