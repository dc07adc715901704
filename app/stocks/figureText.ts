import type { PropertyDefinition } from '../../src';
import { formatForEditing, formatNumber } from '../parts/numberText';

/** Decimals of a value: those of the property, fewer for large viscosities (ASTM D445 reports four figures). */
export function digitsOf({ id, digits }: Pick<PropertyDefinition, 'id' | 'digits'>, value: number): number {
  if (id !== 'kv' || Math.abs(value) < 100) return digits;
  return Math.abs(value) < 1000 ? 1 : 0;
}

/** A value as it is shown, in the property's unit; "–" for none. */
export function figureText(definition: Pick<PropertyDefinition, 'id' | 'digits'>, value: number | undefined): string {
  return formatNumber(value, value === undefined ? 0 : digitsOf(definition, value));
}

/** A figure as it was entered: the usual decimals, and all those it has beyond them, so that nothing is hidden. */
export function enteredText(definition: Pick<PropertyDefinition, 'id' | 'digits'>, value: number | undefined): string {
  return value === undefined ? '–' : formatForEditing(value, digitsOf(definition, value));
}
