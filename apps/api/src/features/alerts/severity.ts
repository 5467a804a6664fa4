import type { EventKind } from '@wetside/db';

/** Of several about one subject only the gravest is said. Equal ranks are said together. */
const RANKS: Record<EventKind, number> = {
  'past-date': 0,
  spent: 0,
  'on-hold': 1,
  low: 2,
  'near-date': 3,
  'test-due': 4,
  'load-to-decide': 0,
  'none-on-shelf': 0,
  'reorder-point': 1,
  'kit-past-expiry': 2,
  'kit-near-expiry': 3,
};

/** Drawn as an octagon: nobody should load that bottle. */
export const closes = (kind: EventKind): boolean =>
  kind === 'past-date' || kind === 'spent' || kind === 'on-hold';

/** Gravest first; a date that is past stands before what is used up. */
export function byGravity<T extends { kind: EventKind }>(open: readonly T[]): T[] {
  return [...open].sort((a, b) => RANKS[a.kind] - RANKS[b.kind] || (a.kind < b.kind ? -1 : 1));
}

/** Those of the gravest rank: one row and one mail say them. */
export function gravest<T extends { kind: EventKind }>(open: readonly T[]): T[] {
  const [first] = byGravity(open);
  return first ? byGravity(open).filter(({ kind }) => RANKS[kind] === RANKS[first.kind]) : [];
}
