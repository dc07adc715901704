import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { readPlaywrightReport, readVitestReport } from '../../tools/testReports.mjs';

// The shapes are those of the runners' own JSON reports, cut down to what is counted.

const folder = mkdtempSync(path.join(os.tmpdir(), 'reports-'));
afterAll(() => rmSync(folder, { recursive: true }));

function reportFile(content: unknown): string {
  const file = path.join(folder, 'report.json');
  writeFileSync(file, JSON.stringify(content));
  return file;
}

describe('readVitestReport', () => {
  it('counts what passed; what failed, was left out or never started is a failure', () => {
    const file = reportFile({
      testResults: [
        { status: 'passed', assertionResults: [{ status: 'passed' }, { status: 'passed' }] },
        { status: 'failed', assertionResults: [{ status: 'passed' }, { status: 'failed' }] },
        { status: 'passed', assertionResults: [{ status: 'skipped' }, { status: 'todo' }, { status: 'pending' }] },
        { status: 'failed', assertionResults: [] },
      ],
    });
    expect(readVitestReport(file)).toEqual({ passed: 3, failed: 5 });
  });
});

describe('readPlaywrightReport', () => {
  it('counts only what passed at the first try', () => {
    const file = reportFile({
      stats: { expected: 7, unexpected: 1, flaky: 1, skipped: 1 },
      errors: [{ message: 'x' }],
    });
    expect(readPlaywrightReport(file)).toEqual({ passed: 7, failed: 4 });
  });

  it('throws where the runner left no report', () => {
    expect(() => readPlaywrightReport(path.join(folder, 'none.json'))).toThrow('ENOENT');
  });
});
