import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { createSolverClient, type SolverClient } from '../../../app/worker/solverClient';
import { explanationOf, FakeWorkers, orderOf, outcomeOf } from './fakeWorker';

let workers: FakeWorkers;
let client: SolverClient;

beforeEach(() => {
  vi.useFakeTimers();
  workers = new FakeWorkers();
  client = createSolverClient({ createWorker: workers.create });
});

afterEach(() => {
  client.dispose();
  vi.useRealTimers();
});

/** Solves an order and keeps what is said about it. */
function solve(batchTonnes: number): string[] {
  const said: string[] = [];
  client.solve(orderOf(batchTonnes), {
    onProgress: ({ nodes }) => void said.push(`progress ${nodes}`),
    onOutcome: ({ costPerTonne, stopped }, notice) =>
      void said.push(`${stopped} ${costPerTonne} ${notice ?? ''}`.trim()),
    onFailed: (message) => void said.push(`failed: ${message}`),
    onDropped: () => void said.push('dropped'),
  });
  return said;
}

const batches = () => workers.made.map(({ asked }) => asked.map(({ order }) => order.batchTonnes));

describe('the latest order wins', () => {
  test('no worker is made before there is something to solve', () => {
    expect(workers.made).toHaveLength(0);
  });

  test('one solve runs, the newest waits, those between are dropped', () => {
    const said = [1, 2, 3, 4].map(solve);
    expect(batches()).toEqual([[1]]);
    workers.last.say({ kind: 'ready' });
    workers.last.answer(900);
    expect(batches()).toEqual([[1, 4]]);
    workers.last.answer(950);
    expect(said).toEqual([['finished 900'], ['dropped'], ['dropped'], ['finished 950']]);
  });

  test('a slow solve is cancelled for the newer order, and its half answer not shown', () => {
    const first = solve(1);
    workers.last.say({ kind: 'ready' });
    const second = solve(2);
    vi.advanceTimersByTime(399);
    expect(workers.last.heard).toHaveLength(1);
    vi.advanceTimersByTime(1);
    expect(workers.last.heard.at(-1)).toEqual({ kind: 'cancel', id: 1 });
    workers.last.answer(999, 'cancelled');
    workers.last.answer(950);
    expect(first).toEqual(['dropped']);
    expect(second).toEqual(['finished 950']);
  });

  test('an answer that was ready before the cancel arrived still counts', () => {
    const first = solve(1);
    workers.last.say({ kind: 'ready' });
    solve(2);
    vi.advanceTimersByTime(400);
    workers.last.answer(900);
    expect(first).toEqual(['finished 900']);
  });

  test('progress and answers of another id are not taken', () => {
    const said = solve(1);
    workers.last.say({ kind: 'progress', id: 77, progress: { milliseconds: 1, nodes: 5 } });
    workers.last.say({ kind: 'progress', id: 1, progress: { milliseconds: 1, nodes: 6 } });
    expect(said).toEqual(['progress 6']);
  });
});

describe('cancelling', () => {
  test('ends the running solve with what it has, and forgets the one that waits', () => {
    const first = solve(1);
    workers.last.say({ kind: 'ready' });
    const second = solve(2);
    client.cancel();
    workers.last.answer(999, 'cancelled');
    expect(first).toEqual(['cancelled 999']);
    expect(second).toEqual(['dropped']);
    expect(batches()).toEqual([[1]]);
  });

  test('a worker that does not hear the cancel is ended, and that is said', () => {
    const said = solve(1);
    workers.last.say({ kind: 'ready' });
    client.cancel();
    vi.advanceTimersByTime(2_000);
    expect(workers.last.terminated).toBe(true);
    expect(said[0]).toMatch(/^failed: Cancelled: the solver had to be ended, so there is no answer/);
    solve(2);
    expect(batches()).toEqual([[1], [2]]);
  });

  test('with nothing to solve does nothing', () => {
    client.cancel();
    expect(workers.made).toHaveLength(0);
  });
});

describe('cancelling by subject', () => {
  const quiet = { onOutcome: () => {}, onFailed: () => {} };

  test('leaves the solve of another subject alone, with all the time it needs', () => {
    client.solve(orderOf(1), quiet, 'a');
    workers.last.say({ kind: 'ready' });
    const dropped: string[] = [];
    client.solve(orderOf(2), { ...quiet, onDropped: (why) => void dropped.push(why) }, 'b');
    client.cancel('b');
    vi.advanceTimersByTime(5_000);
    expect(dropped).toEqual(['by the user']);
    expect(workers.last.heard.map(({ kind }) => kind)).toEqual(['solve']);
    client.cancel('a');
    expect(workers.last.heard.at(-1)).toEqual({ kind: 'cancel', id: 1 });
  });
});

test('an order cancelled while the engine loads is not sent to the second engine when that fails', () => {
  const said = solve(1);
  client.cancel();
  workers.last.say({ kind: 'no engine', message: 'blocked' });
  expect(said).toEqual([expect.stringMatching(/^failed: Cancelled/)]);
  expect(batches()).toEqual([[1]]);
  solve(2);
  expect(workers.last.kind).toBe('javascript');
  expect(batches()).toEqual([[1], [2]]);
});

describe('a worker in trouble', () => {
  test('one that breaks down is replaced, the order sent once more, and the user told', () => {
    const said = solve(1);
    workers.last.say({ kind: 'ready' });
    workers.last.crash('out of memory');
    expect(workers.made.map(({ kind, terminated }) => [kind, terminated])).toEqual([
      ['highs', true],
      ['highs', false],
    ]);
    expect(batches()).toEqual([[1], [1]]);
    workers.last.say({ kind: 'ready' });
    workers.last.answer(900);
    expect(said).toEqual([
      'finished 900 The solver broke down and was started again; this answer comes from the new start.',
    ]);
  });

  test('breaking down twice on one order is the end of that order, not of the next', () => {
    const said = solve(1);
    for (const reason of ['first', 'second']) {
      workers.last.say({ kind: 'ready' });
      workers.last.crash(reason);
    }
    expect(said).toHaveLength(1);
    expect(said[0]).toMatch(
      /^failed: The solver broke down twice on this order \(second\)\. Change the order or reload/,
    );
    solve(2);
    expect(batches()).toEqual([[1], [1], [2]]);
  });

  test('one that breaks down while idle is replaced without a word', () => {
    const said = solve(1);
    workers.last.say({ kind: 'ready' });
    workers.last.answer(900);
    workers.last.crash('idle');
    solve(2);
    expect(said).toEqual(['finished 900']);
    expect(batches()).toEqual([[1], [2]]);
  });

  test('one that hangs is replaced after its time limit and a grace', () => {
    const said = solve(1);
    workers.last.say({ kind: 'ready' });
    vi.advanceTimersByTime(24_999);
    expect(workers.made).toHaveLength(1);
    vi.advanceTimersByTime(1);
    expect(batches()).toEqual([[1], [1]]);
    workers.last.say({ kind: 'ready' });
    vi.advanceTimersByTime(25_000);
    expect(said[0]).toMatch(/^failed: The solver stopped answering twice on this order/);
  });

  test('progress is a sign of life', () => {
    solve(1);
    workers.last.say({ kind: 'ready' });
    for (let step = 0; step < 4; step += 1) {
      vi.advanceTimersByTime(20_000);
      workers.last.say({ kind: 'progress', id: 1, progress: { milliseconds: 1, nodes: step } });
    }
    expect(workers.made).toHaveLength(1);
  });

  test('a late word from a worker that was ended counts no more', () => {
    const said = solve(1);
    const first = workers.last;
    first.say({ kind: 'ready' });
    first.crash('gone');
    first.answer(111);
    expect(said).toEqual([]);
  });

  test('an error inside the solve is told', () => {
    const said = solve(1);
    workers.last.say({ kind: 'ready' });
    workers.last.say({ kind: 'error', id: 1, message: 'no such row' });
    expect(said[0]).toMatch(/^failed: The solver broke off \(no such row\)/);
  });
});

describe('the second engine', () => {
  const NOTICE = /so a slower one answers\. Reload the page to try the main one again\.$/;

  test('answers where the wasm does not load, and each answer says so', () => {
    const first = solve(1);
    workers.last.say({ kind: 'no engine', message: 'wasm refused' });
    expect(workers.made.map(({ kind }) => kind)).toEqual(['highs', 'javascript']);
    expect(workers.made[0]?.terminated).toBe(true);
    workers.last.say({ kind: 'ready' });
    workers.last.answer(900);
    const second = solve(2);
    workers.last.answer(950);
    expect(first[0]).toMatch(/^finished 900 The main solver could not be loaded \(wasm refused\)/);
    expect(first[0]).toMatch(NOTICE);
    expect(second[0]).toMatch(NOTICE);
    expect(workers.made).toHaveLength(2);
  });

  test('answers where the main worker breaks down before it is ready', () => {
    solve(1);
    workers.last.crash('');
    expect(workers.made.map(({ kind }) => kind)).toEqual(['highs', 'javascript']);
  });

  test('answers where the main solver has not loaded in a minute', () => {
    solve(1);
    vi.advanceTimersByTime(60_000);
    expect(batches()).toEqual([[1], [1]]);
    expect(workers.last.kind).toBe('javascript');
  });

  test('that hangs is killed, and the user told what to do', () => {
    const said = solve(1);
    workers.last.say({ kind: 'no engine', message: 'x' });
    workers.last.say({ kind: 'ready' });
    vi.advanceTimersByTime(13_000);
    expect(workers.last.terminated).toBe(true);
    expect(said[0]).toMatch(
      /^failed: The slower solver did not answer in 13 s and was ended\. Change a limit a little/,
    );
    solve(2);
    expect(workers.last.kind).toBe('javascript');
    expect(batches()).toEqual([[1], [1], [2]]);
  });

  test('where no worker can be made at all, that is said once', () => {
    client = createSolverClient({
      createWorker() {
        throw new Error('workers refused');
      },
    });
    const said = solve(1);
    expect(said).toHaveLength(1);
    expect(said[0]).toMatch(/^failed: No solver can be started here \(workers refused\)/);
  });
});

describe('questions', () => {
  function ask(batchTonnes: number): string[] {
    const said: string[] = [];
    const order = orderOf(batchTonnes);
    client.ask(
      { kind: 'recipe', order, outcome: outcomeOf(900) },
      {
        onTold: ({ value }) => void said.push(`told after ${value && 'solves' in value ? value.solves : '?'}`),
        onFailed: (message) => void said.push(`failed: ${message}`),
        onDropped: () => void said.push('dropped'),
      },
    );
    return said;
  }
  const askedAbout = () => workers.last.questions.map(({ question }) => question.order.batchTonnes);

  test('are asked one after the other, once nothing is to be solved', () => {
    solve(1);
    const said = [ask(1), ask(2)];
    workers.last.say({ kind: 'ready' });
    expect(askedAbout()).toEqual([]);
    workers.last.answer(900);
    expect(askedAbout()).toEqual([1]);
    workers.last.tell(explanationOf(7));
    expect(askedAbout()).toEqual([1, 2]);
    workers.last.tell(explanationOf(8));
    expect(said).toEqual([['told after 7'], ['told after 8']]);
  });

  test('give way to an order, which is sent at once and under a newer number', () => {
    const said = [ask(1), ask(2)];
    workers.last.say({ kind: 'ready' });
    const solved = solve(3);
    expect(said).toEqual([['dropped'], ['dropped']]);
    expect(workers.last.asked.at(-1)?.id).toBeGreaterThan(workers.last.questions.at(-1)?.id ?? Infinity);
    // The question ends with what it has, which nobody waits for any more.
    workers.last.tell(explanationOf(1));
    workers.last.answer(950);
    expect(said).toEqual([['dropped'], ['dropped']]);
    expect(solved).toEqual(['finished 950']);
  });

  test('that does not end for an order costs its worker, and the order is sent anew', () => {
    ask(1);
    workers.last.say({ kind: 'ready' });
    const solved = solve(3);
    vi.advanceTimersByTime(1500);
    expect(workers.made).toHaveLength(2);
    workers.last.say({ kind: 'ready' });
    workers.last.answer(950);
    expect(solved[0]).toMatch(/^finished 950 .*started again/);
  });

  test('that gets no answer is told as missing, and the next one goes to a new worker', () => {
    const said = [ask(1), ask(2)];
    workers.last.say({ kind: 'ready' });
    vi.advanceTimersByTime(15_000);
    expect(said[0]?.[0]).toMatch(/did not answer in time.*the answer itself stands/);
    expect(workers.made).toHaveLength(2);
    workers.last.say({ kind: 'ready' });
    workers.last.tell(explanationOf(9));
    expect(said[1]).toEqual(['told after 9']);
  });

  test('that breaks off says so, and does not keep an order waiting', () => {
    const said = ask(1);
    workers.last.say({ kind: 'ready' });
    workers.last.say({ kind: 'error', id: workers.last.questions[0]?.id ?? 0, message: 'out of memory' });
    expect(said).toEqual(['failed: out of memory']);
    const solved = solve(2);
    workers.last.answer(900);
    expect(solved).toEqual(['finished 900']);
  });

  test('are asked of the second engine where the first cannot be had', () => {
    const said = ask(1);
    workers.last.say({ kind: 'no engine', message: 'wasm refused' });
    expect(workers.last.kind).toBe('javascript');
    workers.last.say({ kind: 'ready' });
    workers.last.tell(explanationOf(3));
    expect(said).toEqual(['told after 3']);
  });
});
