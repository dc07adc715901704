import { readFileSync } from 'node:fs';

/** @typedef {{ passed: number, failed: number }} Counts */

/**
 * Counts in Vitest's JSON report. A test that did not run (skipped, to do) is a failure here, and so is a file that
 * failed before its first test.
 * @param {string} file
 * @returns {Counts}
 */
export function readVitestReport(file) {
  /** @type {{ testResults: { status: string, assertionResults: { status: string }[] }[] }} */
  const report = JSON.parse(readFileSync(file, 'utf8'));
  const tests = report.testResults.flatMap((result) => result.assertionResults);
  const passed = tests.filter((test) => test.status === 'passed').length;
  const brokenFiles = report.testResults.filter(
    (result) => result.status === 'failed' && !result.assertionResults.some((test) => test.status === 'failed'),
  ).length;
  return { passed, failed: tests.length - passed + brokenFiles };
}

/**
 * Counts in Playwright's JSON report. Only a test that passed at the first try counts as passed; errors outside the
 * tests (a file that does not load) count as failures.
 * @param {string} file
 * @returns {Counts}
 */
export function readPlaywrightReport(file) {
  /** @type {{ stats: { expected: number, unexpected: number, flaky: number, skipped: number }, errors?: unknown[] }} */
  const { stats, errors = [] } = JSON.parse(readFileSync(file, 'utf8'));
  return { passed: stats.expected, failed: stats.unexpected + stats.flaky + stats.skipped + errors.length };
}
