// @vitest-environment node
import { describe, expect, test } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import { answerQuestion } from '../../../app/worker/answerQuestion';
import type { FromWorker, ToWorker } from '../../../app/worker/protocol';
import { channelPause, serveSolves } from '../../../app/worker/serveSolves';
import { createEngine, type Order, toOrder } from '../../../src';

function demoOrder(): Order {
  const workbook = demoWorkbook();
  const [first] = workbook.orders;
  if (!first) throw new Error('The demo has no orders.');
  return toOrder(workbook, first).order;
}

/** Serves solves as a worker does, and waits for what it says. */
function serve(loadEngine: () => ReturnType<typeof createEngine> = createEngine) {
  const said: FromWorker[] = [];
  const waiting: { wanted: (message: FromWorker) => boolean; resolve: (message: FromWorker) => void }[] = [];
  const take = serveSolves({
    send(message) {
      said.push(message);
      for (const { wanted, resolve } of waiting) if (wanted(message)) resolve(message);
    },
    loadEngine,
    answerQuestion,
    now: () => performance.now(),
    pause: () => new Promise((resolve) => setImmediate(resolve)),
  });
  const until = (wanted: (message: FromWorker) => boolean) => {
    const already = said.find(wanted);
    return already
      ? Promise.resolve(already)
      : new Promise<FromWorker>((resolve) => void waiting.push({ wanted, resolve }));
  };
  return {
    take,
    said,
    until,
    outcomeOf: (id: number) => until((message) => message.kind === 'outcome' && message.id === id),
  };
}

const request = (id: number, order = demoOrder()): ToWorker => ({ kind: 'solve', id, order, timeLimitMs: 20_000 });

describe('the worker side', () => {
  test('says when its engine is there, and answers', async () => {
    const { take, said, outcomeOf } = serve();
    take(request(1));
    const message = await outcomeOf(1);
    expect(said[0]).toEqual({ kind: 'ready' });
    expect(message.kind === 'outcome' && message.outcome.proof.kind).toBe('least cost');
  });

  test('a newer request supersedes one that waits or runs', async () => {
    const { take, outcomeOf } = serve();
    take(request(1));
    take(request(2));
    const [first, second] = await Promise.all([outcomeOf(1), outcomeOf(2)]);
    expect(first.kind === 'outcome' && first.outcome.stopped).toBe('cancelled');
    expect(second.kind === 'outcome' && second.outcome.stopped).toBe('finished');
  });

  test('a cancel ends the request it names and no later one', async () => {
    const { take, outcomeOf } = serve();
    take(request(1));
    take({ kind: 'cancel', id: 1 });
    const first = await outcomeOf(1);
    take(request(2));
    const second = await outcomeOf(2);
    expect(first.kind === 'outcome' && first.outcome.stopped).toBe('cancelled');
    expect(second.kind === 'outcome' && second.outcome.stopped).toBe('finished');
  });

  test('answers a question about an answered order', async () => {
    const { take, until, outcomeOf } = serve();
    take(request(1));
    const answer = await outcomeOf(1);
    const outcome = answer.kind === 'outcome' ? answer.outcome : undefined;
    if (!outcome) throw new Error('There is no outcome.');
    take({ kind: 'ask', id: 2, question: { kind: 'recipe', order: demoOrder(), outcome }, timeLimitMs: 20_000 });
    const told = await until((message) => message.kind === 'told' && message.id === 2);
    expect(told).toMatchObject({ told: { kind: 'recipe', value: { stopped: 'finished' } } });
    expect(told.kind === 'told' && told.told.kind === 'recipe' && told.told.value.limits.length).toBeGreaterThan(0);
  });

  test('a newer order ends a question that runs', async () => {
    const { take, until, outcomeOf } = serve();
    const order = demoOrder();
    take(request(1));
    const answer = await outcomeOf(1);
    const outcome = answer.kind === 'outcome' ? answer.outcome : undefined;
    if (!outcome) throw new Error('There is no outcome.');
    take({ kind: 'ask', id: 2, question: { kind: 'alternatives', order, outcome }, timeLimitMs: 20_000 });
    take(request(3));
    const told = await until((message) => message.kind === 'told');
    const next = await outcomeOf(3);
    expect(told).toMatchObject({ id: 2, told: { value: { stopped: 'cancelled' } } });
    expect(next.kind === 'outcome' && next.outcome.stopped).toBe('finished');
  });

  test('says why there is no engine', async () => {
    const { until } = serve(() => Promise.reject(new Error('wasm refused')));
    const message = await until(({ kind }) => kind === 'no engine');
    expect(message).toEqual({ kind: 'no engine', message: 'wasm refused' });
  });

  test('outlives an order that makes the solver throw', async () => {
    const { take, until, outcomeOf } = serve();
    // An order that never went through a reader: no fields at all.
    take(request(1, JSON.parse('{}')));
    const first = await until((message) => 'id' in message && message.id === 1);
    expect(['error', 'outcome']).toContain(first.kind);
    take(request(2));
    const second = await outcomeOf(2);
    expect(second.kind === 'outcome' && second.outcome.stopped).toBe('finished');
  });
});

test('the pause lets waiting messages in, in their order', async () => {
  const pause = channelPause();
  const order: number[] = [];
  await Promise.all([1, 2, 3].map((place) => pause().then(() => order.push(place))));
  expect(order).toEqual([1, 2, 3]);
});
