import { readdirSync } from 'node:fs';
import path from 'node:path';
import { SECURITY_HEADERS } from '../../tools/contentSecurityPolicy.mjs';
import { DIST } from '../../tools/serve.mjs';
import { expect, test } from './fixtures';
import { startListener } from './listener';

const PAGE = ['/', '/no-such-file'];
const FILES = readdirSync(DIST, { recursive: true, withFileTypes: true })
  .filter((entry) => entry.isFile())
  .map((entry) => `/${path.relative(DIST, path.join(entry.parentPath, entry.name)).split(path.sep).join('/')}`);

/** Every header of `SECURITY_HEADERS` as the response has it. */
function securityHeadersOf(headers: Record<string, string>) {
  return Object.fromEntries(Object.keys(SECURITY_HEADERS).map((name) => [name, headers[name.toLowerCase()]]));
}

test('every file of the build carries the policy: page, scripts, worker, wasm, and what is not there', async ({
  request,
}) => {
  for (const address of [...PAGE, ...FILES]) {
    const response = await request.get(address);
    expect(securityHeadersOf(response.headers()), address).toEqual(SECURITY_HEADERS);
  }
});

test('each file comes with its type, hashed files are kept and the page is asked for anew', async ({ request }) => {
  const wasm = FILES.find((file) => file.endsWith('.wasm'));
  expect(wasm, 'the build has HiGHS as a wasm file').toBeDefined();
  const program = await request.get(wasm ?? '');
  expect(program.headers()['content-type']).toBe('application/wasm');
  expect(program.headers()['cache-control']).toContain('immutable');
  const index = await request.get('/');
  expect(index.headers()['content-type']).toMatch(/^text\/html/);
  expect(index.headers()['cache-control']).toBe('no-cache');
});

test('no path climbs out of the served folder', async ({ request }) => {
  for (const address of [
    '/../package.json',
    '/..%2fpackage.json',
    '/%2e%2e/package.json',
    '/assets/..%5c..%5cpackage.json',
  ]) {
    const response = await request.get(address);
    expect(await response.text(), address).not.toContain('"basewright"');
    expect(response.status(), address).toBe(404);
  }
});

test("the app's own worker, running with the wasm loaded, reaches no other origin", async ({ page, allowMessage }) => {
  const listener = await startListener();
  try {
    const seen: Record<string, Record<string, string>> = {};
    page.on('response', (response) => {
      seen[new URL(response.url()).pathname] = response.headers();
    });
    const wasmLoaded = page.waitForResponse((response) => response.url().endsWith('.wasm'));
    await page.goto('/');
    await wasmLoaded;
    for (const [address, headers] of Object.entries(seen)) {
      expect(headers['content-security-policy'], address).toBe(SECURITY_HEADERS['Content-Security-Policy']);
    }
    const workers = page.workers();
    expect(workers.length).toBeGreaterThan(0);
    allowMessage(/Content Security Policy/);
    for (const worker of workers) {
      expect(Object.keys(seen)).toContain(new URL(worker.url()).pathname);
      const attempt = await worker.evaluate(
        (address) =>
          fetch(address).then(
            () => 'reached',
            () => 'refused',
          ),
        listener.http,
      );
      expect(attempt).toBe('refused');
    }
    expect(listener.received).toEqual([]);
  } finally {
    await listener.close();
  }
});
