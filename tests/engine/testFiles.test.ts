import { readdirSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { expect, it } from 'vitest';

const TESTS = fileURLToPath(new URL('..', import.meta.url));

/** Places that a runner reads: two projects of Vitest, Playwright, and the benchmarks. */
const READ = [
  /^(reference|oracle|engine|workbook)\/.*\.test\.ts$/,
  /^app\/.*\.test\.tsx?$/,
  /^e2e\/.*\.spec\.ts$/,
  /^bench\/[^/]*\.bench\.ts$/,
];

function unread(files: string[]): string[] {
  return files.filter((file) => /\.(test|spec|bench)\.tsx?$/.test(file) && !READ.some((pattern) => pattern.test(file)));
}

it('every test file lies where a runner reads it', () => {
  const files = readdirSync(TESTS, { recursive: true, encoding: 'utf8' }).map((file) => file.split(path.sep).join('/'));
  expect(files).toContain('engine/testFiles.test.ts');
  expect(unread(files)).toEqual([]);
});

it('a file that no runner reads is found', () => {
  expect(
    unread(['engine/a.test.tsx', 'other/a.test.ts', 'e2e/a.test.ts', 'bench/deep/a.bench.ts', 'support/help.ts']),
  ).toEqual(['engine/a.test.tsx', 'other/a.test.ts', 'e2e/a.test.ts', 'bench/deep/a.bench.ts']);
});
