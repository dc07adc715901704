import type { LinearEngine, LinearProgram, LinearResult, LinearRow, LinearSession } from '../linear/linearEngine';
import type { SearchModel, ViLimits } from '../rows/searchModel';
import type { Box } from './box';
import { type Certificate, neededBounds } from './certificate';
import { canFold, FoldedPresences } from './foldedPresences';
import { boundOverBox, type PricedRows, type PulledSums, priceRows, withSums } from './safeBound';
import type { Line } from './viLine';
import { viScales } from './viScales';

/** Lines that hold the viscosity index over an interval of KV100: above the mix's KV40 index, and below it. */
export interface ViRows {
  /** Ends of the interval as indices of KV100. */
  from: number;
  to: number;
  /** One or two lines. */
  above?: readonly Line[];
  below?: Line;
}

/**
 * Prices of the static rows, and of the viscosity index: "KV40 index at most offset + slope · KV100 index" at a price,
 * the interval of KV100 folded into the slope.
 */
export interface ShadowPrices {
  priced: PricedRows;
  line?: { price: number; slope: number };
}

/** The interval's lower and upper end, "VI at most", and two lines for "VI at least", in this order. */
const DYNAMIC_ROWS = 5;
const FIRST_ABOVE = 3;
const LINES_ABOVE = 2;
/** Columns of the three sums that carry viscosity, in this order: weights, KV100 indices, KV40 indices. */
const SUMS = 3;

/**
 * A search model in a linear engine: static rows, and, where the viscosity index is limited, three free columns
 * Q = Σ w x, N100 = Σ w I100 x, N40 = Σ w I40 x with five rows over them. An interval of KV100 and its lines are then
 * a dozen coefficients, whatever the number of stocks.
 */
export class SearchProgram {
  readonly model: SearchModel;
  readonly lower: Float64Array;
  readonly upper: Float64Array;
  readonly #session: LinearSession;
  readonly #costScale: number;
  readonly #staticRows: number;
  readonly #columns: number;
  /** Scale of the sums, of the KV100 rows and of the VI rows: a residual of 1 is one reporting unit. */
  readonly #scale: { sums: number; kv100: number; vi: number };
  readonly #coefficients = new Float64Array(DYNAMIC_ROWS * SUMS).fill(1);
  #active = new Array<boolean>(DYNAMIC_ROWS).fill(false);
  solves = 0;

  constructor(engine: LinearEngine, model: SearchModel) {
    this.model = model;
    this.#columns = model.cost.length;
    this.lower = Float64Array.from(model.lower);
    this.upper = Float64Array.from(model.upper);
    this.#staticRows = model.rows.length;
    this.#costScale = 1000 / model.cost.reduce((most, cost) => Math.max(most, Math.abs(cost)), 1e-300);
    this.#scale = model.vi ? viScales(model.vi) : { sums: 1, kv100: 1, vi: 1 };
    const program = this.#program();
    this.#session = canFold(model) ? new FoldedPresences(engine, program, model) : engine.open(program);
  }

  #program(): LinearProgram {
    const { model } = this;
    const sums = model.vi ? SUMS : 0;
    const costRow: LinearRow = this.#costRow(model.cost);
    const rows: LinearRow[] = [...model.rows, costRow];
    const infinite = (sign: number) => Array.from({ length: sums }, () => sign * Infinity);
    if (model.vi) rows.push(...this.#sumRows(model.vi), ...this.#dynamicRows());
    return {
      cost: Float64Array.from([...model.cost.map((cost) => cost * this.#costScale), ...infinite(1).map(() => 0)]),
      lower: Float64Array.from([...model.lower, ...infinite(-1)]),
      upper: Float64Array.from([...model.upper, ...infinite(1)]),
      rows,
    };
  }

  /** Cost of the mix, free until a ceiling is set. */
  #costRow(cost: Float64Array): LinearRow {
    const columns = [...cost.keys()];
    return { lower: -Infinity, upper: Infinity, columns, values: columns.map((j) => cost[j] * this.#costScale) };
  }

  #sumRows(vi: ViLimits): LinearRow[] {
    const parts = [
      vi.weights,
      vi.weights.map((w, i) => w * vi.index100[i]),
      vi.weights.map((w, i) => w * vi.index40[i]),
    ];
    return parts.map((part, place) => {
      const used = [...part.keys()].filter((i) => part[i] !== 0);
      return {
        lower: 0,
        upper: 0,
        columns: [...used, this.#columns + place],
        values: [...used.map((i) => part[i] * this.#scale.sums), -1],
      };
    });
  }

  #dynamicRows(): LinearRow[] {
    const columns = [this.#columns, this.#columns + 1, this.#columns + 2];
    // Any non-zero pattern: the coefficients are set before the first solve.
    return Array.from({ length: DYNAMIC_ROWS }, () => ({
      lower: -Infinity,
      upper: Infinity,
      columns,
      values: [1, 1, 1],
    }));
  }

  setBounds(column: number, lower: number, upper: number): void {
    if (this.lower[column] === lower && this.upper[column] === upper) return;
    this.lower[column] = lower;
    this.upper[column] = upper;
    this.#session.setColumnBounds(column, lower, upper);
  }

  setBox({ lower, upper }: Box): void {
    for (let column = 0; column < lower.length; column++) this.setBounds(column, lower[column], upper[column]);
  }

  /** Keeps columns that sit on their lower bound there, but for the ones named idle. */
  holdColumns(values: Float64Array, idle: readonly boolean[]): void {
    idle.forEach((isIdle, column) => {
      const onLower = values[column] <= this.lower[column] + 1e-9;
      if (!isIdle && onLower) this.setBounds(column, this.lower[column], this.lower[column]);
    });
  }

  #setDynamic(row: number, coefficients: readonly [number, number, number] | undefined, upperSide: boolean): void {
    const first = this.#staticRows + 1 + SUMS + row;
    if (!coefficients) {
      if (this.#active[row]) this.#session.setRowBounds(first, -Infinity, Infinity);
      this.#active[row] = false;
      return;
    }
    coefficients.forEach((value, sum) => {
      if (this.#coefficients[row * SUMS + sum] === value) return;
      this.#coefficients[row * SUMS + sum] = value;
      this.#session.setCoefficient(first, this.#columns + sum, value);
    });
    if (!this.#active[row]) this.#session.setRowBounds(first, upperSide ? -Infinity : 0, upperSide ? 0 : Infinity);
    this.#active[row] = true;
  }

  /** Sets the interval of KV100 and its lines. */
  setViRows({ from, to, above, below }: ViRows): void {
    const kv = this.#scale.kv100 / this.#scale.sums;
    const vi = this.#scale.vi / this.#scale.sums;
    const line = ({ offset, slope }: Line) => [-offset * vi, -slope * vi, vi] as const;
    this.#setDynamic(0, [-from * kv, kv, 0], false);
    this.#setDynamic(1, [-to * kv, kv, 0], true);
    this.#setDynamic(2, below && line(below), false);
    for (let k = 0; k < LINES_ABOVE; k++) {
      const one = above?.[k];
      this.#setDynamic(FIRST_ABOVE + k, one && line(one), true);
    }
  }

  /** Minimises something else under a ceiling on the cost: used once, to choose among equals, from a fresh basis. */
  solveForTie(weights: Float64Array, ceiling: number): LinearResult {
    this.#session.forget();
    weights.forEach((weight, column) => void this.#session.setCost(column, weight));
    this.#session.setRowBounds(this.#staticRows, -Infinity, ceiling * this.#costScale);
    const result = this.solve();
    this.model.cost.forEach((cost, column) => void this.#session.setCost(column, cost * this.#costScale));
    this.#session.setRowBounds(this.#staticRows, -Infinity, Infinity);
    return result;
  }

  solve(): LinearResult {
    this.solves++;
    return this.#session.solve();
  }

  /** What the dynamic rows pull on the stocks under the multipliers of a solve. */
  #pulled(multipliers: Float64Array, scale: number): PulledSums | undefined {
    const { vi } = this.model;
    if (!vi) return undefined;
    const sums: [number, number, number] = [0, 0, 0];
    const sizes: [number, number, number] = [0, 0, 0];
    for (let row = 0; row < DYNAMIC_ROWS; row++) {
      const multiplier = multipliers[this.#staticRows + 1 + SUMS + row] * scale;
      const lowerSide = row === 0 || row === 2;
      // A multiplier of the wrong sign leans on an infinite side: dropping it keeps the bound valid.
      if (!this.#active[row] || !Number.isFinite(multiplier) || (lowerSide ? multiplier < 0 : multiplier > 0)) continue;
      for (let sum = 0; sum < SUMS; sum++) {
        const pull = multiplier * this.#coefficients[row * SUMS + sum] * this.#scale.sums;
        sums[sum] += pull;
        sizes[sum] += Math.abs(pull);
      }
    }
    return { weights: vi.weights, index100: vi.index100, index40: vi.index40, sums, sizes };
  }

  /** The prices a solve puts on the rows, and on the viscosity index as one line, to bound other parts without a solve. */
  pricesOf(duals: Float64Array): ShadowPrices {
    const scale = 1 / this.#costScale;
    const priced = priceRows(this.model.cost, this.model.rows, this.#ofRows(duals, scale));
    const kept: readonly (-1 | 1)[] = [1, -1, 1, -1, -1];
    let steepness = 0;
    let price = 0;
    for (let row = 0; row < DYNAMIC_ROWS; row++) {
      const multiplier = duals[this.#staticRows + 1 + SUMS + row] * scale * this.#scale.sums;
      if (!this.#active[row] || !(multiplier * kept[row] > 0)) continue;
      steepness += multiplier * this.#coefficients[row * SUMS + 1];
      price -= multiplier * this.#coefficients[row * SUMS + 2];
    }
    return price > 0 ? { priced, line: { price, slope: steepness / price } } : { priced };
  }

  /**
   * Proven lower bound of the cost in a box, from prices found elsewhere: the viscosity index is held by the line of
   * the prices' slope at the given offset, which must lie above the curve over the part in question.
   */
  shadowBound({ priced, line }: ShadowPrices, offset: number, { lower, upper }: Box): number {
    const { vi } = this.model;
    if (!vi || !line) return boundOverBox(priced, lower, upper);
    const { weights, index100, index40 } = vi;
    const sums = [line.price * offset, line.price * line.slope, -line.price] as const;
    const sizes = [Math.abs(sums[0]), Math.abs(sums[1]), Math.abs(sums[2])] as const;
    return boundOverBox(withSums(priced, { weights, index100, index40, sums, sizes }), lower, upper);
  }

  /** Proven lower bound of the cost at the present bounds and lines, from the duals of a solve. */
  boundOf(duals: Float64Array): number {
    return boundOverBox(this.#priceOut(this.model.cost, duals, 1 / this.#costScale), this.lower, this.upper);
  }

  /** True for columns that sit on a bound and would change nothing in the cost if they moved. */
  idleColumns(values: Float64Array, duals: Float64Array): boolean[] {
    const { reduced } = this.#priceOut(this.model.cost, duals, 1 / this.#costScale);
    const { lower, upper } = this;
    return this.model.stocks.map((_, j) => {
      const onBound = values[j] <= lower[j] + 1e-9 || values[j] >= upper[j] - 1e-9;
      return onBound && lower[j] < upper[j] && Math.abs(reduced[j]) * this.#costScale < 1e-7;
    });
  }

  #ofRows(duals: Float64Array, scale: number): Float64Array {
    const multipliers = new Float64Array(this.#staticRows);
    for (let row = 0; row < this.#staticRows; row++) multipliers[row] = duals[row] * scale;
    return multipliers;
  }

  /** Prices all rows out of a cost: static ones and the present lines. */
  #priceOut(cost: Float64Array, duals: Float64Array, scale: number): PricedRows {
    const priced = priceRows(cost, this.model.rows, this.#ofRows(duals, scale));
    const pulled = this.#pulled(duals, scale);
    return pulled ? withSums(priced, pulled) : priced;
  }

  /** Whether a ray proves that nothing meets the rows at the present bounds and lines, and what the proof leans on. */
  certifies(ray: Float64Array): Certificate {
    const { model, lower, upper } = this;
    const nothing = new Float64Array(this.#columns);
    for (const turned of [ray, ray.map((value) => -value)]) {
      const priced = this.#priceOut(nothing, turned, 1);
      const bound = boundOverBox(priced, lower, upper);
      if (!(bound > 0)) continue;
      const rows = model.rows.flatMap((_, row) => (turned[row] !== 0 ? [row] : []));
      const lines = [2, 3, 4].map((row) => turned[this.#staticRows + 1 + SUMS + row]);
      const usesVi = model.vi !== undefined && lines.some((dual) => dual !== 0);
      return { proven: true, rows, usesVi, bounds: neededBounds(bound, priced.reduced, model) };
    }
    return { proven: false, rows: [], usesVi: false, bounds: [] };
  }

  dispose(): void {
    this.#session.dispose();
  }
}
