import { expect, it } from 'vitest';
import type { Lot } from '../../shared/api/types.js';
import { expiryWords, lotToUseFirst } from './lot-expiry.js';

const today = '2026-12-01';
const lot = (id: string, expiresOn: string | null, unopened = 1): Lot => ({
  id,
  lotNumber: id,
  expiresOn,
  expiryIsGuess: false,
  unopened,
  opened: [],
});

it('never says to use an expired or an empty lot first', () => {
  const expired = lot('old', '2020-05-01');
  const empty = lot('empty', '2026-12-01', 0);
  const soon = lot('soon', '2027-01-25');
  const late = lot('late', '2028-04-24');
  expect(lotToUseFirst([late, expired, empty, soon], today)).toBe(soon);
  expect(lotToUseFirst([expired, late], today)).toBeNull();
  expect(expiryWords(expired, today)).toBe('expired 1 May 2020');
});

it('lets a lot serve on the day it expires', () => {
  const last = lot('last', today);
  expect(lotToUseFirst([lot('late', null), last], today)).toBe(last);
});
