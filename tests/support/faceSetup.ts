import '@testing-library/jest-dom/vitest';
import 'fake-indexeddb/auto';
import { cleanup } from '@testing-library/react';
import { afterEach, beforeEach } from 'vitest';
import { ConsoleGuard } from './consoleGuard';

let guard = new ConsoleGuard(console);

/** Declares that this test makes the console say something like this; anything else said there fails it. */
export function expectConsole(pattern: RegExp): void {
  guard.expect(pattern);
}

beforeEach(() => {
  guard = new ConsoleGuard(console);
  guard.start();
});

afterEach(() => {
  cleanup();
  guard.finish();
});
