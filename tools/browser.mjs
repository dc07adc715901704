/**
 * Finds a Chrome or Chromium for the journeys, installs one where none is found, and otherwise fails with a message:
 * the journeys are never left out in silence.
 */
import { execFileSync } from 'node:child_process';
import { accessSync, constants, existsSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { chromium } from '@playwright/test';
import { binOf } from './packageBin.mjs';

const NAMES = ['chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable', 'chrome'];

/** Where an installer of Chrome or Chromium puts it. */
function usualPlaces() {
  if (process.platform === 'darwin') {
    return ['/Applications', path.join(os.homedir(), 'Applications')].flatMap((folder) => [
      path.join(folder, 'Google Chrome.app/Contents/MacOS/Google Chrome'),
      path.join(folder, 'Chromium.app/Contents/MacOS/Chromium'),
    ]);
  }
  if (process.platform === 'win32') {
    return [process.env.PROGRAMFILES, process.env['PROGRAMFILES(X86)'], process.env.LOCALAPPDATA].flatMap((folder) =>
      folder
        ? [
            path.join(folder, 'Google/Chrome/Application/chrome.exe'),
            path.join(folder, 'Chromium/Application/chrome.exe'),
          ]
        : [],
    );
  }
  return ['/opt/google/chrome/chrome', '/snap/bin/chromium'];
}

function onSearchPath() {
  const folders = (process.env.PATH ?? '').split(path.delimiter).filter(Boolean);
  const ending = process.platform === 'win32' ? '.exe' : '';
  return NAMES.flatMap((name) => folders.map((folder) => path.join(folder, name + ending)));
}

/** @param {string} file */
function runs(file) {
  try {
    accessSync(file, constants.X_OK);
    // On Windows "--version" opens a window instead of printing.
    if (process.platform !== 'win32') execFileSync(file, ['--version'], { stdio: 'ignore', timeout: 60_000 });
    return true;
  } catch {
    return false;
  }
}

/** The path of an installed browser, or undefined. A path that the user named must work. */
export function findBrowser() {
  for (const name of ['CHROMIUM_PATH', 'CHROME_PATH']) {
    const named = process.env[name];
    if (!named) continue;
    if (!runs(named))
      throw new Error(`${name} is "${named}", which is not a browser that runs. Correct it, or unset it.`);
    return named;
  }
  return [...onSearchPath(), ...usualPlaces(), chromium.executablePath()].find(
    (file) => existsSync(file) && runs(file),
  );
}

/** @returns {{ title: string, run: () => void }[]} */
function waysToInstall() {
  const ways = [
    {
      title: 'npx playwright install chromium',
      run: () =>
        void execFileSync(process.execPath, [binOf('@playwright/test', 'playwright'), 'install', 'chromium'], {
          stdio: 'inherit',
          timeout: 300_000,
        }),
    },
  ];
  if (process.platform === 'linux' && process.getuid?.() === 0 && existsSync('/usr/bin/apt-get')) {
    ways.push({
      title: 'apt-get install chromium',
      run: () => {
        const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
        execFileSync('apt-get', ['update', '-q'], { stdio: 'inherit', timeout: 300_000, env });
        execFileSync('apt-get', ['install', '-y', '-q', 'chromium'], { stdio: 'inherit', timeout: 900_000, env });
      },
    });
  }
  return ways;
}

/** The path of a browser, installed if need be. Throws where there is none and none can be installed. */
export function ensureBrowser() {
  const found = findBrowser();
  if (found) return found;
  for (const way of waysToInstall()) {
    console.log(`No Chrome or Chromium found; trying: ${way.title}`);
    try {
      way.run();
    } catch (error) {
      console.error(`"${way.title}" failed: ${error instanceof Error ? error.message : error}`);
    }
    const installed = findBrowser();
    if (installed) return installed;
  }
  throw new Error(
    'The journeys need Chrome or Chromium, and none was found or could be installed. Install one of them, or set ' +
      'CHROMIUM_PATH to its program file, and run the tests again.',
  );
}

/** Quiet and repeatable: no sandbox as root or in a container, and no traffic of the browser's own. */
export const BROWSER_FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];
