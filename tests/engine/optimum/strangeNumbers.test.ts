import { expect, test } from 'vitest';
import { type BlendOutcome, type Order, solveBlend } from '../../../src/index';
import { Draw } from '../../oracle/mulberry32';
import { DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { expectConsistent } from './consistency';
import { seeds } from './judge';

const STRANGE = [
  Number.NaN,
  Infinity,
  -Infinity,
  0,
  -0,
  -1,
  1e-300,
  1e300,
  2,
  99.5,
  1e6,
  -273.15,
  0.2,
  Number.MAX_VALUE,
];

type Holder = Record<string, unknown> | unknown[];

/** Every place in the order that holds a number. */
function numbers(value: unknown, found: { holder: Holder; key: string }[] = []): { holder: Holder; key: string }[] {
  if (typeof value !== 'object' || value === null) return found;
  for (const [key, entry] of Object.entries(value)) {
    if (typeof entry === 'number') found.push({ holder: value as Holder, key });
    else numbers(entry, found);
  }
  return found;
}

/** A valid order with one to three numbers replaced. */
function strangeOrder(seed: number): Order {
  const draw = new Draw(seed);
  const order = randomOrder(draw.whole(1, 1e6), { ...DISCRETE, stocks: [3, 6], choices: draw.chance(0.5) });
  for (let k = draw.whole(1, 3); k > 0; k--) {
    const { holder, key } = draw.pick(numbers(order));
    Object.assign(holder, { [key]: draw.pick(STRANGE) });
  }
  return order;
}

/** What is wrong with the way an order was answered, in words. */
async function faultOf(order: Order, count: (outcome: BlendOutcome) => void): Promise<string | undefined> {
  try {
    const outcome = await solveBlend(order, { timeLimitMs: 2000 });
    count(outcome);
    expectConsistent(outcome);
    if (outcome.stopped === 'engine failed') return outcome.problems[0].message;
    for (const { message } of outcome.problems) if (!/[.!]$/.test(message)) return `no sentence: ${message}`;
    return undefined;
  } catch (error) {
    return error instanceof Error ? error.message.split('\n')[0] : String(error);
  }
}

test('numbers that make no sense never make solveBlend throw, hang or say half an answer', async () => {
  const stopped = new Map<string, number>();
  const faults: string[] = [];
  for (const seed of seeds(300, 31_001)) {
    const fault = await faultOf(strangeOrder(seed), (outcome) => {
      stopped.set(outcome.stopped, (stopped.get(outcome.stopped) ?? 0) + 1);
    });
    if (fault) faults.push(`seed ${seed}: ${fault}`);
  }
  expect(faults).toEqual([]);
  expect(stopped.get('finished')).toBeGreaterThan(30);
  expect(stopped.get('refused')).toBeGreaterThan(30);
});
