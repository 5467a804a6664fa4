import { isFromOwnPages } from './cross-site.guard.js';

const OWN = 'https://darkroom.example';
const from = (method: string, site?: string, origin?: string) =>
  isFromOwnPages({ method, site, origin }, OWN);

describe('where a request comes from', () => {
  it('does not matter to one that only reads', () => {
    expect(from('GET', 'cross-site')).toBe(true);
  });

  it.each(['cross-site', 'same-site', 'none', ''])('refuses a change from %p', (site) => {
    expect(from('POST', site, OWN)).toBe(false);
  });

  it('takes a change from the own pages', () => {
    expect(from('PUT', 'same-origin')).toBe(true);
    expect(from('DELETE', undefined, OWN)).toBe(true);
  });

  it('refuses another origin, and one that says nothing', () => {
    expect(from('POST', undefined, 'https://elsewhere.example')).toBe(false);
    expect(from('POST', undefined, 'null')).toBe(false);
    expect(from('POST')).toBe(false);
  });
});
