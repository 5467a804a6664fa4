// npm run prove:mutants: each promise broken for a moment, and whether the test that guards it says so. Runs all tests
// and writes docs/proofs/mutants.md out of their reports; `-- --from-reports` takes the reports of the last npm test.
import { mkdirSync, writeFileSync } from 'node:fs';
import { performance } from 'node:perf_hooks';
import { at, local } from './lib/paths.mjs';
import { testsIn } from './lib/reports.mjs';
import { read, run } from './lib/run.mjs';
import { begin, say, Trouble } from './lib/say.mjs';

/** @typedef {import('./lib/reports.mjs').Test} Test */

/** Tests of this name break something and ask whether it is seen. */
const BREAKS = /the walk sees|the check at the start refuses|mutant: /;
const PARTS = ['pure', 'postgresql', 'web', 'browser'];

/** @param {string} name */
const what = (name) => name.replace(/^.*(the walk sees( in)?|mutant:) /, '').replaceAll('|', '\\|');

/** @param {Test[]} tests @param {string} of */
function page(tests, of) {
  const day = new Date(performance.timeOrigin + performance.now()).toISOString().slice(0, 10);
  const broken = tests.filter(({ name }) => BREAKS.test(name));
  const others = tests.length - broken.length;
  const red = tests.filter(({ name, passed }) => !BREAKS.test(name) && !passed).length;
  const rows = broken
    .sort((a, b) => a.file.localeCompare(b.file))
    .map(({ file, name, passed }) => `| ${what(name)} | ${file} | ${passed ? 'seen' : 'NOT SEEN'} |`);
  return `# Mutants: a promise broken is seen

${day}, commit ${of}. Made by \`npm run prove:mutants\`.

Each test below breaks one thing — in a transaction that is rolled back, in a route, a repository or a copy of the built
server that only the test brings along, in a copy of an answer — and the test that guards it must complain. The same
tests over the program as it is: ${others} tests, ${red} failed.

| what is broken | test file | |
| --- | --- | --- |
${rows.join('\n')}

${broken.length} mutants, ${broken.filter(({ passed }) => passed).length} seen.
`;
}

await begin(async () => {
  const git = async (/** @type {string[]} */ ...args) =>
    (await read('git', ['-C', at(), ...args])).output.trim();
  const loose = (await git('status', '--porcelain')) === '' ? '' : ', with changes that were not committed';
  const of = (await git('rev-parse', '--short', 'HEAD')) + loose;
  const again = !process.argv.includes('--from-reports');
  const code = again ? await run(process.execPath, [at('scripts/test.mjs'), ...PARTS]) : 0;
  const tests = testsIn(local('test-results'));
  if (tests.length === 0) throw new Trouble('There is no report: run npm test first.');
  mkdirSync(at('docs', 'proofs'), { recursive: true });
  writeFileSync(at('docs', 'proofs', 'mutants.md'), page(tests, of));
  await run(process.execPath, [
    at('node_modules/prettier/bin/prettier.cjs'),
    '--write',
    at('docs/proofs/mutants.md'),
  ]);
  say(`docs/proofs/mutants.md: ${tests.length} tests.`);
  return code;
});
