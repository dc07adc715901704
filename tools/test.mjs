/**
 * `npm test`: every check in turn. A step that fails does not stop those that can still say something; only the
 * journeys need the build. The counts are read from the runners' own reports, and the last line is
 * "N passed, N failed", where a failed step that is not a test (types, lint, build, a crash) counts as one failure.
 */
import { spawnSync } from 'node:child_process';
import { mkdirSync, rmSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { binOf } from './packageBin.mjs';
import { readPlaywrightReport, readVitestReport } from './testReports.mjs';

const ROOT = fileURLToPath(new URL('..', import.meta.url));
const VITEST_REPORT = 'test-results/vitest.json';
const JOURNEYS_REPORT = 'test-results/journeys.json';

/**
 * @typedef {object} Step
 * @property {string} name
 * @property {string} script
 * @property {string[]} args
 * @property {Record<string, string>} [env]
 * @property {string} [needs] the step without which this one says nothing
 * @property {() => import('./testReports.mjs').Counts} [counts]
 */

/** @type {Step[]} */
const STEPS = [
  { name: 'types', script: binOf('typescript', 'tsc'), args: ['-b'] },
  { name: 'lint and format', script: binOf('@biomejs/biome', 'biome'), args: ['check', '--max-diagnostics=200'] },
  {
    name: 'engine and face',
    script: binOf('vitest'),
    args: ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${VITEST_REPORT}`],
    counts: () => readVitestReport(VITEST_REPORT),
  },
  { name: 'build', script: binOf('vite'), args: ['build'] },
  {
    name: 'journeys',
    script: binOf('@playwright/test', 'playwright'),
    args: ['test', '--reporter=list,json'],
    env: { PLAYWRIGHT_JSON_OUTPUT_NAME: JOURNEYS_REPORT },
    needs: 'build',
    counts: () => readPlaywrightReport(JOURNEYS_REPORT),
  },
];

/** @param {Step} step */
function exitCodeOf(step) {
  const { status, error } = spawnSync(process.execPath, [step.script, ...step.args], {
    cwd: ROOT,
    stdio: ['ignore', 'inherit', 'inherit'],
    env: { ...process.env, ...step.env },
  });
  if (error) console.error(error.message);
  return status ?? 1;
}

/** @param {Step} step @param {boolean} succeeded @returns {import('./testReports.mjs').Counts} */
function countsOf(step, succeeded) {
  if (!step.counts) return { passed: 0, failed: succeeded ? 0 : 1 };
  try {
    const { passed, failed } = step.counts();
    // A runner may fail outside its tests (an unhandled error), or pass without running one: neither is a pass.
    const unaccounted = failed === 0 && (!succeeded || passed === 0);
    return { passed, failed: unaccounted ? 1 : failed };
  } catch (error) {
    console.error(`${step.name}: no report to count (${error instanceof Error ? error.message : error}).`);
    return { passed: 0, failed: 1 };
  }
}

/** @param {Step} step @param {{ name: string, ok: boolean }[]} before */
function runStep(step, before) {
  console.log(`\n== ${step.name} ==`);
  if (before.some(({ name, ok }) => name === step.needs && !ok)) {
    console.log(`Not run: it needs the step "${step.needs}", which failed.`);
    return { name: step.name, ok: false, passed: 0, failed: 1, seconds: 0 };
  }
  const start = performance.now();
  const succeeded = exitCodeOf(step) === 0;
  const counts = countsOf(step, succeeded);
  return {
    name: step.name,
    ok: succeeded && counts.failed === 0,
    ...counts,
    seconds: (performance.now() - start) / 1000,
  };
}

function main() {
  process.chdir(ROOT);
  // A report of an earlier run must not be taken for this one's.
  for (const report of [VITEST_REPORT, JOURNEYS_REPORT]) rmSync(report, { force: true });
  mkdirSync('test-results', { recursive: true });

  /** @type {ReturnType<typeof runStep>[]} */
  const results = [];
  for (const step of STEPS) results.push(runStep(step, results));

  console.log('\n== summary ==');
  for (const { name, ok, passed, failed, seconds } of results) {
    const counts = passed + failed > 0 ? `${passed} passed, ${failed} failed` : '';
    console.log(`${ok ? 'ok    ' : 'FAILED'}  ${name.padEnd(16)} ${seconds.toFixed(1).padStart(6)} s   ${counts}`);
  }
  const passed = results.reduce((sum, result) => sum + result.passed, 0);
  const failed = results.reduce((sum, result) => sum + result.failed, 0);
  process.exitCode = failed > 0 ? 1 : 0;
  console.log(`${passed} passed, ${failed} failed`);
}

main();
