import { expect, test } from 'vitest';
import { solveBlend } from '../../../src/index';
import { DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { sliceSearch } from '../../oracle/sliceSearch';
import { enumerateSupports } from '../../oracle/supports';
import { caseOf, disagreements, seeds } from './judge';

test('discrete rules: status and cost as by HiGHS mixed-integer slices', async () => {
  const found: string[] = [];
  let solved = 0;
  for (const seed of seeds(12)) {
    const order = randomOrder(seed, DISCRETE);
    const answer = sliceSearch(order);
    if (answer.status === 'solved') solved++;
    const entry = caseOf(`seed ${seed}`, order, answer);
    if (entry) found.push(...(await disagreements(solveBlend, [entry])));
  }
  expect(found).toEqual([]);
  expect(solved).toBeGreaterThan(5);
});

test('discrete rules: status and cost as by trying every set of stocks', async () => {
  const found: string[] = [];
  let solved = 0;
  for (const seed of seeds(40, 1001)) {
    const order = randomOrder(seed, { ...DISCRETE, stocks: [4, 6] });
    const answer = enumerateSupports(order);
    if (answer.status === 'solved') solved++;
    const entry = caseOf(`seed ${seed}`, order, answer);
    if (entry) found.push(...(await disagreements(solveBlend, [entry])));
  }
  expect(found).toEqual([]);
  expect(solved).toBeGreaterThan(15);
});

test('at least so many stocks of a set: as by trying every set of stocks', async () => {
  const found: string[] = [];
  let solved = 0;
  for (const seed of seeds(20, 2001)) {
    const order = randomOrder(seed, { ...DISCRETE, stocks: [4, 6] });
    const stockIds = order.stocks.slice(0, 3).map((stock) => stock.id);
    order.shares = [...(order.shares ?? []), { kind: 'count', set: { stockIds }, min: 2 }];
    const answer = enumerateSupports(order);
    if (answer.status === 'solved') solved++;
    const entry = caseOf(`seed ${seed}`, order, answer);
    if (entry) found.push(...(await disagreements(solveBlend, [entry])));
  }
  expect(found).toEqual([]);
  expect(solved).toBeGreaterThan(5);
});
