import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { askSecondEngine, type Opinion } from '../../../app/worker/secondOpinion';
import { FakeWorkers, orderOf } from './fakeWorker';

let workers: FakeWorkers;
let said: Opinion[];
let giveUp: () => void;

beforeEach(() => {
  vi.useFakeTimers();
  workers = new FakeWorkers();
  said = [];
  const settings = { createWorker: workers.create, timeLimitMs: 8000, graceMs: 5000 };
  giveUp = askSecondEngine(orderOf(10), settings, (opinion) => void said.push(opinion));
});

afterEach(() => vi.useRealTimers());

test('the second engine solves the order in a worker of its own, which is ended then', () => {
  expect(workers.made.map(({ kind }) => kind)).toEqual(['javascript']);
  expect(workers.last.asked[0]).toMatchObject({ order: { batchTonnes: 10 }, timeLimitMs: 8000 });
  workers.last.say({ kind: 'ready' });
  workers.last.answer(913);
  expect(said).toMatchObject([{ kind: 'answered', outcome: { costPerTonne: 913 } }]);
  expect(workers.last.terminated).toBe(true);
});

test('an engine that hangs is ended, and that is said', () => {
  vi.advanceTimersByTime(12_999);
  expect(said).toEqual([]);
  vi.advanceTimersByTime(1);
  expect(said).toEqual([{ kind: 'silent', afterMs: 13_000 }]);
  expect(workers.last.terminated).toBe(true);
});

test('a breakdown and an error are told once', () => {
  workers.last.crash('out of memory');
  workers.last.crash('out of memory');
  expect(said).toEqual([{ kind: 'failed', message: 'out of memory' }]);
});

test('given up, it says nothing more', () => {
  giveUp();
  expect(workers.last.terminated).toBe(true);
  vi.advanceTimersByTime(60_000);
  expect(said).toEqual([]);
});
