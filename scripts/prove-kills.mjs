// npm run prove:kills [-- COUNT]: the server and a durable PostgreSQL of its own killed again and again under people who
// tick loads; after each kill all that was answered must be there, once. Writes docs/proofs/kills.md.
import { mkdirSync, writeFileSync } from 'node:fs';
import { performance } from 'node:perf_hooks';
import { build } from './lib/build.mjs';
import { at } from './lib/paths.mjs';
import { read, run } from './lib/run.mjs';
import { begin, say, Trouble } from './lib/say.mjs';

/** What is said of each kind of kill. */
const kinds = {
  server: 'the server, SIGKILL, then started again',
  database: 'every process of PostgreSQL, SIGKILL, then started again; the server ran on',
  both: 'PostgreSQL in the same way, and the server while it recovered',
};

/**
 * @typedef {object} Killed
 * @property {keyof typeof kinds} kind
 * @property {number} answered
 * @property {number} unansweredFound
 * @property {number} unansweredNotFound
 * @property {number} retries
 * @property {number} backMs
 * @property {string[]} differences
 */

/** @returns {Promise<string>} */
async function commit() {
  const git = async (/** @type {string[]} */ ...args) =>
    (await read('git', ['-C', at(), ...args])).output.trim();
  const loose = (await git('status', '--porcelain')) === '' ? '' : ', with changes that were not committed';
  return (await git('rev-parse', '--short', 'HEAD')) + loose;
}

/** @param {Killed[]} kills @param {(kill: Killed) => number} of */
const sum = (kills, of) => kills.reduce((total, kill) => total + of(kill), 0);

/** @param {string} name @param {Killed[]} kills */
function row(name, kills) {
  const figures = [
    kills.length,
    sum(kills, (kill) => kill.answered),
    sum(kills, (kill) => kill.unansweredFound),
    sum(kills, (kill) => kill.unansweredNotFound),
    sum(kills, (kill) => kill.retries),
    sum(kills, (kill) => kill.differences.length),
  ].map((figure) => figure.toLocaleString('en-GB'));
  const longest = Math.max(0, ...kills.map(({ backMs }) => backMs)) / 1000;
  return `| ${[name, ...figures, `${longest.toFixed(1)} s`].join(' | ')} |`;
}

/** @param {Killed[]} kills @param {number} seconds @param {string} of */
function page(kills, seconds, of) {
  const day = new Date(performance.timeOrigin + performance.now()).toISOString().slice(0, 10);
  const rows = Object.entries(kinds).map(([kind, name]) =>
    row(
      name,
      kills.filter((kill) => kill.kind === kind),
    ),
  );
  return `# Kills: what was answered is there, once

${day}, commit ${of}. Made by \`npm run prove:kills\`.

Eight people ticked loads all the time, each through one to three of twelve bottles, each load under an id of its own,
on the built server and a PostgreSQL of its own with fsync on. After each kill the list of what they had sent was
compared with the tables: a load that was answered is there exactly once, through all its bottles; one that was not
answered once or not at all; its retry, the same words under the same id, makes it exactly once and says so (200 where
it had arrived, 201 where not); every bottle's totals are the sum of its loads; and \`npm run reconcile\` finds nothing.

| killed | kills | loads answered | unanswered, found | unanswered, not found | retries | differences | longest until the first answer |
| --- | ---: | ---: | ---: | ---: | ---: | ---: | ---: |
${rows.join('\n')}
${row('in all', kills)}

${Math.round(seconds)} seconds. The time until the first answer is counted from the kill and holds the start of what was killed.
`;
}

await begin(async () => {
  const [wanted = '100'] = process.argv.slice(2);
  await build();
  const of = await commit();
  const began = performance.now();
  const { output } = await read(process.execPath, [at('apps/api/dist/cli/prove-kills.js'), wanted]);
  const line = output.split('\n').find((one) => one.startsWith('['));
  if (!line) throw new Trouble(`${output}\nThe kills could not be done: see the lines above.`);
  /** @type {Killed[]} */
  const kills = JSON.parse(line);
  mkdirSync(at('docs', 'proofs'), { recursive: true });
  writeFileSync(at('docs', 'proofs', 'kills.md'), page(kills, (performance.now() - began) / 1000, of));
  await run(process.execPath, [
    at('node_modules/prettier/bin/prettier.cjs'),
    '--write',
    at('docs/proofs/kills.md'),
  ]);
  const differences = kills.flatMap((kill) => kill.differences);
  for (const one of differences) say(one);
  say(`docs/proofs/kills.md: ${kills.length} kills, ${differences.length} differences.`);
  return differences.length === 0 ? 0 : 1;
});
