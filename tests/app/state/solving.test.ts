import { act, renderHook } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import { answerOf, setAnswer, useAnswer, useAnswers, useDelay500 } from '../../../app/state/answerStore';
import { cancelSolve, startSolving } from '../../../app/state/solving';
import { selectOrder } from '../../../app/state/viewStore';
import { editWorkbook, openWorkbook, undo } from '../../../app/state/workbookStore';
import { createSolverClient } from '../../../app/worker/solverClient';
import { FakeWorkers } from '../worker/fakeWorker';
import { resetStores, testEnvironment } from './testEnvironment';

const FIRST = 'vg-46-hydraulic';
const SECOND = 'driveline-6';

let workers: FakeWorkers;
let end: () => void;

beforeEach(() => {
  resetStores();
  testEnvironment({ now: () => 1234 });
  openWorkbook(demoWorkbook());
  selectOrder(FIRST);
  workers = new FakeWorkers();
  end = startSolving(createSolverClient({ createWorker: workers.create }));
});

afterEach(() => end());

const viOf = (vi: number, id = FIRST) =>
  editWorkbook('vi', (draft) => {
    const limit = draft.orders.find((order) => order.id === id)?.limits.find(({ property }) => property === 'vi');
    if (limit) limit.min = vi;
  });

const askedVi = () =>
  workers.made.flatMap(({ asked }) =>
    asked.map(({ order }) => order.limits.find(({ property }) => property === 'vi')?.min),
  );

describe('the order on screen', () => {
  test('is solved without a click', () => {
    expect(askedVi()).toEqual([95]);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'solving', stale: false, sinceMs: 1234 });
    workers.last.answer(913);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'answered', stale: false, outcome: { costPerTonne: 913 } });
    expect(answerOf(FIRST).order?.stocks).toHaveLength(14);
  });

  test('grows stale with an edit at once, keeps its answer meanwhile, and is solved anew', () => {
    workers.last.answer(913);
    viOf(105);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'solving', stale: true, outcome: { costPerTonne: 913 } });
    expect(answerOf(FIRST).order?.limits[1]?.min).toBe(95);
    workers.last.answer(968);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'answered', stale: false, outcome: { costPerTonne: 968 } });
    expect(answerOf(FIRST).order?.limits[1]?.min).toBe(105);
  });

  test('in a drag shows each answer as it comes, greyed until the last is in', () => {
    workers.last.answer(913);
    for (const vi of [96, 97, 98, 99]) viOf(vi);
    workers.last.answer(920);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'solving', stale: true, outcome: { costPerTonne: 920 } });
    expect(answerOf(FIRST).order?.limits[1]?.min).toBe(96);
    workers.last.answer(930);
    expect(askedVi()).toEqual([95, 96, 99]);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'answered', stale: false, outcome: { costPerTonne: 930 } });
  });

  test('is not solved again for an edit that does not concern it, nor stale', () => {
    workers.last.answer(913);
    editWorkbook('note', (draft) => {
      for (const order of draft.orders) order.note = 'seen';
    });
    expect(askedVi()).toEqual([95]);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'answered', stale: false });
  });

  test('solves again what an undo brings back', () => {
    workers.last.answer(913);
    viOf(105);
    workers.last.answer(968);
    undo();
    workers.last.answer(913);
    expect(askedVi()).toEqual([95, 105, 95]);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'answered', stale: false, outcome: { costPerTonne: 913 } });
  });

  test('tells of products it cannot use and cells it cannot read', () => {
    editWorkbook('price', (draft) => {
      const [first, second] = draft.products;
      if (first) first.pricePerTonne = undefined;
      if (second) second.unread = { noack: '5,5,5' };
    });
    expect(answerOf(FIRST).omitted.map(({ productId }) => productId)).toEqual(['sn-150']);
    expect(answerOf(FIRST).unread.map(({ cell }) => cell)).toEqual(['noack']);
  });

  test('shows progress, and forgets it with the answer', () => {
    workers.last.say({ kind: 'progress', id: 1, progress: { milliseconds: 700, nodes: 12 } });
    expect(answerOf(FIRST).progress?.nodes).toBe(12);
    workers.last.answer(913);
    expect(answerOf(FIRST).progress).toBeUndefined();
  });

  test('that fails says so, keeps the former answer greyed, and is tried again with the next edit', () => {
    workers.last.say({ kind: 'ready' });
    workers.last.answer(913);
    viOf(105);
    workers.last.say({ kind: 'error', id: 2, message: 'odd' });
    expect(answerOf(FIRST)).toMatchObject({ phase: 'failed', stale: true, outcome: { costPerTonne: 913 } });
    expect(answerOf(FIRST).message).toMatch(/broke off \(odd\)/);
    viOf(106);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'solving', message: undefined });
  });
});

describe('several orders', () => {
  test('each keeps its answer; one not on screen is greyed by an edit and solved when it comes back', () => {
    workers.last.answer(913);
    selectOrder(SECOND);
    workers.last.answer(1182);
    viOf(131, SECOND);
    workers.last.answer(1190);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'answered', stale: true });
    selectOrder(FIRST);
    // Its own question did not change, so the answer still holds.
    expect(answerOf(FIRST)).toMatchObject({ phase: 'answered', stale: false, outcome: { costPerTonne: 913 } });
    expect(askedVi()).toEqual([95, 130, 131]);
  });

  test('one left while it is being solved is asked again when it comes back', () => {
    selectOrder(SECOND);
    selectOrder('multigrade-base');
    expect(answerOf(SECOND)).toMatchObject({ phase: 'idle' });
    workers.last.answer(913);
    workers.last.answer(1461);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'answered', outcome: { costPerTonne: 913 } });
    selectOrder(SECOND);
    expect(askedVi()).toEqual([95, 155, 130]);
  });

  test('the answer of a deleted order is forgotten', () => {
    workers.last.answer(913);
    editWorkbook('delete', (draft) => void draft.orders.splice(0, 1));
    expect(useAnswers.getState().answers).not.toHaveProperty(FIRST);
    undo();
    expect(askedVi().at(-1)).toBe(95);
  });
});

describe('an order left and come back to within a moment', () => {
  test('is asked again where its solve was dropped meanwhile, and so comes to an answer', async () => {
    vi.useFakeTimers();
    workers.last.say({ kind: 'ready' });
    selectOrder(SECOND);
    selectOrder(FIRST);
    // The order that waits makes the client lose patience with the one that runs.
    await vi.advanceTimersByTimeAsync(400);
    workers.last.answer(999, 'cancelled');
    await vi.advanceTimersByTimeAsync(0);
    expect(answerOf(FIRST).phase).toBe('solving');
    workers.last.answer(1182);
    workers.last.answer(913);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'answered', stale: false, outcome: { costPerTonne: 913 } });
    vi.useRealTimers();
  });
});

describe('cancelling', () => {
  test('concerns the order on screen, not one left behind that still runs', () => {
    workers.last.say({ kind: 'ready' });
    selectOrder(SECOND);
    cancelSolve();
    expect(workers.last.heard.map(({ kind }) => kind)).toEqual(['solve']);
    workers.last.answer(913);
    expect(answerOf(FIRST)).toMatchObject({ phase: 'answered', outcome: { costPerTonne: 913 } });
    expect(answerOf(SECOND).phase).toBe('idle');
  });

  test('shows what there was, said to be cancelled', () => {
    cancelSolve();
    expect(workers.last.heard.at(-1)).toEqual({ kind: 'cancel', id: 1 });
    workers.last.answer(999, 'cancelled');
    expect(answerOf(FIRST)).toMatchObject({ phase: 'answered', stale: false, outcome: { stopped: 'cancelled' } });
  });

  test('while a newer question waits leaves the older answer greyed, and nothing running', () => {
    viOf(105);
    cancelSolve();
    workers.last.answer(999, 'cancelled');
    expect(answerOf(FIRST)).toMatchObject({ phase: 'answered', stale: true });
    viOf(105.5);
    expect(askedVi()).toEqual([95, 105.5]);
  });
});

describe('hooks', () => {
  test('an order never solved is idle', () => {
    const { result } = renderHook(() => useAnswer('nobody'));
    expect(result.current).toMatchObject({ phase: 'idle', stale: false, omitted: [] });
    expect(renderHook(() => useAnswer(undefined)).result.current).toBe(result.current);
  });

  test('progress is worth showing after half a second of one solve, and not before', () => {
    vi.useFakeTimers();
    setAnswer('x', { phase: 'solving', sinceMs: 5 });
    const { result } = renderHook(() => useDelay500(useAnswer('x')));
    act(() => void vi.advanceTimersByTime(499));
    expect(result.current).toBe(false);
    act(() => void vi.advanceTimersByTime(1));
    expect(result.current).toBe(true);
    act(() => setAnswer('x', { phase: 'answered' }));
    expect(result.current).toBe(false);
    vi.useRealTimers();
  });
});
