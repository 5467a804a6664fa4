import { matchRoutes } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { routes } from '../router.js';
import { phoneTabs, railPlaces } from './places.js';

const isBuilt = (address: string): boolean =>
  matchRoutes(routes, address)?.every(({ route }) => route.path !== '*') ?? false;

describe('the way about', () => {
  it('leads only to what is built', () => {
    expect(isBuilt('/d/harbour/no-such-page')).toBe(false);
    for (const role of ['member', 'technician', 'manager'] as const) {
      const addresses = [...railPlaces(role), ...phoneTabs(role)].map(({ to }) => to('harbour'));
      expect(addresses.filter((address) => !isBuilt(address))).toEqual([]);
    }
  });

  it('is the sink alone for a member', () => {
    expect(railPlaces('member').map(({ words }) => words)).toEqual(['Sink']);
  });
});
