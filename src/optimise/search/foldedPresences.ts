import type { LinearEngine, LinearProgram, LinearResult, LinearRow, LinearSession } from '../linear/linearEngine';
import type { ModelRow, Presence, SearchModel } from '../rows/searchModel';

/** A presence while it is undecided is share / greatest share; decided, it is 0 or 1. */
interface Folded {
  stock: number;
  column: number;
  /** Row that holds share ≤ greatest · presence. */
  tie: number;
  greatest: number;
  lower: number;
  upper: number;
  cost: number;
}

/** A row that presences push against its upper side: their coefficients, and those of the stocks they belong to. */
interface FoldedRow {
  row: number;
  upper: number;
  terms: { presence: Folded; coefficient: number; ofStock: number }[];
}

const isTie = ({ source }: ModelRow) => source.kind === 'presence';

/**
 * Whether every presence only ever costs: it stands in rows that hold from above, with coefficients of zero or more,
 * and has a price of zero or more. The relaxed program then makes it as small as its share allows, share / greatest.
 */
export function canFold({ presences, rows, cost }: SearchModel): boolean {
  const columns = new Set(presences.map(({ column }) => column));
  const onlyCosts = (row: ModelRow) =>
    row.lower === -Infinity && row.columns.every((column, k) => !columns.has(column) || row.values[k] >= 0);
  return (
    presences.length > 0 &&
    presences.every(({ column }) => cost[column] >= 0) &&
    rows.every((row) => isTie(row) || !row.columns.some((column) => columns.has(column)) || onlyCosts(row))
  );
}

/**
 * A session on a program without its presence columns and the rows that tie them to shares: each presence is replaced
 * by what the relaxed program would make of it, so that a program of n stocks keeps n columns and a dozen rows. Values,
 * duals and rays come back in the terms of the whole program, and prove there what they prove here: with
 * presence = share/greatest the tie's dual is what makes the presence's reduced cost zero.
 */
export class FoldedPresences implements LinearSession {
  readonly #inner: LinearSession;
  readonly #columnOf: Int32Array;
  readonly #rowOf: Int32Array;
  readonly #cost: Float64Array;
  readonly #byColumn = new Map<number, Folded>();
  readonly #byStock = new Map<number, Folded>();
  readonly #rows: FoldedRow[] = [];
  readonly #changed = new Set<Folded>();

  constructor(engine: LinearEngine, program: LinearProgram, model: SearchModel) {
    this.#cost = Float64Array.from(program.cost);
    this.#addPresences(program, model.presences, model.rows);
    const gone = new Set([...model.rows.keys()].filter((row) => isTie(model.rows[row])));
    this.#columnOf = renumbered(program.cost.length, (column) => this.#byColumn.has(column));
    this.#rowOf = renumbered(program.rows.length, (row) => gone.has(row));
    const kept = [...program.cost.keys()].filter((column) => !this.#byColumn.has(column));
    const rows = program.rows.flatMap((row, place) => (gone.has(place) ? [] : [this.#foldRow(row, place)]));
    this.#inner = engine.open({
      cost: Float64Array.from(kept, (column) => program.cost[column]),
      lower: Float64Array.from(kept, (column) => program.lower[column]),
      upper: Float64Array.from(kept, (column) => program.upper[column]),
      rows,
    });
    for (const presence of this.#byColumn.values()) this.#changed.add(presence);
  }

  #addPresences(program: LinearProgram, presences: readonly Presence[], rows: readonly ModelRow[]): void {
    for (const { stock, column } of presences) {
      const tie = rows.findIndex(
        ({ source }) => source.kind === 'presence' && source.stock === stock && source.end === 'most',
      );
      const presence: Folded = {
        stock,
        column,
        tie,
        greatest: program.upper[stock],
        lower: program.lower[column],
        upper: program.upper[column],
        cost: program.cost[column],
      };
      this.#byColumn.set(column, presence);
      this.#byStock.set(stock, presence);
    }
  }

  /** A row over the kept columns; presences in it are noted, and their stocks get a place. */
  #foldRow(row: LinearRow, place: number): LinearRow {
    const ofColumn = new Map(row.columns.map((column, k) => [column, row.values[k]]));
    const terms = row.columns.flatMap((column, k) => {
      const presence = this.#byColumn.get(column);
      return presence ? [{ presence, coefficient: row.values[k], ofStock: ofColumn.get(presence.stock) ?? 0 }] : [];
    });
    if (terms.length > 0) this.#rows.push({ row: place, upper: row.upper, terms });
    for (const { presence, ofStock } of terms) ofColumn.set(presence.stock, ofStock);
    const columns = [...ofColumn.keys()].filter((column) => !this.#byColumn.has(column));
    return {
      lower: row.lower,
      upper: row.upper,
      columns: columns.map((column) => this.#columnOf[column]),
      values: columns.map((column) => ofColumn.get(column) ?? 0),
    };
  }

  setCost(column: number, cost: number): void {
    if (this.#cost[column] === cost) return;
    this.#cost[column] = cost;
    const presence = this.#byColumn.get(column) ?? this.#byStock.get(column);
    if (!presence) {
      this.#inner.setCost(this.#columnOf[column], cost);
      return;
    }
    presence.cost = this.#cost[presence.column];
    this.#changed.add(presence);
  }

  setColumnBounds(column: number, lower: number, upper: number): void {
    const presence = this.#byColumn.get(column);
    if (!presence) {
      this.#inner.setColumnBounds(this.#columnOf[column], lower, upper);
      return;
    }
    presence.lower = lower;
    presence.upper = upper;
    this.#changed.add(presence);
  }

  setRowBounds(row: number, lower: number, upper: number): void {
    const folded = this.#rows.find((candidate) => candidate.row === row);
    if (folded) folded.upper = upper;
    if (this.#rowOf[row] >= 0) this.#inner.setRowBounds(this.#rowOf[row], lower, upper - this.#decided(folded));
  }

  setCoefficient(row: number, column: number, value: number): void {
    this.#inner.setCoefficient(this.#rowOf[row], this.#columnOf[column], value);
  }

  /** What the stocks that are decided to be present take of a row. */
  #decided(folded: FoldedRow | undefined): number {
    let sum = 0;
    for (const { presence, coefficient } of folded?.terms ?? []) if (presence.lower === 1) sum += coefficient;
    return sum;
  }

  #takeChanges(): void {
    if (this.#changed.size === 0) return;
    for (const presence of this.#changed) {
      const { stock } = presence;
      this.#inner.setCost(this.#columnOf[stock], this.#cost[stock] + presence.cost * perShare(presence));
    }
    for (const folded of this.#rows) {
      const row = this.#rowOf[folded.row];
      const touched = folded.terms.filter(({ presence }) => this.#changed.has(presence));
      for (const { presence, coefficient, ofStock } of touched) {
        this.#inner.setCoefficient(row, this.#columnOf[presence.stock], ofStock + coefficient * perShare(presence));
      }
      if (touched.length > 0) this.#inner.setRowBounds(row, -Infinity, folded.upper - this.#decided(folded));
    }
    this.#changed.clear();
  }

  solve(): LinearResult {
    this.#takeChanges();
    const result = this.#inner.solve();
    if (result.status === 'optimal') {
      return { status: 'optimal', values: this.#values(result.values), duals: this.#multipliers(result.duals, 1) };
    }
    return result.status === 'infeasible' && result.ray
      ? { status: 'infeasible', ray: this.#multipliers(result.ray, 0) }
      : result;
  }

  #values(inner: Float64Array): Float64Array {
    const values = Float64Array.from(this.#columnOf, (column) => (column < 0 ? 0 : inner[column]));
    for (const presence of this.#byColumn.values()) {
      const { stock, column, lower, upper } = presence;
      values[column] = Math.min(upper, Math.max(lower, values[stock] * perShare(presence)));
    }
    return values;
  }

  /** Duals (or a ray, which knows no cost) of all rows. */
  #multipliers(inner: Float64Array, cost: 0 | 1): Float64Array {
    const multipliers = Float64Array.from(this.#rowOf, (row) => (row < 0 ? 0 : inner[row]));
    for (const presence of this.#byColumn.values()) {
      multipliers[presence.tie] = -cost * presence.cost * perShare(presence);
    }
    for (const { row, terms } of this.#rows) {
      for (const { presence, coefficient } of terms) {
        multipliers[presence.tie] += multipliers[row] * coefficient * perShare(presence);
      }
    }
    return multipliers;
  }

  forget(): void {
    this.#inner.forget();
  }

  dispose(): void {
    this.#inner.dispose();
  }
}

/** What one unit of share makes of a presence: nothing where it is decided. */
function perShare({ lower, upper, greatest }: Folded): number {
  return lower < upper && greatest > 0 ? 1 / greatest : 0;
}

/** New places of the entries that stay; -1 for those that go. */
function renumbered(count: number, goes: (place: number) => boolean): Int32Array {
  let next = 0;
  return Int32Array.from({ length: count }, (_, place) => (goes(place) ? -1 : next++));
}
