import { expect, it } from 'vitest';
import { isolateNames } from './isolate-names.js';

it('isolates a name that is written from right to left, wherever it stands, and nothing else', () => {
  const answer = {
    bottle: { code: 'FX-01', holdBy: 'מרים', totals: { hold: { reason: 'מעונן' } }, at: null },
    people: [{ displayName: 'Tomas 🎞' }, { displayName: 'نور' }],
    load: { by: 'مريم', count: 2 },
  };
  expect(isolateNames(answer)).toEqual({
    bottle: { code: 'FX-01', holdBy: '\u2068מרים\u2069', totals: { hold: { reason: 'מעונן' } }, at: null },
    people: [{ displayName: 'Tomas 🎞' }, { displayName: '\u2068نور\u2069' }],
    load: { by: '\u2068مريم\u2069', count: 2 },
  });
});
