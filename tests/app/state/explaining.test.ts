import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import { answerOf, useAnswers } from '../../../app/state/answerStore';
import {
  askSecondOpinion,
  OPEN_EDIT_MS,
  SETTLED_MS,
  setRounding,
  startExplaining,
} from '../../../app/state/explaining';
import { explainedOf, useExplain } from '../../../app/state/explainStore';
import { startSolving } from '../../../app/state/solving';
import { selectOrder } from '../../../app/state/viewStore';
import { editWorkbook, endEdit, openWorkbook } from '../../../app/state/workbookStore';
import { createSolverClient } from '../../../app/worker/solverClient';
import { explanationOf, FakeWorkers, outcomeOf } from '../worker/fakeWorker';
import { resetStores, testEnvironment } from './testEnvironment';

const FIRST = 'vg-46-hydraulic';
const SECOND = 'driveline-6';

let workers: FakeWorkers;
let ends: (() => void)[];

beforeEach(() => {
  vi.useFakeTimers();
  resetStores();
  testEnvironment({ now: () => 1234 });
  openWorkbook(demoWorkbook());
  selectOrder(FIRST);
  workers = new FakeWorkers();
  const solver = createSolverClient({ createWorker: workers.create });
  ends = [startExplaining(solver), startSolving(solver)];
  workers.last.say({ kind: 'ready' });
});

afterEach(() => {
  for (const end of ends) end();
  vi.useRealTimers();
});

const viOf = (vi: number, join?: string) =>
  editWorkbook(
    'vi',
    (draft) => {
      const limit = draft.orders.find(({ id }) => id === FIRST)?.limits.find(({ property }) => property === 'vi');
      if (limit) limit.min = vi;
    },
    { join },
  );

const kinds = () => workers.last.questions.map(({ question }) => question.kind);
const settle = (ms = SETTLED_MS) => vi.advanceTimersByTime(ms);
const tellNoOthers = () =>
  workers.last.tell({ kind: 'alternatives', value: { list: [], stopped: 'finished', solves: 1 } });

describe('an answer', () => {
  test('is explained once it has settled, and once only', () => {
    workers.last.answer(913);
    settle(SETTLED_MS - 1);
    expect(kinds()).toEqual([]);
    settle(1);
    expect(kinds()).toEqual(['recipe']);
    workers.last.tell(explanationOf(7));
    tellNoOthers();
    expect(kinds()).toEqual(['recipe', 'alternatives']);
    expect(explainedOf(FIRST).recipe).toMatchObject({ told: { value: { solves: 7 } } });
    expect(explainedOf(FIRST).recipe?.outcome).toBe(answerOf(FIRST).outcome);
    selectOrder(SECOND);
    workers.last.answer(1182);
    selectOrder(FIRST);
    settle();
    expect(kinds()).toEqual(['recipe', 'alternatives']);
  });

  test('that is followed by another is not explained, and the last one is', () => {
    workers.last.answer(913);
    settle(300);
    viOf(105);
    workers.last.answer(968);
    settle(300);
    expect(kinds()).toEqual([]);
    settle(100);
    expect(workers.last.questions.map(({ question }) => question.order.limits[1]?.min)).toEqual([105]);
  });

  test('waits longer while the edit is still open, and not once it has ended', () => {
    workers.last.answer(913);
    viOf(105, 'drag');
    workers.last.answer(968);
    settle(OPEN_EDIT_MS - 1);
    expect(kinds()).toEqual([]);
    endEdit();
    settle();
    expect(kinds()).toEqual(['recipe']);
  });

  test('that is out of date keeps what was told of it until the new one is told', () => {
    workers.last.answer(913);
    settle();
    workers.last.tell(explanationOf(7));
    const before = explainedOf(FIRST).recipe;
    viOf(105);
    workers.last.answer(968);
    expect(explainedOf(FIRST).recipe).toBe(before);
    settle();
    workers.last.tell(explanationOf(8));
    expect(explainedOf(FIRST).recipe).toMatchObject({ told: { value: { solves: 8 } } });
  });

  test('whose question was dropped for another order is explained when it is on screen again', () => {
    workers.last.answer(913);
    settle();
    selectOrder(SECOND);
    workers.last.answer(1182);
    selectOrder(FIRST);
    settle();
    expect(workers.last.questions.at(-1)?.question.order).toBe(answerOf(FIRST).order);
  });

  test('that is impossible is asked for its ladder alone; one that proves nothing for nothing', () => {
    const id = workers.last.asked.at(-1)?.id ?? 0;
    const { recipe: _, costPerTonne: __, ...bare } = outcomeOf(0);
    workers.last.say({ kind: 'outcome', id, outcome: { ...bare, proof: { kind: 'impossible' } } });
    settle();
    expect(kinds()).toEqual(['impossible']);
    viOf(105);
    workers.last.say({ kind: 'outcome', id: id + 2, outcome: { ...bare, proof: { kind: 'none' } } });
    settle();
    expect(kinds()).toEqual(['impossible']);
  });

  test('keeps the reason where a question has no answer', () => {
    workers.last.answer(913);
    settle();
    workers.last.say({ kind: 'error', id: workers.last.questions[0]?.id ?? 0, message: 'out of memory' });
    expect(explainedOf(FIRST).recipe).toMatchObject({ message: 'out of memory' });
    settle(10_000);
    expect(kinds().filter((kind) => kind === 'recipe')).toHaveLength(1);
  });

  test('is forgotten with its order', () => {
    workers.last.answer(913);
    settle();
    workers.last.tell(explanationOf(7));
    useAnswers.setState({ answers: {} });
    expect(useExplain.getState().explained).toEqual({});
  });
});

describe('rounding', () => {
  test('is asked for at once when chosen, and with every answer from then on', () => {
    workers.last.answer(913);
    settle();
    workers.last.tell(explanationOf(7));
    tellNoOthers();
    setRounding('5 kg');
    // The demo's batch is 10 t.
    expect(workers.last.questions.at(-1)?.question).toMatchObject({ kind: 'rounded', step: 0.0005 });
    workers.last.tell({ kind: 'rounded', value: undefined });
    expect(explainedOf(FIRST)).toMatchObject({ roundedTo: '5 kg', rounded: { told: { value: undefined } } });
    viOf(105);
    workers.last.answer(968);
    settle();
    workers.last.tell(explanationOf(8));
    tellNoOthers();
    expect(kinds().filter((kind) => kind === 'rounded')).toHaveLength(2);
  });
});

describe('the second opinion', () => {
  test('is asked of the second engine, and told with the answer it speaks of', () => {
    workers.last.answer(913);
    askSecondOpinion();
    expect(workers.last.kind).toBe('javascript');
    expect(explainedOf(FIRST).opinion?.told).toBeUndefined();
    workers.last.answer(913);
    expect(explainedOf(FIRST).opinion).toMatchObject({ told: { value: { outcome: { costPerTonne: 913 } } } });
    expect(explainedOf(FIRST).opinion?.outcome).toBe(answerOf(FIRST).outcome);
  });

  test('is not asked of an answer that is out of date', () => {
    workers.last.answer(913);
    viOf(105);
    askSecondOpinion();
    expect(workers.made).toHaveLength(1);
  });
});
