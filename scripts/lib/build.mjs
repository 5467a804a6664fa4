import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { at, local, ROOT } from './paths.mjs';
import { mustRun, run } from './run.mjs';
import { Trouble, step } from './say.mjs';

/** @typedef {{ name: string, sources: string[], made: string[], make: () => Promise<void> }} Part */

const left = new Set(['node_modules', 'dist', 'dist-types', 'test-results', 'playwright-report', 'coverage']);
const common = ['package-lock.json', 'tsconfig.base.json'];
const stampFile = () => local('built.json');

/** @type {Part[]} */
export const parts = [
  {
    name: 'server',
    sources: [...common, 'packages', 'db', 'apps/api', 'apps/mail-catcher'],
    made: ['apps/api/dist/main.js', 'db/dist/cli/migrate.js', 'apps/mail-catcher/dist/main.js'],
    make: () =>
      mustRun('The server does not compile: see the lines above.', at('node_modules/.bin/tsc'), [
        '-b',
        'apps/api/tsconfig.build.json',
        'apps/mail-catcher',
      ]),
  },
  {
    name: 'web pages',
    sources: [...common, 'packages', 'apps/web'],
    made: ['apps/web/dist/index.html'],
    make: buildWeb,
  },
];

/** Built beside and then put in place whole, because a server may be handing out the old pages meanwhile. */
async function buildWeb() {
  const next = local('web-next');
  const old = local('web-old');
  await mustRun(
    'The web pages do not build: see the lines above.',
    at('node_modules/.bin/vite'),
    ['build', '--logLevel', 'warn', '--outDir', next, '--emptyOutDir'],
    { cwd: at('apps/web') },
  );
  rmSync(old, { recursive: true, force: true });
  if (existsSync(at('apps/web/dist'))) renameSync(at('apps/web/dist'), old);
  renameSync(next, at('apps/web/dist'));
  rmSync(old, { recursive: true, force: true });
}

/** @param {string} path below ROOT @returns {string[]} */
function filesIn(path) {
  if (!existsSync(at(path))) return [];
  const files = [];
  for (const entry of readdirSync(at(path), { withFileTypes: true })) {
    if (left.has(entry.name) || /\.spec\.tsx?$/.test(entry.name)) continue;
    if (entry.isDirectory()) files.push(...filesIn(join(path, entry.name)));
    else files.push(join(path, entry.name));
  }
  return files.sort();
}

/** @param {Part} part */
function hashOf(part) {
  const hash = createHash('sha256');
  for (const source of part.sources) {
    const files = /\.json$/.test(source) ? [source] : filesIn(source);
    for (const file of files)
      hash
        .update(file)
        .update('\0')
        .update(readFileSync(join(ROOT, file)));
  }
  return hash.digest('hex');
}

/** @returns {Record<string, string>} */
function stamps() {
  try {
    return JSON.parse(readFileSync(stampFile(), 'utf8'));
  } catch {
    // Not there, or cut short: everything is built again.
    return {};
  }
}

/** Builds what changed since the last build. Call it through `build`, which holds the lock. */
export async function buildHere() {
  for (const part of parts) {
    const hash = hashOf(part);
    if (stamps()[part.name] === hash && part.made.every((file) => existsSync(at(file)))) continue;
    await step(`Building the ${part.name}`, part.make);
    writeFileSync(stampFile(), JSON.stringify({ ...stamps(), [part.name]: hash }));
  }
}

/** Builds what changed; one build of a checkout at a time, another waits. */
export async function build() {
  if ((await withBuildLock([process.execPath, at('scripts/build.mjs'), '--locked'])) !== 0) {
    throw new Trouble('The build failed: see the lines above.');
  }
}

/** Runs a command while no other build runs. @param {string[]} command @param {NodeJS.ProcessEnv} [env] */
export function withBuildLock(command, env = process.env) {
  return run('flock', [local('build.lock'), ...command], { env });
}
