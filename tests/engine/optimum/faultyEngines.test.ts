import { expect, test } from 'vitest';
import { createEngine, solveBlend } from '../../../src/index';
import { CONTINUOUS, randomOrder } from '../../oracle/randomOrder';
import { sliceSearch } from '../../oracle/sliceSearch';
import { worstViolation } from '../../oracle/violation';
import { careless, forgetful, type LinearEngine, liar, spoiled } from './faultyEngines';
import { caseOf, disagreements, seeds } from './judge';

const highs = await createEngine();

/** Orders whose viscosity index is limited and can be met. */
const solvable = seeds(16, 7001).flatMap((seed) => {
  const order = randomOrder(seed, CONTINUOUS);
  const answer = sliceSearch(order);
  return answer.status === 'solved' ? [{ seed, order, answer }] : [];
});

/** A clock that ends the search after so many readings, so that a hopeless engine ends too. */
function ticking(): () => number {
  let time = 0;
  return () => time++;
}

test('an engine that often does not know costs work, never the truth', async () => {
  const cases = solvable.flatMap(({ seed, order, answer }) => caseOf(`seed ${seed}`, order, answer) ?? []);
  expect(cases.length).toBeGreaterThan(8);
  expect(await disagreements((order) => solveBlend(order, { linearEngine: forgetful(highs) }), cases)).toEqual([]);
});

test.each<[string, (engine: LinearEngine) => LinearEngine]>([
  ['with wrong duals', careless],
  ['that calls the feasible infeasible', liar],
])('an engine %s cannot raise the bound or hide a recipe', async (_, fault) => {
  for (const { seed, order, answer } of solvable) {
    const options = { linearEngine: fault(highs), timeLimitMs: 1500, now: ticking() };
    const { proof, recipe, costPerTonne } = await solveBlend(order, options);
    expect(proof.kind, `seed ${seed}`).not.toMatch(/impossible/);
    expect(proof.lowerBound ?? -Infinity, `seed ${seed}`).toBeLessThanOrEqual(answer.cost * (1 + 1e-6));
    if (recipe) {
      expect(costPerTonne, `seed ${seed}`).toBeGreaterThanOrEqual(answer.cost * (1 - 5e-6));
      expect(worstViolation(order, recipe).units, `seed ${seed}`).toBeLessThan(1.01e-6);
    }
  }
});

test('an engine whose solutions miss the rows brings no recipe that misses a limit', async () => {
  const sloppy = spoiled(highs, 'sloppy', (result, random) =>
    result.status === 'optimal' ? { ...result, values: result.values.map((v) => v * (1 + 0.02 * random())) } : result,
  );
  for (const { seed, order, answer } of solvable) {
    const { proof, recipe } = await solveBlend(order, { linearEngine: sloppy, timeLimitMs: 250, now: ticking() });
    expect(proof.kind, `seed ${seed}`).not.toMatch(/impossible/);
    expect(proof.lowerBound ?? -Infinity, `seed ${seed}`).toBeLessThanOrEqual(answer.cost * (1 + 1e-6));
    if (recipe) expect(worstViolation(order, recipe).units, `seed ${seed}`).toBeLessThan(1.01e-6);
  }
});

test('an engine that always answers "unknown" proves nothing', async () => {
  const mute = spoiled(highs, 'mute', () => ({ status: 'unknown' }));
  const { order } = solvable[0];
  const outcome = await solveBlend(order, { linearEngine: mute, timeLimitMs: 500, now: ticking() });
  expect(outcome.recipe).toBeUndefined();
  expect(outcome.proof.kind).toBe('none');
  const linear = await solveBlend({ ...order, limits: [] }, { linearEngine: mute });
  expect(linear.proof.kind).toBe('none');
});

test('an engine that fails says so, and what to do', async () => {
  const broken: LinearEngine = {
    name: 'broken',
    open: () => {
      throw new Error('out of memory');
    },
  };
  const outcome = await solveBlend(solvable[0].order, { linearEngine: broken });
  expect(outcome.stopped).toBe('engine failed');
  expect(outcome.proof.kind).toBe('none');
  expect(outcome.recipe).toBeUndefined();
  expect(outcome.problems[0].message).toMatch(/out of memory.*solve again/i);
});
