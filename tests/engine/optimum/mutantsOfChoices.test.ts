import { afterEach, expect, test, vi } from 'vitest';
import type * as ChoicesModule from '../../../src/optimise/search/discreteChoices';
import { DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { sliceSearch } from '../../oracle/sliceSearch';
import { caseOf } from './judge';
import { expectCaught, verdict } from './loadedEngine';

const CHOICES = '../../../src/optimise/search/discreteChoices';

const cases = Array.from({ length: 40 }, (_, i) => i + 1).flatMap((seed) => {
  const order = randomOrder(seed, { ...DISCRETE, stocks: [4, 6] });
  return caseOf(`random ${seed}`, order, sliceSearch(order)) ?? [];
});

afterEach(() => {
  vi.doUnmock(CHOICES);
  vi.resetModules();
});

test('the engine itself: the judge finds nothing', async () => {
  expect(await verdict(cases)).toEqual([]);
});

test('caught: the rows of counts, exclusions and most stocks dropped', async () => {
  vi.doMock(CHOICES, async (importOriginal) => {
    const original = await importOriginal<typeof ChoicesModule>();
    return { ...original, presenceRows: () => [] };
  });
  expectCaught(await verdict(cases), cases.length);
});
