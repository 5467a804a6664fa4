// docs/proofs/floor.md out of what was measured.
import { cpus } from 'node:os';
import { performance } from 'node:perf_hooks';

const WHAT = /** @type {Record<string, string>} */ ({
  load: 'a load through 3 bottles',
  sink: "the sink's read",
});
const one = (/** @type {number} */ value) => value.toFixed(value < 10 ? 2 : value < 100 ? 1 : 0);
const times = (/** @type {number} */ value) => `${value.toFixed(2)} ×`;

/** @param {any} found @param {string} of */
export function page({ results, stores, frames, recorded, seconds, rounds }, of) {
  const day = new Date(performance.timeOrigin + performance.now()).toISOString().slice(0, 10);
  const [small, large] = stores;
  // The last: by then its connection had every plan, and statements that may go together did.
  const darkroom = recorded.darkrooms.at(-1);
  const turns = (/** @type {any[]} */ list) => new Set(list.map(({ turn }) => turn)).size;
  const floorRows = results.map((/** @type {any} */ { kind, connections, by }) => {
    const floor = by['floor on small'];
    const program = by['program on small'];
    return `| ${WHAT[kind]} | ${connections} | ${one(floor.perSecond)} | ${one(program.perSecond)} | **${times(program.perSecond / floor.perSecond)}** | ${one(floor.p50)} / ${one(floor.p99)} | ${one(program.p50)} / ${one(program.p99)} | ${one(floor.cpuMs)} | ${one(program.cpuMs)} |`;
  });
  const growthRows = results.map((/** @type {any} */ { kind, connections, by }) => {
    const grown = (/** @type {string} */ who) =>
      by[`${who} on small`].perSecond / by[`${who} on large`].perSecond;
    return `| ${WHAT[kind]} | ${connections} | ${one(by['floor on large'].perSecond)} | ${times(grown('floor'))} | ${one(by['program on large'].perSecond)} | **${times(grown('program'))}** | ${one(by['program on large'].p50)} / ${one(by['program on large'].p99)} |`;
  });
  let refused = 0;
  for (const { by } of results)
    for (const round of Object.values(/** @type {Record<string, { refused: number }>} */ (by)))
      refused += round.refused;
  const frameRows = [
    ['node:http', frames.http],
    ['Express 5 with its JSON parser', frames.express],
    ['Nest 12 on Express', frames.nest],
    ['the whole set-up, GET /api/health', frames.program],
  ].map(([name, round]) => `| ${name} | ${one(round.perSecond)} | ${one(round.cpuMs)} |`);
  return `# Floor: what the program costs above bare node:http and postgres.js

${day}, commit ${of}. Made by \`npm run prove:floor\` on ${cpus().length} cores (${cpus()[0]?.model ?? ''}), which the load, the
servers and PostgreSQL (durable, fsync on) share. Each figure is the median of ${rounds} rounds of ${seconds} s after a warm-up,
taken in turn with its neighbours in one run; the ratios count, not the seconds.

The floor sends the very statements that the program was seen to send (recorded in the same run, from begin to commit,
together where the program sends them together), through a pool of the same size (${recorded.pool}), with no sign-in, no checks and
no reckoning. 64 darkrooms with three bottles each; every connection stands in one.

| what | statements | turns |
| --- | ---: | ---: |
| ${WHAT['load']} | ${darkroom.load.length} | ${turns(darkroom.load)} |
| ${WHAT['sink']} | ${darkroom.sink.length} | ${turns(darkroom.sink)} |

## Beside the floor (${small.steps.toLocaleString('en-GB')} load steps)

| what | connections | floor, 1/s | program, 1/s | program ÷ floor | floor p50 / p99, ms | program p50 / p99, ms | floor, CPU ms | program, CPU ms |
| --- | ---: | ---: | ---: | ---: | ---: | ---: | ---: | ---: |
${floorRows.join('\n')}

CPU: processor time of the server's process for one request, without PostgreSQL's. Answers of 503, in all rounds of all four
servers: ${refused}.

## With ${large.steps.toLocaleString('en-GB')} load steps, their loads and actions

| what | connections | floor, 1/s | floor grew | program, 1/s | program grew | program p50 / p99, ms |
| --- | ---: | ---: | ---: | ---: | ---: | ---: |
${growthRows.join('\n')}

## What the frameworks cost

One small GET, 8 connections.

| | 1/s | CPU ms a request |
| --- | ---: | ---: |
${frameRows.join('\n')}
`;
}
