import { tidy } from '../limitEnd';
import type { EndSteps } from './endSteps';

/** An end that may be moved, and what one reporting unit of it weighs. */
export interface Movable {
  steps: EndSteps;
  weight: number;
}

/** How far ends were moved, in reporting units, each by its weight. Free of binary rounding, so that equals are equal. */
export function effortOf(ends: readonly Movable[], to: readonly number[]): number {
  const efforts = ends.map(({ steps, weight }, place) => (weight * Math.abs(to[place] - steps.stated)) / steps.unit);
  return tidy(efforts.reduce((sum, effort) => sum + effort, 0));
}
