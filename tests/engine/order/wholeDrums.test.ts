import { expect, test } from 'vitest';
import { type Order, solveBlend } from '../../../src/index';
import { demoStock } from './plainOrder';

/** Two stocks in drums of 180 and 165 kg, and nothing else. */
function drums(batchTonnes: number, more: Partial<Order> = {}): Order {
  return {
    stocks: [
      { ...demoStock('PAO 4'), lotTonnes: 0.18 },
      { ...demoStock('PAO 6'), lotTonnes: 0.165 },
    ],
    limits: [],
    batchTonnes,
    ...more,
  };
}

test('a batch that whole drums add up to is solved', async () => {
  // By hand: two drums of 180 kg and one of 165 kg.
  const outcome = await solveBlend(drums(0.525));
  expect(outcome.proof.kind).toBe('least cost');
  expect(outcome.recipe?.map(({ massFraction }) => massFraction)).toEqual([
    expect.closeTo(0.36 / 0.525, 9),
    expect.closeTo(0.165 / 0.525, 9),
  ]);
});

test('one that they do not is refused with the sizes that would do', async () => {
  // By hand: 3 · 165 = 495 is the most below 500 kg, 180 + 2 · 165 = 510 the least above.
  const { stopped, problems } = await solveBlend(drums(0.5));
  expect(stopped).toBe('refused');
  expect(problems).toEqual([
    {
      path: ['batchTonnes'],
      message: expect.stringMatching(/cannot be charged in whole drums\. Make it 0\.495 t or 0\.51 t/),
    },
  ]);
});

test('an exact dose beside the drums is counted out first', async () => {
  const stocks = [...drums(1).stocks, demoStock('Group III 4')];
  const doses = [{ stockId: 'Group III 4', exactly: 0.1 }];
  // By hand: 90 % of the batch in drums; 495 kg of them are 90 % of 550 kg.
  expect((await solveBlend(drums(0.55, { stocks, doses }))).proof.kind).toBe('least cost');
  const { problems } = await solveBlend(drums(0.56, { stocks, doses }));
  expect(problems[0].message).toMatch(/Make it 0\.55 t or 0\.5666667 t/);
});

test('a stock charged by weight makes up the difference', async () => {
  const stocks = [...drums(1).stocks, demoStock('Group III 4')];
  expect((await solveBlend(drums(0.5, { stocks }))).proof.kind).toBe('least cost');
});
