/** A seeded source of chance: the same seed gives the same history on every machine. */
export interface Chance {
  /** A whole number from low to high, both included. */
  between(low: number, high: number): number;
  /** True so many times in a hundred. */
  percent(share: number): boolean;
  pick<T>(from: readonly [T, ...T[]]): T;
  pickAny<T>(from: readonly T[]): T | undefined;
}

export function chance(seed: number): Chance {
  let state = seed >>> 0;
  const next = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
  const between = (low: number, high: number): number => low + Math.floor(next() * (high - low + 1));
  return {
    between,
    percent: (share) => next() * 100 < share,
    pick: (from) => from[between(0, from.length - 1)] ?? from[0],
    pickAny: (from) => from[between(0, from.length - 1)],
  };
}

/** An id of UUID version 7's shape: 48 bits of time, the rest by chance. */
export function seededId(atMs: number, by: Chance): string {
  const time = atMs.toString(16).padStart(12, '0');
  const hex = (digits: number): string =>
    Array.from({ length: digits }, () => by.between(0, 15).toString(16)).join('');
  const variant = by.pick(['8', '9', 'a', 'b']);
  return `${time.slice(0, 8)}-${time.slice(8)}-7${hex(3)}-${variant}${hex(3)}-${hex(12)}`;
}
