import { performance } from 'node:perf_hooks';

/** @param {string} sentence */
export const say = (sentence) => void process.stdout.write(`${sentence}\n`);

/** An error that is told as its sentence alone, without a stack. */
export class Trouble extends Error {}

/** @param {number} began of performance.now() */
export const secondsSince = (began) => `${((performance.now() - began) / 1000).toFixed(1)} s`;

/**
 * Says what is being done and, when it is done, how long it took.
 * @template T
 * @param {string} sentence
 * @param {() => Promise<T> | T} work
 */
export async function step(sentence, work) {
  const began = performance.now();
  say(sentence);
  const result = await work();
  say(`  done in ${secondsSince(began)}`);
  return result;
}

/**
 * Runs a script's main function; what goes wrong becomes one sentence and exit code 1.
 * @param {() => Promise<number | void>} main gives the exit code
 */
export async function begin(main) {
  try {
    process.exitCode = (await main()) ?? 0;
  } catch (error) {
    process.stderr.write(
      `${error instanceof Trouble ? error.message : String(error instanceof Error ? error.stack : error)}\n`,
    );
    process.exitCode = 1;
  }
}
