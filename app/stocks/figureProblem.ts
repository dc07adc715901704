import type { Product, PropertyDefinition } from '../../src';
import { formatNumber, unreadInWords } from '../parts/numberText';
import { countingValue, type FigureAt } from './productFigures';

/** Why a text in a figure's cell is not taken. */
export function unreadReason(text: string): string {
  return `${unreadInWords(text)} Until then the figure is unknown.`;
}

/** Why a figure cannot be right, or nothing. */
export function figureProblem(product: Product, definition: PropertyDefinition, at: FigureAt): string | undefined {
  const value = countingValue(product, at);
  if (value === undefined) return undefined;
  const { min, max } = definition.sense;
  if (definition.id === 'kv' && value <= 0) return 'A viscosity is above zero. Type it again, or clear the cell.';
  if (value < min || value > max) {
    const unit = definition.unit === '-' ? '' : ` ${definition.unit}`;
    const plain = (end: number) => formatNumber(end, Number.isInteger(end) ? 0 : definition.digits);
    return `Cannot be right: expected ${plain(min)} to ${plain(max)}${unit}. Check the number and its unit.`;
  }
  return definition.id === 'kv' ? risingViscosity(product, at.celsius, value) : undefined;
}

/** Viscosity falls as temperature rises: names the figure that says otherwise. */
function risingViscosity(product: Product, celsius: number | undefined, value: number): string | undefined {
  if (celsius === undefined) return undefined;
  for (const other of product.figures) {
    const rival = other.property === 'kv' ? countingValue(product, other) : undefined;
    if (rival === undefined || other.celsius === undefined || other.celsius === celsius) continue;
    if (other.celsius > celsius ? rival >= value : rival <= value) {
      const [cold, warm] = other.celsius > celsius ? [celsius, other.celsius] : [other.celsius, celsius];
      return `KV${cold} must be above KV${warm}. Are the two swapped?`;
    }
  }
  return undefined;
}
