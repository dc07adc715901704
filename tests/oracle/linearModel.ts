import loadHighs from 'highs';
import type { OrderRows } from './orderRows';

/** Shared by all checks of a test file: one wasm module. */
const highs = await loadHighs();

export interface Answer {
  status: 'optimal' | 'infeasible' | 'unknown';
  cost: number;
  x: number[];
}

/** A row that changes from slice to slice. */
export interface MovingRow {
  values: number[];
  lower: number;
  upper: number;
}

/**
 * min cost·x over the rows of an order, Σ x = 1 (or Σ volume = 1 where the cost is per m³), with one binary per stock
 * where the rules need it and `moving` rows that are given at each solve.
 */
export class LinearModel {
  readonly hasChoices: boolean;
  solves = 0;
  private readonly model: ReturnType<typeof highs.createModel>;
  private readonly count: number;
  private readonly firstMoving: number;

  constructor(
    private readonly order: OrderRows,
    private readonly moving: number,
    whole: boolean,
  ) {
    const { stocks, rows, choices, lower, upper, least, fixed, cost, volumes } = order;
    this.count = stocks.length;
    const n = this.count;
    const chooses =
      choices.most !== undefined ||
      choices.counts.length > 0 ||
      choices.excludes.length > 0 ||
      choices.needs.length > 0 ||
      fixed.some((price) => price > 0) ||
      least.some((l) => l > 0);
    this.hasChoices = chooses;
    const columns = chooses ? 2 * n : n;
    const all: { values: [number, number][]; lower: number; upper: number }[] = [];
    const dense = (values: number[]) => values.map((v, i): [number, number] => [i, v]);
    const unit = volumes ?? stocks.map(() => 1);
    all.push({ values: dense(unit), lower: 1, upper: 1 });
    for (const row of rows) all.push({ values: dense(row.values), lower: row.lower, upper: row.upper });
    if (volumes) {
      const bound = (i: number, end: number) => stocks.map((_, k) => (k === i ? 1 : 0) - end);
      for (let i = 0; i < n; i++) {
        all.push({ values: dense(bound(i, upper[i])), lower: -Infinity, upper: 0 });
        all.push({ values: dense(bound(i, lower[i])), lower: 0, upper: Infinity });
      }
    }
    if (chooses) {
      if (volumes) throw new Error('The oracle takes costs per m³ with choices by enumeration only.');
      for (let i = 0; i < n; i++) {
        all.push({
          values: [
            [i, 1],
            [n + i, -upper[i]],
          ],
          lower: -Infinity,
          upper: 0,
        });
        if (least[i] > 0)
          all.push({
            values: [
              [i, 1],
              [n + i, -least[i]],
            ],
            lower: 0,
            upper: Infinity,
          });
      }
      const sum = (places: number[]): [number, number][] => places.map((i) => [n + i, 1]);
      if (choices.most !== undefined)
        all.push({ values: sum(stocks.map((_, i) => i)), lower: -Infinity, upper: choices.most });
      for (const { members, min, max } of choices.counts) all.push({ values: sum(members), lower: min, upper: max });
      for (const { from, members } of choices.excludes) {
        for (const other of members) all.push({ values: sum([from, other]), lower: -Infinity, upper: 1 });
      }
    }
    for (const { from, members } of chooses ? choices.needs : []) {
      all.push({
        values: [[n + from, 1], ...members.map((i): [number, number] => [n + i, -1])],
        lower: -Infinity,
        upper: 0,
      });
    }
    this.firstMoving = all.length;
    for (let k = 0; k < moving; k++)
      all.push({ values: dense(stocks.map(() => 1)), lower: -Infinity, upper: Infinity });
    const starts = new Int32Array(all.length + 1);
    all.forEach((row, place) => {
      starts[place + 1] = starts[place] + row.values.length;
    });
    const binary = (value: number) => (chooses ? stocks.map(() => value) : []);
    const { variableType } = highs.constants;
    this.model = highs.createModel({
      numCols: columns,
      numRows: all.length,
      colCost: [...cost, ...(chooses ? fixed : [])],
      colLower: [...(volumes ? lower.map(() => 0) : lower), ...(chooses ? lower.map((l) => (l > 0 ? 1 : 0)) : [])],
      colUpper: [...(volumes ? upper.map(() => Infinity) : upper), ...binary(1)],
      rowLower: all.map((row) => row.lower),
      rowUpper: all.map((row) => row.upper),
      matrix: {
        format: 'csr',
        numRows: all.length,
        numCols: columns,
        starts,
        indices: Int32Array.from(all.flatMap((row) => row.values.map(([i]) => i))),
        values: Float64Array.from(all.flatMap((row) => row.values.map(([, v]) => v))),
      },
      ...(whole && chooses
        ? { integrality: [...stocks.map(() => variableType.continuous), ...stocks.map(() => variableType.integer)] }
        : {}),
    });
    this.model.options.set({
      output_flag: false,
      presolve: 'off',
      primal_feasibility_tolerance: 1e-10,
      dual_feasibility_tolerance: 1e-10,
      mip_feasibility_tolerance: 1e-9,
      mip_rel_gap: 1e-9,
      mip_abs_gap: 1e-9,
    });
  }

  /** Least cost with these moving rows. */
  solve(moving: readonly MovingRow[]): Answer {
    if (moving.length !== this.moving) throw new Error(`Expected ${this.moving} moving rows.`);
    this.solves++;
    moving.forEach((row, k) => {
      row.values.forEach((value, i) => void this.model.changeCoefficient(this.firstMoving + k, i, value));
      this.model.changeRowBounds(this.firstMoving + k, row.lower, row.upper);
    });
    const hot = this.run();
    if (hot.status !== 'unknown') return hot;
    this.model.clearSolver();
    return this.run();
  }

  /** Fixes which stocks may be used; undefined frees them again. */
  allow(support: readonly boolean[] | undefined): void {
    const { lower, upper, least } = this.order;
    for (let i = 0; i < this.count; i++) {
      const used = support?.[i];
      this.model.changeColBounds(i, used ? Math.max(lower[i], least[i]) : lower[i], used === false ? 0 : upper[i]);
      if (this.hasChoices)
        this.model.changeColBounds(this.count + i, used ? 1 : lower[i] > 0 ? 1 : 0, used === false ? 0 : 1);
    }
  }

  dispose(): void {
    this.model.dispose();
  }

  private run(): Answer {
    const { modelStatus } = highs.constants;
    try {
      this.model.run();
    } catch {
      return { status: 'unknown', cost: Number.NaN, x: [] };
    }
    const status = this.model.getModelStatus();
    if (status === modelStatus.infeasible) return { status: 'infeasible', cost: Infinity, x: [] };
    if (status !== modelStatus.optimal) return { status: 'unknown', cost: Number.NaN, x: [] };
    const values = Array.from(this.model.getSolution().colValue);
    const x = values.slice(0, this.count);
    const { cost, fixed } = this.order;
    const paid = this.hasChoices ? fixed.reduce((sum, price, i) => sum + price * values[this.count + i], 0) : 0;
    return { status: 'optimal', cost: x.reduce((sum, v, i) => sum + v * cost[i], paid), x };
  }
}
