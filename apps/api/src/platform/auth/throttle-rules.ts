/** Wrong tries that cost nothing: everybody mistypes. */
export const FREE_TRIES = 3;
/** The longest anybody is made to wait: a delay, never a lock. */
export const LONGEST_DELAY_S = 15 * 60;
/** After so long without a wrong try the count of them begins anew. */
export const PERSON_MEMORY_S = 86_400;
/** Failures from one network address in one window; a whole class may sit behind one router. */
export const ADDRESS_FAILURES = 30;
export const ADDRESS_WINDOW_S = 15 * 60;

/** Seconds to wait after so many failures in a row: none for the first three, then 1, 2, 4, … up to a quarter of an hour. */
export function delayS(failures: number): number {
  if (failures < FREE_TRIES) return 0;
  return Math.min(2 ** (failures - FREE_TRIES), LONGEST_DELAY_S);
}

/**
 * What is counted as one network address: an IPv4 address, or the 64 bits of an IPv6 address that one household or one
 * server is given as a whole.
 */
export function networkOf(address: string): string {
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(address);
  if (mapped?.[1]) return mapped[1];
  if (!address.includes(':')) return address;
  const [head = '', tail] = address.toLowerCase().split('::');
  const before = head.split(':').filter((group) => group !== '');
  const after = (tail ?? '').split(':').filter((group) => group !== '');
  const gap = tail === undefined ? 0 : 8 - before.length - after.length;
  const groups = [...before, ...Array.from({ length: Math.max(0, gap) }, () => '0'), ...after];
  return `${groups
    .slice(0, 4)
    .map((group) => group.replace(/^0+(?=.)/, ''))
    .join(':')}::/64`;
}
