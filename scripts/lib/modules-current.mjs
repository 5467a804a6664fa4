// Exit code 0 when node_modules holds what package-lock.json names, 1 when npm ci has to run.
// With --stamp: notes that npm ci has just done so for this package-lock.json.
import { createHash } from 'node:crypto';
import { readFileSync, writeFileSync } from 'node:fs';

const STAMP = 'node_modules/.wetside-lock';

/** @param {string} path @returns {Record<string, { version?: string, optional?: boolean, devOptional?: boolean, extraneous?: boolean }>} */
const packagesIn = (path) => JSON.parse(readFileSync(path, 'utf8')).packages;

const lockHash = () => createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');

function isStamped() {
  try {
    return readFileSync(STAMP, 'utf8') === lockHash();
  } catch {
    return false;
  }
}

/** After an npm install by hand: npm writes this list last, so an install that was cut short has none. */
function isInstalled() {
  try {
    const present = packagesIn('node_modules/.package-lock.json');
    return Object.entries(packagesIn('package-lock.json')).every(
      ([path, entry]) =>
        !path.startsWith('node_modules/') ||
        entry.optional ||
        entry.devOptional ||
        entry.extraneous ||
        present[path]?.version === entry.version,
    );
  } catch {
    return false;
  }
}

if (process.argv.includes('--stamp')) writeFileSync(STAMP, lockHash());
else process.exitCode = isStamped() || isInstalled() ? 0 : 1;
