import { afterEach, beforeAll, expect, test, vi } from 'vitest';
import type * as BlendQuantityModule from '../../../src/blend/blendQuantity';
import type * as NodeHeapModule from '../../../src/optimise/search/nodeHeap';
import type * as SearchProgramModule from '../../../src/optimise/search/searchProgram';
import type * as ViLineModule from '../../../src/optimise/search/viLine';
import type * as TableModule from '../../../src/property/d2270Table1';
import { plantedOrder } from '../../oracle/plantedOrder';
import { fittedBasicValues } from '../../oracle/quadraticFits';
import { CONTINUOUS, DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { sliceSearch } from '../../oracle/sliceSearch';
import { forgetful } from './faultyEngines';
import { type Case, caseOf, disagreements } from './judge';

/**
 * The engine with one mistake built in, held against the same judge as the engine itself. A mistake that the judge
 * does not see would mean that the optimum checks are hollow.
 */
const NODE_HEAP = '../../../src/optimise/search/nodeHeap';
const SEARCH_PROGRAM = '../../../src/optimise/search/searchProgram';
const VI_LINE = '../../../src/optimise/search/viLine';
const TABLE = '../../../src/property/d2270Table1';
const BLEND_QUANTITY = '../../../src/blend/blendQuantity';

let cases: Case[] = [];

beforeAll(() => {
  const random = Array.from({ length: 40 }, (_, i) => i + 1).flatMap((seed) => {
    const order = randomOrder(seed, seed % 8 === 0 ? DISCRETE : CONTINUOUS);
    const answer = sliceSearch(order);
    return answer.viBinds || answer.status === 'impossible' ? (caseOf(`random ${seed}`, order, answer) ?? []) : [];
  });
  const planted = Array.from({ length: 30 }, (_, i) => i + 1).map((seed): Case => {
    const { order, cost } = plantedOrder(seed);
    return { name: `planted ${seed}`, order, expected: { status: 'solved', cost } };
  });
  cases = [...random, ...planted];
});

afterEach(() => {
  for (const path of [NODE_HEAP, SEARCH_PROGRAM, VI_LINE, TABLE, BLEND_QUANTITY]) vi.doUnmock(path);
  vi.resetModules();
});

/** What the judge finds wrong with the engine as it is loaded now, mistakes included. */
async function verdict(forget = false): Promise<string[]> {
  vi.resetModules();
  const { createEngine, solveBlend } = await import('../../../src/index');
  const highs = await createEngine();
  const linearEngine = forget ? forgetful(highs) : highs;
  return disagreements((order) => solveBlend(order, { linearEngine, timeLimitMs: 2000 }), cases);
}

function expectCaught(found: string[]): void {
  console.info(`${found.length} disagreements over ${cases.length} orders, the first: ${found[0]}`);
  expect(found.length).toBeGreaterThanOrEqual(2);
}

test('the engine itself: the judge finds nothing', async () => {
  expect(cases.length).toBeGreaterThan(50);
  expect(await verdict()).toEqual([]);
});

test('caught: the line of the viscosity index 1e-5 too low', async () => {
  vi.doMock(VI_LINE, async (importOriginal) => {
    const original = await importOriginal<typeof ViLineModule>();
    const outerLines: typeof original.outerLines = (...args) => {
      const [a, b] = original.outerLines(...args);
      return [
        { ...a, offset: a.offset - 1e-5 },
        { ...b, offset: b.offset - 1e-5 },
      ];
    };
    return { ...original, outerLines };
  });
  expectCaught(await verdict());
});

test('caught: the chord used as the upper line', async () => {
  vi.doMock(VI_LINE, async (importOriginal) => {
    const original = await importOriginal<typeof ViLineModule>();
    const outerLines: typeof original.outerLines = (curve, from, to) => {
      const low = original.chord(curve, from, from);
      const high = original.chord(curve, to, to);
      const start = low.offset + low.slope * curve.index.toIndex(from);
      const end = high.offset + high.slope * curve.index.toIndex(to);
      const run = curve.index.toIndex(to) - curve.index.toIndex(from);
      const slope = run > 1e-12 ? (end - start) / run : low.slope;
      const line = { slope, offset: start - slope * curve.index.toIndex(from) };
      return [line, line];
    };
    return { ...original, outerLines };
  });
  expectCaught(await verdict());
});

test('caught: a narrow node dropped', async () => {
  vi.doMock(NODE_HEAP, async (importOriginal) => {
    const original = await importOriginal<typeof NodeHeapModule>();
    class Dropping extends original.NodeHeap {
      override push(node: NodeHeapModule.SearchNode): void {
        const { kv100 } = node;
        if (!kv100 || kv100.to - kv100.from > 6e-4 * kv100.to || node.depth === 0) super.push(node);
      }
    }
    return { ...original, NodeHeap: Dropping };
  });
  expectCaught(await verdict());
});

test('caught: "unknown" read as infeasible', async () => {
  // With the mistake: every part the engine does not know about counts as certified empty.
  vi.doMock(SEARCH_PROGRAM, async (importOriginal) => {
    const original = await importOriginal<typeof SearchProgramModule>();
    class Believing extends original.SearchProgram {
      override solve() {
        const result = super.solve();
        return result.status === 'unknown' ? { status: 'infeasible' as const, ray: new Float64Array(0) } : result;
      }
      override certifies(ray: Float64Array) {
        return ray.length === 0 ? { proven: true, rows: [], usesVi: false, bounds: [] } : super.certifies(ray);
      }
    }
    return { ...original, SearchProgram: Believing };
  });
  expectCaught(await verdict(true));
});

test('the engine itself keeps the truth with the same "unknown" answers', async () => {
  const limited = cases;
  cases = limited.filter(({ order }) => order.limits.some((limit) => limit.property === 'vi'));
  const found = await verdict(true);
  cases = limited;
  expect(found).toEqual([]);
});

test('caught: the constant column left out of the lines', async () => {
  vi.doMock(SEARCH_PROGRAM, async (importOriginal) => {
    const original = await importOriginal<typeof SearchProgramModule>();
    class Forgetting extends original.SearchProgram {
      override setViRows(rows: SearchProgramModule.ViRows): void {
        const [a, b] = rows.above ?? [];
        super.setViRows({
          ...rows,
          ...(a && b
            ? {
                above: [
                  { ...a, offset: 0 },
                  { ...b, offset: 0 },
                ] as const,
              }
            : {}),
        });
      }
    }
    return { ...original, SearchProgram: Forgetting };
  });
  expectCaught(await verdict());
});

test('caught: quadratic fits in place of Table 1', async () => {
  vi.doMock(TABLE, async (importOriginal) => {
    const original = await importOriginal<typeof TableModule>();
    const fitted = (key: 'L' | 'H') => original.TABLE_Y.map((y) => fittedBasicValues(y)[key]);
    return { ...original, TABLE_L: fitted('L'), TABLE_H: fitted('H') };
  });
  expectCaught(await verdict());
});

test('caught: masses in place of volumes, in search and prediction alike', async () => {
  vi.doMock(BLEND_QUANTITY, async (importOriginal) => {
    const original = await importOriginal<typeof BlendQuantityModule>();
    const blendQuantity: typeof original.blendQuantity = (stocks, at, options) => {
      const quantity = original.blendQuantity(stocks, at, options);
      if (at.property !== 'kv' && at.property !== 'pourPoint') return quantity;
      const terms = quantity.terms.map((term, i) => {
        const density = stocks[i].figures.find((figure) => figure.property === 'density')?.value ?? 1000;
        return term.state === 'term' ? { ...term, weight: (term.weight * density) / 1000 } : term;
      });
      return { ...quantity, terms };
    };
    return { ...original, blendQuantity };
  });
  expectCaught(await verdict());
});
