import { expect, test, vi } from 'vitest';
import { unguarded, webLock } from '../../../app/storage/writerLock';
import { fakeLocks } from './fakeLocks';

test('one page writes a workbook, the other may not, until the first lets go', async () => {
  const locks = fakeLocks();
  const [first, second] = [webLock(locks), webLock(locks)];
  expect(await first.hold('a')).toBe(true);
  expect(first.held()).toBe('a');
  expect(await second.hold('a')).toBe(false);
  expect(second.held()).toBeUndefined();
  first.release();
  expect(await second.hold('a')).toBe(true);
});

test('another workbook is another lock; going over to it frees the former', async () => {
  const locks = fakeLocks();
  const [first, second] = [webLock(locks), webLock(locks)];
  await first.hold('a');
  expect(await second.hold('b')).toBe(true);
  expect(await first.hold('c')).toBe(true);
  expect(await second.hold('a')).toBe(true);
  expect(await first.hold('a')).toBe(false);
});

test('a page that asks while the former is still letting go gets the lock', async () => {
  const locks = fakeLocks();
  const [leaving, reloaded] = [webLock(locks), webLock(locks)];
  await leaving.hold('a');
  const answer = reloaded.hold('a');
  leaving.release();
  expect(await answer).toBe(true);
});

test('asking twice at once is asking once', async () => {
  const lock = webLock(fakeLocks());
  expect(await Promise.all([lock.hold('a'), lock.hold('a')])).toEqual([true, true]);
});

test('holding twice is holding once', async () => {
  const lock = webLock(fakeLocks());
  expect([await lock.hold('a'), await lock.hold('a')]).toEqual([true, true]);
});

test('without Web Locks every page writes', async () => {
  expect(await unguarded().hold('a')).toBe(true);
});

test('a browser that answers late is not taken for another tab', async () => {
  vi.useFakeTimers();
  const answer = webLock(fakeLocks({ answersAfterMs: 3_000 })).hold('a');
  await vi.advanceTimersByTimeAsync(3_000);
  vi.useRealTimers();
  expect(await answer).toBe(true);
});
