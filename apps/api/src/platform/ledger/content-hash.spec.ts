import { contentHash } from './content-hash.js';

const content = { v: 1, bottleIds: ['a', 'b'], film: [{ format: '120', count: 2 }], note: null };

describe('the hash of a content', () => {
  it('is the same whatever the order of keys, at every depth', () => {
    const turned = { note: null, film: [{ count: 2, format: '120' }], bottleIds: ['a', 'b'], v: 1 };
    expect(contentHash(turned)).toBe(contentHash(content));
  });

  it.each([
    ['another figure', { ...content, v: 2 }],
    ['a figure as text', { ...content, v: '1' }],
    ['another order of bottles', { ...content, bottleIds: ['b', 'a'] }],
    ['a key more', { ...content, reported: true }],
    ['a key fewer', { v: 1, bottleIds: ['a', 'b'], film: [{ format: '120', count: 2 }] }],
  ])('is another with %s', (_what, other) => {
    expect(contentHash(other)).not.toBe(contentHash(content));
  });

  // Frozen: a program that hashed otherwise would take every action sent again across its upgrade for another one.
  it('never changes', () => {
    expect(contentHash(content)).toBe('2d57d21524d73c23c169a5d54ca57e0755408d191bd28828b299539fc01d629e');
  });
});
