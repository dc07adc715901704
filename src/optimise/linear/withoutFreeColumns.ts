import type { LinearProgram, LinearRow } from './linearEngine';

/**
 * A program without its free columns that an equality row defines (Σ a x - f = 0): f is replaced by its sum wherever
 * it stands, and the defining row is left without bounds, so that rows keep their places. Dense, for an engine that
 * knows only x ≥ 0 and loses digits on a difference of two halves.
 */
export interface SlimProgram {
  program: LinearProgram;
  /** Values of all columns from those of the slim program. */
  restore(values: Float64Array): Float64Array;
}

/** Free column → the sum that defines it. */
function definitions({ rows, lower, upper }: LinearProgram): Map<number, { row: number; terms: Map<number, number> }> {
  const found = new Map<number, { row: number; terms: Map<number, number> }>();
  const isFree = (column: number) => lower[column] === -Infinity && upper[column] === Infinity;
  rows.forEach((row, place) => {
    if (row.lower !== 0 || row.upper !== 0) return;
    const free = row.columns.filter(isFree);
    if (free.length !== 1 || found.has(free[0])) return;
    const own = row.values[row.columns.indexOf(free[0])];
    const terms = new Map<number, number>();
    row.columns.forEach((column, k) => {
      if (column !== free[0]) terms.set(column, -row.values[k] / own);
    });
    found.set(free[0], { row: place, terms });
  });
  return found;
}

export function withoutFreeColumns(program: LinearProgram): SlimProgram {
  const defined = definitions(program);
  const definingRows = new Set([...defined.values()].map((definition) => definition.row));
  const replace = (row: LinearRow, place: number): LinearRow => {
    if (definingRows.has(place)) return { lower: -Infinity, upper: Infinity, columns: [], values: [] };
    const terms = new Map<number, number>();
    const add = (column: number, value: number) => void terms.set(column, (terms.get(column) ?? 0) + value);
    row.columns.forEach((column, k) => {
      const definition = defined.get(column);
      if (!definition) add(column, row.values[k]);
      else for (const [inner, factor] of definition.terms) add(inner, row.values[k] * factor);
    });
    return { lower: row.lower, upper: row.upper, columns: [...terms.keys()], values: [...terms.values()] };
  };
  const fixed = (bounds: Float64Array) => bounds.map((bound, column) => (defined.has(column) ? 0 : bound));
  return {
    program: {
      cost: program.cost,
      lower: fixed(program.lower),
      upper: fixed(program.upper),
      rows: program.rows.map(replace),
    },
    restore(values) {
      const all = Float64Array.from(values);
      for (const [column, { terms }] of defined) {
        all[column] = [...terms].reduce((sum, [inner, factor]) => sum + factor * values[inner], 0);
      }
      return all;
    },
  };
}
