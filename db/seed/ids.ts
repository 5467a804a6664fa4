import { createHash } from 'node:crypto';

/** The same name gives the same id, in the form of a UUID: a scenario played twice is the same twice. */
export function idFor(name: string): string {
  const hex = createHash('sha256').update(name).digest('hex');
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-7${hex.slice(13, 16)}-8${hex.slice(17, 20)}-${hex.slice(20, 32)}`;
}
