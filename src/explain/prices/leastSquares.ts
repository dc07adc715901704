/** Keeps the normal equations regular where unknowns hang together; relative to their diagonal [-]. */
const RIDGE = 1e-12;

/**
 * The unknowns that come nearest to `rows · unknowns = values`, least squares by the normal equations: for the handful of
 * equations that a recipe gives. Columns are scaled to size one first.
 */
export function leastSquares(rows: readonly (readonly number[])[], values: readonly number[]): number[] {
  const count = rows[0]?.length ?? 0;
  const scales = Array.from({ length: count }, (_, k) => Math.max(1e-300, ...rows.map((row) => Math.abs(row[k]))));
  const scaled = rows.map((row) => row.map((value, k) => value / scales[k]));
  const matrix = scales.map((_, a) => [
    ...scales.map((_, b) => scaled.reduce((sum, row) => sum + row[a] * row[b], a === b ? RIDGE * rows.length : 0)),
    scaled.reduce((sum, row, j) => sum + row[a] * values[j], 0),
  ]);
  eliminate(matrix);
  return matrix.map((row, k) => row[count] / scales[k]);
}

/** Gauss-Jordan elimination with pivots, in place; the last column holds the right-hand side, then the solution. */
function eliminate(matrix: number[][]): void {
  for (let k = 0; k < matrix.length; k++) {
    let pivot = k;
    for (let r = k + 1; r < matrix.length; r++) if (Math.abs(matrix[r][k]) > Math.abs(matrix[pivot][k])) pivot = r;
    [matrix[k], matrix[pivot]] = [matrix[pivot], matrix[k]];
    const own = matrix[k].map((value) => value / matrix[k][k]);
    matrix[k] = own;
    matrix.forEach((row, r) => {
      if (r !== k) matrix[r] = row.map((value, c) => value - row[k] * own[c]);
    });
  }
}
