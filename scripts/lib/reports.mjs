// What the runners' reports say of each test and each file: for the slowest and for the table of mutants.
import { existsSync, readFileSync } from 'node:fs';
import { relative } from 'node:path';
import { ROOT } from './paths.mjs';

/** @typedef {{ part: string, file: string, name: string, passed: boolean, ms: number }} Test */
/** @typedef {{ name: string, ms: number }} Timed */

/** @param {string} part @param {any} report Jest's or Vitest's @returns {Test[]} */
const jestTests = (part, report) =>
  report.testResults.flatMap((/** @type {any} */ suite) =>
    suite.assertionResults.map((/** @type {any} */ one) => ({
      part,
      file: relative(ROOT, suite.name),
      name: one.fullName.trim(),
      passed: one.status === 'passed',
      ms: one.duration ?? 0,
    })),
  );

/** @param {string} part @param {any} suite Playwright's @param {string[]} [above] @returns {Test[]} */
function playwrightTests(part, suite, above = []) {
  const names = suite.title && suite.title !== suite.file ? [...above, suite.title] : above;
  return [
    ...(suite.suites ?? []).flatMap((/** @type {any} */ one) => playwrightTests(part, one, names)),
    ...(suite.specs ?? []).map((/** @type {any} */ spec) => ({
      part,
      file: `apps/e2e/journeys/${spec.file}`,
      name: [...names, spec.title].join(' '),
      passed: spec.ok,
      ms: spec.tests
        .flatMap((/** @type {any} */ one) => one.results)
        .reduce((/** @type {number} */ sum, /** @type {any} */ one) => sum + one.duration, 0),
    })),
  ];
}

/** Every test of the parts whose reports lie in that folder. @param {string} folder @returns {Test[]} */
export function testsIn(folder) {
  return ['pure', 'pg', 'web', 'browser'].flatMap((part) => {
    const file = `${folder}/${part}.json`;
    if (!existsSync(file)) return [];
    const report = JSON.parse(readFileSync(file, 'utf8'));
    return part === 'browser' ? playwrightTests(part, { suites: report.suites }) : jestTests(part, report);
  });
}

/** The slowest files: what their tests took, with what was set up for each of them. @param {string} folder @param {number} count @returns {Timed[]} */
export function slowestFiles(folder, count) {
  /** @type {Map<string, number>} */
  const files = new Map();
  for (const part of ['pure', 'pg', 'web']) {
    const file = `${folder}/${part}.json`;
    if (!existsSync(file)) continue;
    for (const suite of JSON.parse(readFileSync(file, 'utf8')).testResults)
      files.set(relative(ROOT, suite.name), suite.endTime - suite.startTime);
  }
  for (const { part, file, ms } of testsIn(folder)) {
    if (part === 'browser') files.set(file, (files.get(file) ?? 0) + ms);
  }
  return [...files]
    .map(([name, ms]) => ({ name, ms }))
    .sort((a, b) => b.ms - a.ms)
    .slice(0, count);
}
