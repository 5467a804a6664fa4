// node scripts/prove-mutants.mjs: each lock of a darkroom taken out for a moment, on a database of the tests' own, and
// whether the walk that guards it says so. Writes docs/proofs/mutants.md out of the tests' own report.
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { basename } from 'node:path';
import { performance } from 'node:perf_hooks';
import { Cluster } from './lib/database.mjs';
import { at, local } from './lib/paths.mjs';
import { read, run } from './lib/run.mjs';
import { begin, say } from './lib/say.mjs';

/** Tests of this name break something and ask whether it is seen. */
const BREAKS = /the walk sees|^the check at the start refuses/;

/**
 * @typedef {object} Test
 * @property {string} file
 * @property {string} name
 * @property {boolean} passed
 */

/** @param {string} file @returns {Test[]} */
function testsOf(file) {
  const { testResults } = JSON.parse(readFileSync(file, 'utf8'));
  return testResults.flatMap((/** @type {any} */ suite) =>
    suite.assertionResults.map((/** @type {any} */ one) => ({
      file: basename(suite.name),
      name: one.fullName,
      passed: one.status === 'passed',
    })),
  );
}

/** @param {Test[]} tests @param {string} of */
function page(tests, of) {
  const day = new Date(performance.timeOrigin + performance.now()).toISOString().slice(0, 10);
  const broken = tests.filter(({ name }) => BREAKS.test(name));
  /** @param {Test} test */
  const line = ({ file, name, passed }) =>
    `| ${name.replace(/^.*the walk sees( in)? /, '').replaceAll('|', '\\|')} | ${file} | ${passed ? 'seen' : 'NOT SEEN'} |`;
  return `# Mutants: a lock taken out is seen

${day}, commit ${of}. Made by \`node scripts/prove-mutants.mjs\`.

Each test below breaks one thing that keeps darkrooms apart — in a transaction that is rolled back, in a route or a
repository that only the test brings along, or in a copy of an answer — and the walk that guards it must complain. The
same walks over the program as it is found nothing: ${tests.length - broken.length} tests, ${tests.filter(({ name, passed }) => !BREAKS.test(name) && !passed).length} failed.

| what is broken | test file | |
| --- | --- | --- |
${broken.map(line).join('\n')}

${broken.length} mutants, ${broken.filter(({ passed }) => passed).length} seen.
`;
}

await begin(async () => {
  const git = async (/** @type {string[]} */ ...args) =>
    (await read('git', ['-C', at(), ...args])).output.trim();
  const loose = (await git('status', '--porcelain')) === '' ? '' : ', with changes that were not committed';
  const of = (await git('rev-parse', '--short', 'HEAD')) + loose;
  const cluster = new Cluster('test');
  const logins = process.env['DATABASE_SUPER_URL'] ? {} : await cluster.start();
  const file = local('mutants.json');
  try {
    const jest = [at('node_modules/jest/bin/jest.js'), '-c', 'jest.config.mjs', '--selectProjects', 'pg'];
    const which = ['--testPathPatterns', 'walks/|start-checks', '--json', `--outputFile=${file}`];
    const code = await run(process.execPath, [...jest, ...which], { env: { ...process.env, ...logins } });
    const tests = testsOf(file);
    mkdirSync(at('docs', 'proofs'), { recursive: true });
    writeFileSync(at('docs', 'proofs', 'mutants.md'), page(tests, of));
    await run(process.execPath, [
      at('node_modules/prettier/bin/prettier.cjs'),
      '--write',
      at('docs/proofs/mutants.md'),
    ]);
    say(`docs/proofs/mutants.md: ${tests.length} tests.`);
    return code;
  } finally {
    if (cluster.startedHere) await cluster.stop();
  }
});
