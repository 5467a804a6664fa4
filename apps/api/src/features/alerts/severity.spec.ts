import type { EventKind } from '@wetside/db';
import { byGravity, gravest } from './severity.js';

const events = (...kinds: EventKind[]) => kinds.map((kind) => ({ kind }));
const said = (...kinds: EventKind[]) => gravest(events(...kinds)).map(({ kind }) => kind);

describe('which warning of several is said', () => {
  it('names a past date and a spent bottle together', () => {
    expect(said('low', 'spent', 'past-date', 'on-hold')).toEqual(['past-date', 'spent']);
  });

  it('says a hold before low, and low before near', () => {
    expect(said('near-date', 'low', 'on-hold')).toEqual(['on-hold']);
    expect(said('near-date', 'low')).toEqual(['low']);
  });

  it('says an empty shelf before the reorder point', () => {
    expect(said('reorder-point', 'none-on-shelf')).toEqual(['none-on-shelf']);
  });

  it('says nothing of nothing', () => {
    expect(said()).toEqual([]);
  });

  it('orders the rest by gravity', () => {
    expect(byGravity(events('near-date', 'spent', 'low')).map(({ kind }) => kind)).toEqual([
      'spent',
      'low',
      'near-date',
    ]);
  });
});
