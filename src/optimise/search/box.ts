import type { SearchModel } from '../rows/searchModel';
import type { BoundChange } from './nodeHeap';

/** Bounds of the columns in a part of the search. */
export interface Box {
  lower: Float64Array;
  upper: Float64Array;
}

/** Bounds of the model with the changes on the way to a part; undefined where the part is empty. */
export function boxOf(model: SearchModel, changes?: BoundChange): Box | undefined {
  const lower = Float64Array.from(model.lower);
  const upper = Float64Array.from(model.upper);
  for (let change = changes; change; change = change.parent) {
    lower[change.column] = Math.max(lower[change.column], change.lower);
    upper[change.column] = Math.min(upper[change.column], change.upper);
  }
  for (let column = 0; column < lower.length; column++) {
    if (lower[column] > upper[column]) return undefined;
  }
  return { lower, upper };
}
