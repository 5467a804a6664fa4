import { mkdirSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The checkout's folder. */
export const ROOT = dirname(dirname(dirname(fileURLToPath(import.meta.url))));

/** @param {...string} parts a place in the checkout */
export const at = (...parts) => join(ROOT, ...parts);

/** @param {...string} parts a place in .local, which holds everything that a run leaves behind */
export function local(...parts) {
  const path = at('.local', ...parts);
  mkdirSync(dirname(path), { recursive: true });
  return path;
}
