import { existsSync, rmSync, writeFileSync } from 'node:fs';
import { withClient } from './given-database.mjs';
import { at, local } from './paths.mjs';
import { darkroomsIn } from './restored.mjs';
import { read } from './run.mjs';
import { say, Trouble } from './say.mjs';

/**
 * Plays the demo if there is no darkroom yet.
 * @param {Record<string, string>} settings @param {string[]} [args]
 * @returns {Promise<Record<string, string>[]>} the demo's sign-ins
 */
export async function demo(settings, args = []) {
  const { code, output } = await read(process.execPath, [at('apps/api/dist/cli/demo.js'), ...args], {
    env: { ...process.env, ...settings },
  });
  const lines = output.split('\n').filter((line) => line.trim() !== '');
  for (const line of lines) if (!line.startsWith('{')) say(`  ${line}`);
  if (code !== 0) throw new Trouble('The demo could not be played: see the lines above.');
  return lines.filter((line) => line.startsWith('{')).map((line) => JSON.parse(line));
}

/** @param {Record<string, string>[]} signIns */
export function saySignIns(signIns) {
  for (const { email, passphrase, ...rest } of signIns) {
    say(`    ${email}   ${passphrase}   ${Object.values(rest).join(', ')}`);
  }
}

/**
 * Plays the demo if there is no darkroom yet, and anew if the last time was cut short.
 * @param {Record<string, string>} settings @param {{ DATABASE_ADMIN_URL: string }} logins
 */
export async function wholeDemo(settings, { DATABASE_ADMIN_URL }) {
  const begun = local('demo-begun');
  const isEmpty = (await withClient(DATABASE_ADMIN_URL, darkroomsIn)) === 0;
  const isHalf = !isEmpty && existsSync(begun);
  if (isHalf) say('  the demo was cut short the last time: it is played anew');
  if (isEmpty) writeFileSync(begun, '');
  const signIns = await demo({ ...settings, DATABASE_ADMIN_URL }, isHalf ? ['--reset'] : []);
  rmSync(begun, { force: true });
  return signIns;
}
