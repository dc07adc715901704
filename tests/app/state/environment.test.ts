import { expect, test, vi } from 'vitest';
import { browserEnvironment } from '../../../app/state/environment';

// Secure Contexts, W3C: a page over plain http has no crypto.randomUUID, but it has crypto.getRandomValues.
test('ids are made on a page served over plain http too, and differ', () => {
  vi.stubGlobal('crypto', { getRandomValues: crypto.getRandomValues.bind(crypto) });
  const { newId } = browserEnvironment();
  const ids = new Set(Array.from({ length: 100 }, newId));
  vi.unstubAllGlobals();
  expect(ids.size).toBe(100);
  for (const id of ids) expect(id).toMatch(/^[0-9a-f]{32}$/);
});
