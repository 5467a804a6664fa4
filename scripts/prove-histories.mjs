// npm run prove:histories [-- COUNT]: random histories through the server's services against a real PostgreSQL,
// each compared with the fold in memory and all of them with reconcile. Writes docs/proofs/histories.md.
import { mkdirSync, writeFileSync } from 'node:fs';
import { performance } from 'node:perf_hooks';
import { build } from './lib/build.mjs';
import { Cluster } from './lib/database.mjs';
import { at } from './lib/paths.mjs';
import { read } from './lib/run.mjs';
import { begin, say, Trouble } from './lib/say.mjs';

/** What the table says of each kind, in this order. */
const rows = [
  ['histories', 'Histories'],
  ['actions', 'Actions, in all'],
  ['bottles', 'Bottles'],
  ['mix', 'Mixes'],
  ['mix out of a stock bottle', '— out of a stock bottle'],
  ['load', 'Loads'],
  ['late load', '— told late'],
  ['load told for before the mix', '— told for before the bottle was mixed'],
  ['hold', 'Holds'],
  ['release', 'Releases'],
  ['discard', 'Discards'],
  ['void', 'Voids'],
];

/** @returns {Promise<string>} */
async function commit() {
  const { code, output } = await read('git', ['-C', at(), 'rev-parse', '--short', 'HEAD']);
  return code === 0 ? output.trim() : 'not committed yet';
}

/** @param {any} result @param {number} seconds @param {string} of */
function page(result, seconds, of) {
  const { counts, differences, reconciled, steps } = result;
  const day = new Date(performance.timeOrigin + performance.now()).toISOString().slice(0, 10);
  const table = rows.map(([key = '', name]) => `| ${name} | ${(counts[key] ?? 0).toLocaleString('en-GB')} |`);
  return `# Histories: the totals are the fold of what happened

${day}, commit ${of}. Made by \`npm run prove:histories\`.

Seeds 1 to ${counts.histories}, ${steps} steps each, in four time zones, over the starter catalogue's chemistries. Each history was
played through the server's own services on a real PostgreSQL, at its own times. Afterwards every bottle's stored
totals, its "in use" and its volume were compared with the fold of the same facts in memory, and
\`npm run reconcile\` folded everything once more out of the tables.

| | |
| --- | ---: |
${table.join('\n')}
| Bottles whose stored totals differ from the fold in memory | ${differences.length} |
| Differences found by reconcile (${reconciled.bottles.toLocaleString('en-GB')} bottles) | ${reconciled.differences.length} |
| Seconds | ${Math.round(seconds)} |
`;
}

await begin(async () => {
  const [wanted = '1000'] = process.argv.slice(2);
  await build();
  const of = await commit();
  const cluster = new Cluster('test');
  const logins = await cluster.start();
  try {
    const began = performance.now();
    const program = at('apps/api/dist/cli/prove-histories.js');
    const { output } = await read(process.execPath, [program, wanted], {
      env: { ...process.env, ...logins },
    });
    const line = output.split('\n').find((one) => one.startsWith('{'));
    if (!line) throw new Trouble(`${output}\nThe histories could not be played: see the lines above.`);
    const result = JSON.parse(line);
    mkdirSync(at('docs', 'proofs'), { recursive: true });
    writeFileSync(at('docs', 'proofs', 'histories.md'), page(result, (performance.now() - began) / 1000, of));
    for (const one of [...result.differences, ...result.reconciled.differences]) say(one);
    say(`docs/proofs/histories.md: ${result.counts.histories} histories, ${result.counts.actions} actions.`);
    return result.differences.length + result.reconciled.differences.length === 0 ? 0 : 1;
  } finally {
    if (cluster.startedHere) await cluster.stop();
  }
});
