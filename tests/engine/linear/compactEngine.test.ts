import { expect, test } from 'vitest';
import { createCompactEngine, createHighsEngine } from '../../../src/index';
import type { LinearEngine, LinearProgram, LinearRow, LinearSession } from '../../../src/optimise/linear/linearEngine';
import { Draw } from '../../oracle/mulberry32';
import { seeds } from '../optimum/judge';

/** The outside reference: HiGHS (package `highs`), a general solver that shares no code with ours. */
const highs = await createHighsEngine();

/** The reserve, and how often it was asked. */
function counted(): { reserve: LinearEngine; asked: () => number } {
  let asked = 0;
  const open: LinearEngine['open'] = (program) => {
    asked++;
    return highs.open(program);
  };
  return { reserve: { name: 'counted', open }, asked: () => asked };
}

function side(draw: Draw, activity: number): { lower: number; upper: number } {
  const kind = draw.whole(0, 3);
  const above = activity + draw.between(-0.3, 1);
  const below = activity - draw.between(-0.3, 1);
  if (kind === 0) return { lower: -Infinity, upper: above };
  if (kind === 1) return { lower: below, upper: Infinity };
  return kind === 2 ? { lower: Math.min(above, below), upper: Math.max(above, below) } : { lower: above, upper: above };
}

/** Programs like those of blends: shares that add up to 1, dense rows of any scale, boxes; free columns, ties, zeros. */
function randomProgram(draw: Draw): LinearProgram {
  const columns = draw.whole(2, 24);
  const point = Array.from({ length: columns }, () => draw.between(0, 1));
  const sum = point.reduce((total, value) => total + value, 0);
  const all = [...point.keys()];
  const rows: LinearRow[] = [{ lower: 1, upper: 1, columns: all, values: all.map(() => 1) }];
  for (let count = draw.whole(0, 8); count > 0; count--) {
    const scale = 10 ** draw.between(-3, 3);
    const values = all.map(() => (draw.chance(0.2) ? 0 : draw.chance(0.1) ? 1 : draw.between(-1, 1) * scale));
    const activity = values.reduce((total, value, j) => total + (value * point[j]) / sum, 0);
    const ends = side(draw, 0);
    rows.push({ lower: activity + ends.lower * scale, upper: activity + ends.upper * scale, columns: all, values });
  }
  const free = draw.chance(0.3);
  const cost = Float64Array.from(all, () => (draw.chance(0.2) ? 500 : draw.between(-100, 1000)));
  const upper = Float64Array.from(all, () => (draw.chance(0.2) ? draw.between(0, 0.5) : 1));
  const lower = Float64Array.from(all, (j) => (draw.chance(0.1) ? upper[j] * draw.between(0, 0.3) : 0));
  if (!free) return { cost, lower, upper, rows };
  // A free column that a row defines, held by another row: as the sums that carry the viscosities.
  const values = all.map(() => draw.between(0.5, 2));
  return {
    cost: Float64Array.from([...cost, 0]),
    lower: Float64Array.from([...lower, -Infinity]),
    upper: Float64Array.from([...upper, Infinity]),
    rows: [
      ...rows,
      { lower: 0, upper: 0, columns: [...all, columns], values: [...values, -1] },
      { lower: draw.between(0.4, 1.1), upper: Infinity, columns: [columns], values: [1] },
    ],
  };
}

/** How two sessions differ on what they solve now, in words; empty where they agree. */
function difference(compact: LinearSession, reference: LinearSession, cost: ArrayLike<number>): string {
  const mine = compact.solve();
  const theirs = reference.solve();
  if (mine.status !== theirs.status) return `${mine.status} against ${theirs.status}`;
  if (mine.status !== 'optimal' || theirs.status !== 'optimal') return '';
  const costOf = (values: Float64Array) => values.reduce((total, value, j) => total + value * cost[j], 0);
  const apart = Math.abs(costOf(mine.values) - costOf(theirs.values));
  return apart > 1e-5 ? `cost ${costOf(mine.values)} against ${costOf(theirs.values)}` : '';
}

test('2 000 programs: the same status and least cost as HiGHS, the reserve hardly asked', () => {
  const { reserve, asked } = counted();
  const engine = createCompactEngine(reserve);
  const differences: string[] = [];
  const statuses = { optimal: 0, infeasible: 0, unknown: 0 };
  for (const seed of seeds(2000, 81_001)) {
    const program = randomProgram(new Draw(seed));
    const [compact, reference] = [engine.open(program), highs.open(program)];
    const found = difference(compact, reference, program.cost);
    statuses[compact.solve().status]++;
    reference.dispose();
    if (found) differences.push(`seed ${seed}: ${found}`);
  }
  expect(differences).toEqual([]);
  expect(statuses.unknown).toBe(0);
  expect(Math.min(statuses.optimal, statuses.infeasible)).toBeGreaterThan(100);
  // Where a program misses by a rounding, no ray of ours proves it.
  expect(asked()).toBeLessThan(20);
});

/** Edits of every kind, some of them of rows that hold the solution. */
function edit(draw: Draw, program: LinearProgram, sessions: readonly LinearSession[]): void {
  const { cost, lower, upper, rows } = program;
  const column = draw.whole(0, cost.length - 1);
  const place = draw.whole(0, rows.length - 1);
  const row = rows[place];
  const kind = draw.whole(0, 3);
  if (kind === 0) {
    cost[column] += draw.between(-100, 100);
    for (const session of sessions) session.setCost(column, cost[column]);
  } else if (kind === 1 && Number.isFinite(upper[column])) {
    upper[column] = Math.max(lower[column], upper[column] * draw.between(0.2, 1.5));
    for (const session of sessions) session.setColumnBounds(column, lower[column], upper[column]);
  } else if (kind === 2 && place > 0) {
    rows[place] = { ...row, lower: row.lower - draw.between(-0.05, 0.1), upper: row.upper + draw.between(-0.05, 0.1) };
    if (rows[place].lower > rows[place].upper) rows[place] = row;
    for (const session of sessions) session.setRowBounds(place, rows[place].lower, rows[place].upper);
  } else if (place > 0) {
    const k = draw.whole(0, row.columns.length - 1);
    const values = row.values.map((value, at) => (at === k ? value * draw.between(0.7, 1.3) : value));
    rows[place] = { ...row, values };
    for (const session of sessions) session.setCoefficient(place, row.columns[k], values[k]);
  }
}

test('edited and solved again a hundred times, it says what HiGHS says of the edited program', () => {
  const { reserve } = counted();
  const engine = createCompactEngine(reserve);
  const differences: string[] = [];
  let solved = 0;
  for (const seed of seeds(30, 82_001)) {
    const draw = new Draw(seed);
    const program = randomProgram(draw);
    const compact = engine.open(program);
    const edited = structuredClone(program);
    for (let round = 0; round < 100; round++) {
      for (let count = draw.whole(1, 4); count > 0; count--) edit(draw, edited, [compact]);
      if (draw.chance(0.02)) compact.forget();
      const reference = highs.open(edited);
      const found = difference(compact, reference, edited.cost);
      reference.dispose();
      solved++;
      if (found) differences.push(`seed ${seed}, round ${round}: ${found}`);
    }
  }
  expect(differences).toEqual([]);
  expect(solved).toBeGreaterThanOrEqual(3000);
});

test('a program too large for a dense dictionary goes to the reserve', () => {
  const { reserve, asked } = counted();
  const columns = Array.from({ length: 400 }, (_, j) => j);
  const rows = columns.slice(0, 200).map((j) => ({ lower: -Infinity, upper: 0.5, columns: [j], values: [1] }));
  const session = createCompactEngine(reserve).open({
    cost: Float64Array.from(columns, (j) => 100 + j),
    lower: new Float64Array(400),
    upper: new Float64Array(400).fill(1),
    rows: [{ lower: 1, upper: 1, columns, values: columns.map(() => 1) }, ...rows],
  });
  expect(asked()).toBe(1);
  expect(session.solve()).toMatchObject({ status: 'optimal' });
});

test('a program whose numbers are none is handed to the reserve, as it stands after all edits', () => {
  const seen: LinearProgram[] = [];
  const none = () => undefined;
  const idle = {
    setCost: none,
    setColumnBounds: none,
    setRowBounds: none,
    setCoefficient: none,
    forget: none,
    dispose: none,
  };
  const reserve: LinearEngine = {
    name: 'keeps what it gets',
    open(program) {
      seen.push(program);
      return { ...idle, solve: () => ({ status: 'unknown' }) };
    },
  };
  const program = randomProgram(new Draw(5));
  const session = createCompactEngine(reserve).open(program);
  session.setCost(0, 77);
  session.setColumnBounds(1, 0.1, 0.2);
  session.setCoefficient(0, 1, Number.NaN);
  expect(session.solve()).toEqual({ status: 'unknown' });
  expect(seen).toHaveLength(1);
  expect(seen[0].cost[0]).toBe(77);
  expect([seen[0].lower[1], seen[0].upper[1]]).toEqual([0.1, 0.2]);
  expect(seen[0].rows[0].values[1]).toBeNaN();
});
