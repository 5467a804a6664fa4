// Reads what the test runners report. A report that is missing or empty is a failure, never silence.
import { existsSync, readFileSync } from 'node:fs';

/** @typedef {{ passed: number, failed: number, skipped: number, note?: string }} Count */

/** @param {string} file @returns {any} */
const report = (file) => (existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null);

/**
 * At least one failure when the runner ended badly, and when it ran nothing.
 * @param {Count} count @param {number} code the runner's exit code @returns {Count}
 */
function honest(count, code) {
  if (count.failed > 0) return count;
  if (code !== 0) return { ...count, failed: 1, note: `it ended with code ${code}` };
  if (count.passed === 0) return { ...count, failed: 1, note: 'it ran no test' };
  return count;
}

/**
 * Jest's and Vitest's JSON. A file that could not even be loaded counts as one failure.
 * @param {string} file @param {number} code @returns {Count}
 */
export function jestCount(file, code) {
  const result = report(file);
  if (!result) return honest({ passed: 0, failed: 0, skipped: 0 }, code);
  const unloaded = result.testResults.filter(
    (/** @type {any} */ suite) =>
      suite.status === 'failed' &&
      !suite.assertionResults.some((/** @type {any} */ test) => test.status === 'failed'),
  ).length;
  return honest(
    {
      passed: result.numPassedTests,
      failed: result.numFailedTests + unloaded,
      skipped: result.numPendingTests + (result.numTodoTests ?? 0),
    },
    code,
  );
}

/**
 * Playwright's JSON. What passed only at a second try counts as failed.
 * @param {string} file @param {number} code @returns {Count}
 */
export function playwrightCount(file, code) {
  const result = report(file);
  if (!result) return honest({ passed: 0, failed: 0, skipped: 0 }, code);
  const { expected, unexpected, flaky, skipped } = result.stats;
  return honest(
    {
      passed: expected,
      failed: unexpected + flaky + (unexpected + flaky === 0 ? result.errors.length : 0),
      skipped,
    },
    code,
  );
}

/** A check that is right or wrong as a whole. @param {number} code @returns {Count} */
export const checkCount = (code) => ({ passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1, skipped: 0 });
