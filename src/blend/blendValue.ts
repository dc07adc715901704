import type { BlendQuantity } from './blendQuantity';

/**
 * Value of a blended property for shares along the quantity's stocks, in the property's unit; NaN where a stock in
 * use has no figure or nothing in use has one.
 */
export function blendValue(quantity: BlendQuantity, shares: ArrayLike<number>): number {
  let weighted = 0;
  let weight = 0;
  for (let place = 0; place < quantity.terms.length; place++) {
    if (!(shares[place] > 0)) continue;
    const term = quantity.terms[place];
    if (term.state === 'unknown') return Number.NaN;
    if (term.state !== 'term') continue;
    weighted += shares[place] * term.weight * term.index;
    weight += shares[place] * term.weight;
  }
  return weight > 0 ? quantity.index.fromIndex(weighted / weight) : Number.NaN;
}
