import { blendValue } from '../blend/blendValue';
import { hasViscosityIndex, viscosityIndex } from '../property/viscosityIndex';
import type { Recipe } from '../stock/stock';
import { checkLimits } from './checkLimits';
import type { Order } from './order';
import { type Candidates, quantityKey } from './rows/candidates';
import type { SearchModel } from './rows/searchModel';
import { NO_SHARE } from './search/discreteChoices';

/** Shares may miss a bound or a share rule by this much [mass fraction]: a hundredth of a gram in a tonne. */
const SHARE_TOLERANCE = 1e-8;

/** Shares of the stocks from a solution: traces of the engine's tolerance removed, adding up to 1. */
export function sharesOf(model: SearchModel, values: ArrayLike<number>): Float64Array {
  const shares = Float64Array.from(model.stocks, (_, i) => (values[i] > NO_SHARE ? values[i] : 0));
  const sum = shares.reduce((total, share) => total + share, 0);
  return shares.map((share) => share / sum);
}

export function recipeOf(model: SearchModel, values: ArrayLike<number>): Recipe {
  const shares = sharesOf(model, values);
  return model.stocks.flatMap((stock, i) => (shares[i] > 0 ? [{ stockId: stock.id, massFraction: shares[i] }] : []));
}

function keepsShares(model: SearchModel, shares: Float64Array): boolean {
  for (let i = 0; i < shares.length; i++) {
    if (shares[i] < model.lower[i] - SHARE_TOLERANCE || shares[i] > model.upper[i] + SHARE_TOLERANCE) return false;
  }
  return model.rows.every((row) => {
    if (row.source.kind !== 'dose' && row.source.kind !== 'share') return true;
    if (row.columns.some((column) => column >= shares.length)) return true;
    const activity = row.columns.reduce((sum, column, k) => sum + row.values[k] * shares[column], 0);
    return activity >= row.lower - SHARE_TOLERANCE && activity <= row.upper + SHARE_TOLERANCE;
  });
}

/** Values of the limited properties of shares along the candidates, in physical units. */
function valueOfShares(candidates: Candidates, shares: Float64Array) {
  const viscosity = (celsius: number) => {
    const quantity = candidates.quantities.get(quantityKey({ property: 'kv', celsius }));
    return quantity ? blendValue(quantity, shares) : Number.NaN;
  };
  return (property: string, celsius: number | undefined): number | undefined => {
    if (property === 'vi') {
      const kv40 = viscosity(40);
      const kv100 = viscosity(100);
      return hasViscosityIndex(kv40, kv100) ? viscosityIndex(kv40, kv100) : undefined;
    }
    const quantity = candidates.quantities.get(
      quantityKey(celsius === undefined ? { property } : { property, celsius }),
    );
    return quantity && blendValue(quantity, shares);
  };
}

/** The exact check of a solution: limits in physical units, shares within their bounds and rules. */
export function recipeCheck(order: Order, candidates: Candidates, model: SearchModel) {
  return (values: Float64Array): boolean => {
    const shares = sharesOf(model, values);
    if (!keepsShares(model, shares)) return false;
    return checkLimits(order, valueOfShares(candidates, shares)).every((check) => check.passes);
  };
}
