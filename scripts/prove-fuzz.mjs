// npm run prove:fuzz [-- COUNT [SEED]]: requests made by chance out of right ones, sent to the program on a real
// PostgreSQL; each answer is looked at, and reconcile goes over what is left. Writes docs/proofs/fuzz.md.
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { performance } from 'node:perf_hooks';
import { Cluster } from './lib/database.mjs';
import { at, local } from './lib/paths.mjs';
import { read, run } from './lib/run.mjs';
import { begin, say, Trouble } from './lib/say.mjs';

const CLASSES = ['2xx', '3xx', '4xx', '5xx'];

/** @returns {Promise<string>} */
async function commit() {
  const git = async (/** @type {string[]} */ ...args) =>
    (await read('git', ['-C', at(), ...args])).output.trim();
  const loose = (await git('status', '--porcelain')) === '' ? '' : ', with changes that were not committed';
  return (await git('rev-parse', '--short', 'HEAD')) + loose;
}

/** @param {number} count */
const amount = (count) => count.toLocaleString('en-GB');

/** @param {any} result @param {string} of */
function page(result, of) {
  const { seed, seconds, requests, byRoute, byCode, complaints, reconciled, ready } = result;
  const day = new Date(performance.timeOrigin + performance.now()).toISOString().slice(0, 10);
  /** @param {string} kind */
  const all = (kind) =>
    Object.values(byRoute).reduce((sum, /** @type {any} */ tally) => sum + (tally[kind] ?? 0), 0);
  /** @param {[string, any]} row */
  const line = ([route, tally]) =>
    `| ${route} | ${CLASSES.map((kind) => amount(tally[kind] ?? 0)).join(' | ')} |`;
  const codes = Object.entries(byCode).sort(([, a], [, b]) => Number(b) - Number(a));
  return `# Fuzz: whatever is sent, a good answer or a reason

${day}, commit ${of}. Made by \`npm run prove:fuzz -- ${requests} ${seed}\`.

${amount(requests)} requests from seed ${seed}, as a darkroom's manager, to the program on a real PostgreSQL. Each was made out of a right one:
up to three fields with another value of their type, of another type, left out, or under another name; addresses with
other ids and broken escapes; bodies cut off, doubled, nested ten thousand deep. An answer fails that has a status of
the 500s, takes 5 seconds, or refuses without a problem document, its code and its sentence. A new darkroom was opened
after every thousand; at the end \`npm run reconcile\` folded everything again out of the tables.

| | |
| --- | ---: |
| Requests | ${amount(requests)} |
| Answers of the 500s | ${amount(all('5xx'))} |
| Answers that fail, in all | ${amount(complaints.length)} |
| Differences found by reconcile (${amount(reconciled.bottles)} bottles, ${amount(reconciled.lots)} lots, ${amount(reconciled.orderLines)} order lines) | ${reconciled.differences.length} |
| Answer of /api/ready afterwards | ${ready} |
| Seconds | ${Math.round(seconds)} |

| route | ${CLASSES.join(' | ')} |
| --- | ---: | ---: | ---: | ---: |
${Object.entries(byRoute)
  .sort(([a], [b]) => a.localeCompare(b))
  .map(line)
  .join('\n')}
| all | ${CLASSES.map((kind) => amount(all(kind))).join(' | ')} |

| why it was refused | times |
| --- | ---: |
${codes.map(([code, times]) => `| ${code} | ${amount(Number(times))} |`).join('\n')}
`;
}

await begin(async () => {
  const [count = '20000', seed = '20261201'] = process.argv.slice(2);
  if (!/^[1-9]\d*$/.test(count) || !/^\d+$/.test(seed))
    throw new Trouble('Say how many requests, and from which seed: whole numbers.');
  const of = await commit();
  const cluster = new Cluster('test');
  const logins = process.env['DATABASE_SUPER_URL'] ? {} : await cluster.start();
  const report = local('fuzz.json');
  rmSync(report, { force: true });
  try {
    const jest = [at('node_modules/jest/bin/jest.js'), '-c', 'jest.config.mjs', '--selectProjects', 'pg'];
    const wanted = { FUZZ_REQUESTS: count, FUZZ_SEED: seed, FUZZ_REPORT: report };
    const code = await run(process.execPath, [...jest, '--testPathPatterns', 'fuzz/fuzz'], {
      env: { ...process.env, ...logins, ...wanted },
    });
    if (!existsSync(report)) throw new Trouble('The requests could not be sent: see the lines above.');
    const result = JSON.parse(readFileSync(report, 'utf8'));
    mkdirSync(at('docs', 'proofs'), { recursive: true });
    const file = at('docs', 'proofs', 'fuzz.md');
    writeFileSync(file, page(result, of));
    await run(process.execPath, [at('node_modules/prettier/bin/prettier.cjs'), '--write', file]);
    say(`docs/proofs/fuzz.md: ${result.requests} requests, ${result.complaints.length} answers that fail.`);
    return code;
  } finally {
    if (cluster.startedHere) await cluster.stop();
  }
});
