import type { Limit } from '../../src';

export type End = 'min' | 'max';

/** The upper end of a limit, whichever way it is written, and whether the mix must stay below it. */
export function upperEnd({ max, below }: Limit): { value: number | undefined; strict: boolean } {
  if (typeof below === 'number' && (max === undefined || below <= max)) return { value: below, strict: true };
  return { value: max, strict: below === true && max !== undefined };
}

/** Moves an end; an upper end keeps its way of writing. Undefined takes the end away. */
export function setEnd(limit: Limit, end: End, value: number | undefined): void {
  if (end === 'min') assign(limit, 'min', value);
  else if (typeof limit.below === 'number' && (limit.max === undefined || limit.below <= limit.max)) {
    assign(limit, 'below', value);
  } else {
    assign(limit, 'max', value);
    if (value === undefined) delete limit.below;
  }
}

/** Makes the upper end strict ("below") or not ("at most"). */
export function setStrict(limit: Limit, strict: boolean): void {
  const { value } = upperEnd(limit);
  delete limit.below;
  assign(limit, 'max', value);
  if (strict && value !== undefined) limit.below = true;
}

/** Sets an optional field, or takes it away: an absent field and an undefined one must not differ in the file. */
export function assign<Key extends 'min' | 'max' | 'below' | 'insideBy' | 'aim' | 'aimWeight' | 'celsius'>(
  limit: Limit,
  key: Key,
  value: Limit[Key],
): void {
  if (value === undefined) delete limit[key];
  else limit[key] = value;
}

/** How far inside its upper end the mix has to stay: margin, and one reporting unit where the end is strict. */
export function upperMargin(limit: Limit, reportingUnit: number): number {
  return (limit.insideBy ?? 0) + (upperEnd(limit).strict ? reportingUnit : 0);
}

export function isSameProperty(one: Limit, other: Limit): boolean {
  return one.property === other.property && one.celsius === other.celsius;
}
