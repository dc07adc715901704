import { fileURLToPath } from 'node:url';
import { expect, type Page, test } from '@playwright/test';
import { SECURITY_HEADERS } from '../../tools/contentSecurityPolicy.mjs';
import { startServer } from '../../tools/serve.mjs';
import { startListener } from './listener';

const PROBE = fileURLToPath(new URL('./probe', import.meta.url));

/** Runs the probe in a worker of a page, both served with the headers given, and tells what it and the stranger saw. */
async function leak(page: Page, headersFor: (pathname: string) => Record<string, string>) {
  const listener = await startListener();
  const server = await startServer({ folder: PROBE, headersFor });
  try {
    await page.goto(server.url);
    const attempts = await page.evaluate(
      ({ http, socket }) =>
        new Promise((resolve, reject) => {
          const worker = new Worker('probeWorker.js');
          worker.onmessage = ({ data }) => resolve(data);
          worker.onerror = ({ message }) => reject(new Error(message));
          worker.postMessage({ http, socket });
        }),
      { http: listener.http, socket: listener.socket },
    );
    return { attempts, received: [...listener.received].sort() };
  } finally {
    await server.close();
    await listener.close();
  }
}

test('a worker served with the policy reaches no other origin', async ({ page }) => {
  expect(await leak(page, () => SECURITY_HEADERS)).toEqual({
    attempts: { fetch: 'refused', socket: 'refused', events: 'refused', importScripts: 'refused' },
    received: [],
  });
});

test('the same worker served without it reaches them all, whatever the policy of its page: the probe can fail', async ({
  page,
}) => {
  const pageOnly = (pathname: string) => (pathname.endsWith('.js') ? {} : SECURITY_HEADERS);
  expect(await leak(page, pageOnly)).toEqual({
    attempts: { fetch: 'reached', socket: 'reached', events: 'reached', importScripts: 'reached' },
    received: ['/events', '/fetch', '/script.js', '/socket'],
  });
});
