import fc from 'fast-check';
import { expect, test } from 'vitest';
import { createHighsEngine } from '../../../src/index';
import type { LinearProgram, LinearRow } from '../../../src/optimise/linear/linearEngine';
import { safeBound } from '../../../src/optimise/search/safeBound';

const highs = await createHighsEngine();
const RUNS = Math.round(500 * Number(process.env.BASEWRIGHT_SEEDS ?? 1));

/** A program with a point that meets it, in whole numbers, so that no rounding is in the claim. */
interface Feasible {
  program: LinearProgram;
  point: number[];
}

const whole = (min: number, max: number) => fc.integer({ min, max });
const slack = fc.oneof(whole(0, 4), fc.constant(Infinity));

const feasible: fc.Arbitrary<Feasible> = whole(1, 5).chain((columns) => {
  const each = <T>(entry: fc.Arbitrary<T>) => fc.array(entry, { minLength: columns, maxLength: columns });
  const row = fc.record({ values: each(whole(-6, 6)), below: slack, above: slack });
  return fc
    .record({
      cost: each(fc.double({ min: -10, max: 10, noNaN: true })),
      point: each(whole(-3, 3)),
      below: each(whole(0, 3)),
      above: each(whole(0, 3)),
      rows: fc.array(row, { maxLength: 6 }),
    })
    .map(({ cost, point, below, above, rows }) => {
      const program = {
        cost: Float64Array.from(cost),
        lower: Float64Array.from(point, (x, j) => x - below[j]),
        upper: Float64Array.from(point, (x, j) => x + above[j]),
        rows: rows.map(({ values, below: under, above: over }): LinearRow => {
          const activity = values.reduce((sum, value, j) => sum + value * point[j], 0);
          return { lower: activity - under, upper: activity + over, columns: [...values.keys()], values };
        }),
      };
      return { program, point };
    });
});

function costAt({ program, point }: Feasible): number {
  return program.cost.reduce((sum, price, j) => sum + price * point[j], 0);
}

/** Least cost and duals by HiGHS. */
function optimum(program: LinearProgram) {
  const session = highs.open(program);
  try {
    const result = session.solve();
    if (result.status !== 'optimal') throw new Error(`HiGHS says ${result.status} to a program that can be met.`);
    return { cost: program.cost.reduce((sum, price, j) => sum + price * result.values[j], 0), duals: result.duals };
  } finally {
    session.dispose();
  }
}

const anyMultiplier = fc.oneof(
  fc.double({ min: -20, max: 20 }),
  fc.double(),
  fc.constantFrom(Number.NaN, Infinity, -Infinity, 0, -0, 1e308),
);

test('no multipliers whatever give a bound above a mix that meets the rows, or above the least cost', () => {
  let finite = 0;
  fc.assert(
    fc.property(feasible, fc.array(anyMultiplier, { minLength: 6, maxLength: 6 }), (made, multipliers) => {
      const bound = safeBound(made.program, multipliers);
      expect(bound > costAt(made) + 1e-12).toBe(false);
      expect(bound > optimum(made.program).cost + 1e-6).toBe(false);
      if (Number.isFinite(bound)) finite++;
    }),
    { seed: 12, numRuns: RUNS },
  );
  expect(finite).toBeGreaterThan(RUNS / 3);
});

test('duals turned, scaled and disturbed give no bound above the least cost; right ones reach it', () => {
  const disturbance = fc.record({
    factor: fc.double({ min: -2, max: 2, noNaN: true }),
    shift: fc.constantFrom(0, 0, 1e-9, -1e-3, 0.5),
  });
  fc.assert(
    fc.property(feasible, fc.array(disturbance, { minLength: 6, maxLength: 6 }), (made, disturbances) => {
      const { cost, duals } = optimum(made.program);
      const spoilt = duals.map((dual, r) => dual * disturbances[r].factor + disturbances[r].shift);
      expect(safeBound(made.program, spoilt)).toBeLessThanOrEqual(cost + 1e-6);
      const bound = safeBound(made.program, duals);
      expect(bound).toBeLessThanOrEqual(cost + 1e-6);
      expect(bound).toBeGreaterThanOrEqual(cost - 1e-6);
    }),
    { seed: 13, numRuns: RUNS },
  );
});

test('with a cost of nothing, no multipliers prove a program empty that can be met', () => {
  fc.assert(
    fc.property(feasible, fc.array(anyMultiplier, { minLength: 6, maxLength: 6 }), ({ program }, multipliers) => {
      const free = { ...program, cost: new Float64Array(program.cost.length) };
      expect(safeBound(free, multipliers) > 0).toBe(false);
    }),
    { seed: 14, numRuns: RUNS },
  );
});
