import { defineConfig } from '@playwright/test';
import { BROWSER_FLAGS, ensureBrowser } from './tools/browser.mjs';

// Read again in each worker process: the first reading finds (or installs) the browser, the others are told.
process.env.CHROMIUM_PATH = ensureBrowser();

export default defineConfig({
  testDir: 'tests/e2e',
  outputDir: 'test-results/journeys',
  globalSetup: './tests/e2e/globalSetup.ts',
  fullyParallel: false,
  workers: 1,
  retries: 0,
  forbidOnly: true,
  failOnFlakyTests: true,
  timeout: 60_000,
  expect: { timeout: 15_000 },
  reporter: 'list',
  use: {
    browserName: 'chromium',
    launchOptions: { executablePath: process.env.CHROMIUM_PATH, args: BROWSER_FLAGS },
    viewport: { width: 1440, height: 900 },
    locale: 'en-GB',
    trace: 'off',
    screenshot: 'only-on-failure',
  },
});
