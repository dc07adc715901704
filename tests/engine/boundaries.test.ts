import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { appProblems, sourceProblems } from './sourceBoundaries';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));

function codeFiles(folder: string): { file: string; code: string }[] {
  const base = path.join(ROOT, folder);
  return readdirSync(base, { recursive: true, encoding: 'utf8' })
    .filter((file) => /\.tsx?$/.test(file))
    .map((file) => ({ file: file.split(path.sep).join('/'), code: readFileSync(path.join(base, file), 'utf8') }));
}

describe('the engine', () => {
  it('keeps to its layers, and knows neither a face, nor storage, nor a clock, nor chance', () => {
    const files = codeFiles('src');
    expect(files.length).toBeGreaterThan(20);
    expect(files.flatMap(({ file, code }) => sourceProblems(file, code))).toEqual([]);
  });

  it('is known to the face by its index only', () => {
    const files = codeFiles('app');
    expect(files.length).toBeGreaterThan(20);
    expect(files.flatMap(({ file, code }) => appProblems(file, code))).toEqual([]);
  });
});

describe('the check itself', () => {
  it.each([
    ['blend/a.ts', "import { useState } from 'react';"],
    ['blend/a.ts', "import { create } from 'zustand';"],
    ['blend/a.ts', "import { LineChart } from 'recharts';"],
    ['blend/a.ts', "import 'node:fs';"],
    ['blend/a.ts', "const chart = await import('recharts');"],
    ['blend/a.ts', "export * from '../optimise/order';"],
    ['blend/a.ts', "import type { Order } from '../optimise/order';"],
    ['blend/a.ts', "let order: import('../optimise/order').Order;"],
    ['stock/a.ts', "import {\n  type A,\n  b,\n} from '../property/viscosityIndex';"],
    ['optimise/rows/a.ts', "import { toOrder } from '../../workbook/toOrder';"],
    ['optimise/a.ts', "import { solveBlend } from '../index';"],
    ['workbook/a.ts', "import { openStore } from '../../app/storage/store';"],
    ['extra/a.ts', "import { stock } from '../stock/stock';"],
    ['blend/a.ts', "document.title = 'x';"],
    ['blend/a.ts', 'const width = window.innerWidth;'],
    ['blend/a.ts', "localStorage.setItem('a', 'b');"],
    ['blend/a.ts', "indexedDB.open('a');"],
    ['blend/a.ts', 'const start = performance.now();'],
    ['blend/a.ts', 'globalThis.x = 1;'],
    ['blend/a.ts', 'const { crypto } = globalThis;'],
    ['blend/a.ts', 'type Page = typeof document.body; use(document, 1);'],
    ['blend/a.ts', 'const now = Date.now();'],
    ['blend/a.ts', 'const now = new Date();'],
    ['optimise/outcome.ts', 'const now = Date.now();'],
    ['blend/a.ts', 'const x = Math.random();'],
    ['blend/a.ts', '/* import */ const now = Date // the day\n  .now();'],
  ])('finds the fault in %s: %s', (file, code) => {
    expect(sourceProblems(file, code)).toHaveLength(1);
  });

  it.each([
    ['blend/a.ts', "import type { Stock } from '../stock/stock';"],
    ['optimise/linear/highsEngine.ts', "import loadHighs from 'highs';"],
    ['optimise/solveOptions.ts', 'const now = () => Date.now();'],
    ['index.ts', "export { solveBlend } from './optimise/solveBlend';"],
    ['blend/a.ts', '// import "react"; window.alert(Date.now())\nconst text = "performance.now()";'],
    ['property/a.ts', 'const inside = range.window.min;'],
    ['workbook/a.ts', 'const read = (document: Document) => document.lots;'],
  ])('accepts %s: %s', (file, code) => {
    expect(sourceProblems(file, code)).toEqual([]);
  });

  it('finds deep imports of the face', () => {
    expect(appProblems('state/a.ts', "import { solveBlend } from '../../src';")).toEqual([]);
    expect(appProblems('main.tsx', "import { solveBlend } from '../src/index';")).toEqual([]);
    expect(appProblems('state/a.ts', "import { order } from '../../src/optimise/order';")).toHaveLength(1);
    expect(appProblems('state/a.ts', "import type { Order } from '../../src/optimise/order';")).toHaveLength(1);
  });
});
