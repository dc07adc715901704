import { afterEach, describe, expect, test, vi } from 'vitest';
import type * as RecipeFinderModule from '../../../src/optimise/search/recipeFinder';
import type * as ViLineModule from '../../../src/optimise/search/viLine';
import { plantedOrder } from '../../oracle/plantedOrder';
import { CONTINUOUS, randomOrder } from '../../oracle/randomOrder';
import { sliceSearch } from '../../oracle/sliceSearch';
import { type Case, caseOf } from './judge';
import { expectCaught, verdict } from './loadedEngine';

/** Mistakes in the lines that bound; each must be seen by the judge. */
const VI_LINE = '../../../src/optimise/search/viLine';
const FINDER = '../../../src/optimise/search/recipeFinder';

afterEach(() => {
  vi.doUnmock(VI_LINE);
  vi.doUnmock(FINDER);
  vi.resetModules();
});

describe('"viscosity index at most"', () => {
  const cases = Array.from({ length: 400 }, (_, i) => i + 1).flatMap((seed): Case[] => {
    const { order, cost } = plantedOrder(seed);
    const capped = order.limits.some((limit) => limit.property === 'vi' && limit.max !== undefined);
    return capped ? [{ name: `planted ${seed}`, order, expected: { status: 'solved', cost } }] : [];
  });

  test('the engine itself: the judge finds nothing', async () => {
    expect(cases.length).toBeGreaterThan(10);
    expect(await verdict(cases)).toEqual([]);
  });

  test('caught: its line 1e-5 too high', async () => {
    vi.doMock(VI_LINE, async (importOriginal) => {
      const original = await importOriginal<typeof ViLineModule>();
      const lowerLine: typeof original.lowerLine = (...args) => {
        const line = original.lowerLine(...args);
        return { ...line, offset: line.offset + 1e-5 };
      };
      return { ...original, lowerLine };
    });
    expectCaught(await verdict(cases), cases.length);
  });
});

describe('prices that close parts without a solve', () => {
  const cases = Array.from({ length: 80 }, (_, i) => i + 1).flatMap((seed) => {
    const order = randomOrder(seed, CONTINUOUS);
    const answer = sliceSearch(order);
    return answer.viBinds ? (caseOf(`random ${seed}`, order, answer) ?? []) : [];
  });

  /** Takes one recipe in five: where the best is known at once, no false bound can hide anything. */
  function missRecipes(): void {
    vi.doMock(FINDER, async (importOriginal) => {
      const original = await importOriginal<typeof RecipeFinderModule>();
      let tries = 0;
      class Missing extends original.RecipeFinder {
        override take(solution: RecipeFinderModule.Solution): boolean {
          return tries++ % 5 === 0 && super.take(solution);
        }
      }
      return { ...original, RecipeFinder: Missing };
    });
  }

  test('the engine itself, missing recipes: the judge finds nothing', async () => {
    missRecipes();
    expect(cases.length).toBeGreaterThan(20);
    expect(await verdict(cases)).toEqual([]);
  });

  test('caught: the line of the prices 1e-5 too low', async () => {
    missRecipes();
    vi.doMock(VI_LINE, async (importOriginal) => {
      const original = await importOriginal<typeof ViLineModule>();
      const offsetAbove: typeof original.offsetAbove = (...args) => original.offsetAbove(...args) - 1e-5;
      return { ...original, offsetAbove };
    });
    expectCaught(await verdict(cases), cases.length);
  });
});
