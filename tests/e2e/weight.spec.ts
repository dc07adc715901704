import { readFileSync } from 'node:fs';
import path from 'node:path';
import { gzipSync } from 'node:zlib';
import { DIST } from '../../tools/serve.mjs';
import { expect, test } from './fixtures';

/** The most JavaScript the page may need before it paints [bytes, gzipped]. */
const INITIAL_BUDGET = 250_000;

/** The script of the page and all that it imports statically, chunk by chunk. */
function initialScripts(): Map<string, string> {
  const html = readFileSync(path.join(DIST, 'index.html'), 'utf8');
  const scripts = new Map<string, string>();
  const queue = [...html.matchAll(/(?:src|href)="\.\/(assets\/[^"]+\.js)"/g)].map((match) => match[1]);
  for (let file = queue.pop(); file !== undefined; file = queue.pop()) {
    if (scripts.has(file)) continue;
    const code = readFileSync(path.join(DIST, file), 'utf8');
    scripts.set(file, code);
    for (const [, imported] of code.matchAll(/(?:\bfrom|\bimport)\s*["']\.\/([^"']+\.js)["']/g))
      queue.push(`assets/${imported}`);
  }
  return scripts;
}

test('the page needs at most 250 kB of JavaScript, gzipped, and neither the chart nor the wasm, to start', () => {
  const scripts = initialScripts();
  expect(scripts.size).toBeGreaterThan(0);
  const bytes = [...scripts.values()].reduce((sum, code) => sum + gzipSync(code).length, 0);
  console.log(`Initial JavaScript: ${(bytes / 1000).toFixed(1)} kB gzipped in ${scripts.size} files.`);
  expect(bytes).toBeLessThanOrEqual(INITIAL_BUDGET);
  expect([...scripts.keys()].filter((file) => path.basename(file).startsWith('chart-'))).toEqual([]);
  expect([...scripts.values()].some((code) => code.includes('recharts-'))).toBe(false);
});

test('the first paint waits for neither the wasm nor the chart', async ({ page }) => {
  let release = () => {};
  const held = new Promise<void>((resolve) => {
    release = resolve;
  });
  const asked: string[] = [];
  await page.route(/\.wasm$|\/chart-[^/]+\.js$/, async (route) => {
    asked.push(new URL(route.request().url()).pathname);
    await held;
    await route.continue();
  });
  await page.goto('/', { waitUntil: 'commit' });
  await expect(page.getByRole('main')).toBeVisible();
  await expect.poll(() => asked.some((address) => address.endsWith('.wasm'))).toBe(true);
  release();
});
