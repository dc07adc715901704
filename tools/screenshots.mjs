/**
 * `node tools/screenshots.mjs [folder] [address after the slash]`: full-page pictures of the built app at three
 * widths, light and dark, to be looked at. Default folder: test-results/screens.
 */
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { chromium } from '@playwright/test';
import { BROWSER_FLAGS, ensureBrowser } from './browser.mjs';
import { startServer } from './serve.mjs';

const WIDTHS = { 1440: 900, 1024: 768, 390: 844 };
const SCHEMES = /** @type {const} */ (['light', 'dark']);

/** The app is at rest when nothing loads and nothing is marked as busy. @param {import('@playwright/test').Page} page */
async function settle(page) {
  await page.waitForLoadState('networkidle');
  await page.waitForFunction(() => document.querySelector('[aria-busy="true"]') === null, undefined, {
    timeout: 30_000,
  });
  await page.waitForTimeout(500);
}

const [folder = 'test-results/screens', address = ''] = process.argv.slice(2);
mkdirSync(folder, { recursive: true });
const server = await startServer();
const browser = await chromium.launch({ executablePath: ensureBrowser(), args: BROWSER_FLAGS });
try {
  for (const [width, height] of Object.entries(WIDTHS)) {
    for (const colorScheme of SCHEMES) {
      const page = await browser.newPage({ viewport: { width: Number(width), height }, colorScheme });
      page.on('console', (message) => {
        if (message.type() === 'error' || message.type() === 'warning')
          console.error(`${width} ${colorScheme}: ${message.text()}`);
      });
      page.on('pageerror', (error) => console.error(`${width} ${colorScheme}: ${error.message}`));
      await page.goto(`${server.url}/${address}`);
      await settle(page);
      const file = path.join(folder, `${width}-${colorScheme}.png`);
      await page.screenshot({ path: file, fullPage: true });
      console.log(file);
      await page.close();
    }
  }
} finally {
  await browser.close();
  await server.close();
}
