import { kv40ForViscosityIndex, type Product } from '../../src';
import { countingValue } from './productFigures';

const KV100 = { property: 'kv', celsius: 100 };

/** True where KV100 is the only viscosity: a stated viscosity index then stands in for KV40. */
export function needsStatedVi(product: Product): boolean {
  return !product.figures.some(
    (figure) => figure.property === 'kv' && figure.celsius !== 100 && countingValue(product, figure) !== undefined,
  );
}

/** KV40 [mm²/s] worked back from KV100 and the stated viscosity index, or why there is none; undefined: none stated. */
export function estimatedKv40(product: Product): { kv40: number } | { problem: string } | undefined {
  const vi = countingValue(product, { property: 'vi' });
  const kv100 = countingValue(product, KV100);
  if (vi === undefined || kv100 === undefined || !needsStatedVi(product)) return undefined;
  try {
    return { kv40: kv40ForViscosityIndex(vi, kv100) };
  } catch (error) {
    if (error instanceof RangeError) return { problem: error.message };
    throw error;
  }
}
