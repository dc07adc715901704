import { type Family, type PredictOptions, predictBlend, type Recipe, type Stock, VISCOSITY_RULES } from '../../src';

interface ReferenceFigures {
  kv40: number;
  kv100: number;
  /** At 15 °C [kg/m³]. */
  density: number;
  pourPoint?: number;
  flashPoint?: number;
  anilinePoint?: number;
  noack?: number;
  sulphur?: number;
  saturates?: number;
}

/** A stock with measured figures. The names are the trade's, the figures invented unless the test says otherwise. */
export function referenceStock(
  id: string,
  { kv40, kv100, density, ...others }: ReferenceFigures,
  more: Partial<Stock> = {},
): Stock {
  const figure = (property: string, value: number, celsius?: number) => ({
    property,
    value,
    origin: 'measured' as const,
    ...(celsius === undefined ? {} : { celsius }),
  });
  return {
    id,
    name: id,
    family: 'other' satisfies Family,
    pricePerTonne: 1000,
    figures: [
      figure('kv', kv40, 40),
      figure('kv', kv100, 100),
      figure('density', density, 15),
      ...Object.entries(others).map(([property, value]) => figure(property, value)),
    ],
    ...more,
  };
}

/** The predicted value of a property; throws where it is unknown. */
export function predicted(
  stocks: readonly Stock[],
  shares: readonly number[],
  at: { property: string; celsius?: number },
  options: PredictOptions = {},
): number {
  const recipe: Recipe = stocks.map((stock, i) => ({ stockId: stock.id, massFraction: shares[i] }));
  const { properties } = predictBlend(stocks, recipe, { ...options, wanted: [at] });
  const found = properties.find(
    ({ property, celsius }) => property === at.property && (at.celsius === undefined || celsius === at.celsius),
  );
  if (found?.value === undefined) throw new Error(`${at.property} at ${at.celsius} is unknown`);
  return found.value;
}

/** The same viscosity under every rule. */
export function underEveryRule(stocks: readonly Stock[], shares: readonly number[], celsius: number) {
  return VISCOSITY_RULES.map((viscosityRule) => ({
    rule: viscosityRule,
    kv: predicted(stocks, shares, { property: 'kv', celsius }, { viscosityRule }),
  }));
}

export const SN_150 = referenceStock('SN 150', {
  kv40: 30.4,
  kv100: 5.15,
  density: 868,
  pourPoint: -12,
  flashPoint: 218,
});
export const SN_500 = referenceStock('SN 500', { kv40: 96, kv100: 10.8, density: 882, pourPoint: -9, flashPoint: 248 });
export const PAO_4 = referenceStock('PAO 4', {
  kv40: 17.4,
  kv100: 3.95,
  density: 820,
  pourPoint: -66,
  flashPoint: 220,
});
export const MPAO_100 = referenceStock('mPAO 100', { kv40: 1150, kv100: 103, density: 855, flashPoint: 284 });
export const ESTER = referenceStock('ester', {
  kv40: 19.8,
  kv100: 4.38,
  density: 946,
  pourPoint: -51,
  flashPoint: 250,
});
