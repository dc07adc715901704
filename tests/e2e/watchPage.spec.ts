import { fileURLToPath } from 'node:url';
import { expect, test } from '@playwright/test';
import { startServer } from '../../tools/serve.mjs';
import { startListener } from './listener';
import { staysHome, watchPage } from './watchPage';

const PROBE = fileURLToPath(new URL('./probe', import.meta.url));

// The guard that every journey relies on must itself be seen to fail.

test('the guard sees console errors, warnings, page errors and foreign requests', async ({ page }) => {
  const listener = await startListener();
  const server = await startServer({ folder: PROBE, headersFor: () => ({}) });
  try {
    const complaints = await watchPage(page, server.url);
    await page.goto(server.url);
    expect(complaints()).toEqual([]);
    await page.evaluate(async (address) => {
      console.error('an error');
      console.warn('a warning');
      setTimeout(() => {
        throw new Error('thrown later');
      });
      await fetch(address);
    }, listener.http);
    await expect
      .poll(complaints)
      .toEqual(
        expect.arrayContaining([
          'console: an error',
          'console: a warning',
          'page error: thrown later',
          `another origin: ${listener.http}/`,
        ]),
      );
  } finally {
    await server.close();
    await listener.close();
  }
});

test('the guard sees a broken policy', async ({ page }) => {
  const server = await startServer();
  try {
    const complaints = await watchPage(page, server.url);
    await page.goto(`${server.url}/no-such-file`);
    await page.evaluate(() => {
      const script = document.createElement('script');
      script.textContent = '0';
      document.head.append(script);
    });
    await expect.poll(() => complaints().join('\n')).toContain('policy violation: script-src-elem inline');
  } finally {
    await server.close();
  }
});

test('only the own origin, and content held in the address itself, count as staying home', () => {
  expect(staysHome('http://127.0.0.1:1/a', 'http://127.0.0.1:1')).toBe(true);
  expect(staysHome('blob:http://127.0.0.1:1/x', 'http://127.0.0.1:1')).toBe(true);
  expect(staysHome('http://127.0.0.1:2/a', 'http://127.0.0.1:1')).toBe(false);
  expect(staysHome('https://127.0.0.1:1/a', 'http://127.0.0.1:1')).toBe(false);
});
