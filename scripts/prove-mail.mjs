// node scripts/prove-mail.mjs: mail servers that fail in every way and servers that die while they send, on a database of
// the tests' own, and what became of each mail. Writes docs/proofs/mail.md out of the tests' own report.
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { performance } from 'node:perf_hooks';
import { Cluster } from './lib/database.mjs';
import { at, local } from './lib/paths.mjs';
import { read, run } from './lib/run.mjs';
import { begin, say } from './lib/say.mjs';

const WHERE = 'platform/mail/mail-|alerts/delivery';
/** A test of one fault says in its name what happens and with which figures it ends. */
const FAULT = /^fault: (?<what>.*); tries (?<tries>\d+), arrives (?<arrives>\d+), unclear (?<unclear>.+)$/;
const MUTANT = /^mutant: (?<what>.*)$/;

/** @typedef {{ of: string, title: string, passed: boolean }} Test */

/** @param {string} file @returns {Test[]} */
function testsOf(file) {
  const { testResults } = JSON.parse(readFileSync(file, 'utf8'));
  return testResults.flatMap((/** @type {any} */ suite) =>
    suite.assertionResults.map((/** @type {any} */ one) => ({
      of: one.ancestorTitles[0],
      title: one.title,
      passed: one.status === 'passed',
    })),
  );
}

const cell = (/** @type {string} */ text) => text.replaceAll('|', '\\|');
const groups = (/** @type {RegExp} */ pattern, /** @type {string} */ text) => pattern.exec(text)?.groups;

/** @param {Test[]} tests */
function faultTable(tests) {
  const lines = tests.flatMap(({ title, passed }) => {
    const { what, tries, arrives, unclear } = groups(FAULT, title) ?? {};
    return what ? [`| ${cell(what)} | ${tries} | ${arrives} | ${unclear} | ${passed ? 'yes' : 'NO'} |`] : [];
  });
  return `| what goes wrong | tries | arrives | tries counted as unclear | as it should be |
| --- | ---: | ---: | ---: | --- |
${lines.join('\n')}`;
}

/** @param {Test[]} tests @param {string} of */
function page(tests, of) {
  const day = new Date(performance.timeOrigin + performance.now()).toISOString().slice(0, 10);
  const others = tests.filter(({ title }) => !FAULT.test(title) && !MUTANT.test(title));
  const mutants = tests.filter(({ title }) => MUTANT.test(title));
  const word = (/** @type {boolean} */ passed, /** @type {string} */ yes) => (passed ? yes : 'NO');
  return `# Mail: what becomes of it when something fails

${day}, commit ${of}, Node ${process.version}. Made by \`npm run prove:mail\`.

The claim: no mail is lost; one event gives one member one notice; if the server or the connection dies between the end
of the mail and our mark, the same Message-ID may go out once more; that is counted and shown.

Each row is a mail over a real socket to a mail server that fails at that point once and then takes what it is given. A
try is **unclear** when the whole mail had left this side and no answer came, or when its server died: the mail may have
arrived by it. The row of the mail counts them (\`unclear_tries\`) and Needs you says "1 mail may have arrived twice".
A server that dies early has sent nothing; that is counted too, for nobody is left who knows. In every row each arrival
bears the same Message-ID and the mail ends as sent.

${faultTable(tests)}

## With a guard taken out

| what is broken | |
| --- | --- |
${mutants.map(({ title, passed }) => `| ${cell(groups(MUTANT, title)?.what ?? title)} | ${word(passed, 'seen')} |`).join('\n')}

## Beside it

| | as it should be |
| --- | --- |
${others.map(({ of: whole, title, passed }) => `| ${cell(`${whole}: ${title}`)} | ${word(passed, 'yes')} |`).join('\n')}

${tests.length} tests, ${tests.filter(({ passed }) => !passed).length} failed.
`;
}

await begin(async () => {
  const git = async (/** @type {string[]} */ ...args) =>
    (await read('git', ['-C', at(), ...args])).output.trim();
  const loose = (await git('status', '--porcelain')) === '' ? '' : ', with changes that were not committed';
  const of = (await git('rev-parse', '--short', 'HEAD')) + loose;
  const cluster = new Cluster('test');
  const logins = process.env['DATABASE_SUPER_URL'] ? {} : await cluster.start();
  const file = local('mail.json');
  try {
    const jest = [at('node_modules/jest/bin/jest.js'), '-c', 'jest.config.mjs', '--selectProjects', 'pg'];
    const which = ['--runInBand', '--testPathPatterns', WHERE, '--json', `--outputFile=${file}`];
    const code = await run(process.execPath, [...jest, ...which], { env: { ...process.env, ...logins } });
    const tests = testsOf(file);
    const target = at('docs', 'proofs', 'mail.md');
    mkdirSync(at('docs', 'proofs'), { recursive: true });
    writeFileSync(target, page(tests, of));
    await run(process.execPath, [at('node_modules/prettier/bin/prettier.cjs'), '--write', target]);
    say(`docs/proofs/mail.md: ${tests.length} tests.`);
    return code;
  } finally {
    if (cluster.startedHere) await cluster.stop();
  }
});
