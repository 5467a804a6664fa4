// npm run typecheck: every program, package, test and script, all of them even when one fails.
import { existsSync } from 'node:fs';
import { withBuildLock } from './lib/build.mjs';
import { at } from './lib/paths.mjs';
import { run } from './lib/run.mjs';
import { begin } from './lib/say.mjs';

const tsc = at('node_modules/.bin/tsc');
// These write dist/, which a build may be writing too: under its lock.
const built = [
  'packages/chemistry',
  'packages/supply',
  'packages/api-client',
  'db',
  'apps/api/tsconfig.build.json',
  'apps/mail-catcher',
];
const read = [
  'apps/api/tsconfig.json',
  'apps/web/tsconfig.json',
  'apps/e2e/tsconfig.json',
  'scripts/tsconfig.specs.json',
  'scripts/tsconfig.json',
];

await begin(async () => {
  let failed = (await withBuildLock([tsc, '-b', ...built])) !== 0;
  for (const project of read.filter((path) => existsSync(at(path)))) {
    if ((await run(tsc, ['--noEmit', '-p', project])) !== 0) {
      process.stdout.write(`  ${project} has type errors\n`);
      failed = true;
    }
  }
  return failed ? 1 : 0;
});
