/** How far a figure may be from the published one: in its unit, or as a share of it. */
export type Tolerance = { absolute: number } | { relative: number };

function describeDifference(kind: string, path: string, actual: number, expected: number, allowed: number): string {
  const difference = actual - expected;
  return (
    `${path}: got ${actual}, ${kind} ${expected}; difference ${difference}, ` +
    `relative ${expected === 0 ? 'none (zero expected)' : difference / expected}, allowed ${allowed}`
  );
}

function compare(kind: string, path: string, actual: number, expected: number, allowed: number): void {
  // Written so that NaN fails on either side.
  if (Math.abs(actual - expected) <= allowed) return;
  throw new Error(describeDifference(kind, path, actual, expected, allowed));
}

/** Compares with a published figure, within what its digits or its method allow. Throws with both values otherwise. */
export function published(path: string, actual: number, expected: number, tolerance: Tolerance): void {
  const allowed = 'absolute' in tolerance ? tolerance.absolute : tolerance.relative * Math.abs(expected);
  compare('published', path, actual, expected, allowed);
}

/** Compares with a figure this project wrote down itself: exact but for rounding in the last digits. */
export function recorded(path: string, actual: number, expected: number): void {
  compare('recorded', path, actual, expected, 1e-11 * Math.max(1, Math.abs(expected)));
}
