import type { Dose, Order } from '../order';

/** A dose with its numbers as mass fractions: tonnes are counted on the batch. */
export function doseShares(dose: Dose, { batchTonnes }: Order): Dose {
  if (dose.unit !== 'tonnes') return dose;
  const { exactly, min, max, unit: _, ...rest } = dose;
  const smallest = typeof batchTonnes === 'object' ? batchTonnes.min : (batchTonnes ?? Number.NaN);
  const largest = typeof batchTonnes === 'object' ? batchTonnes.max : (batchTonnes ?? Number.NaN);
  return {
    ...rest,
    ...(exactly === undefined ? {} : { exactly: exactly / smallest }),
    ...(min === undefined ? {} : { min: min / smallest }),
    ...(max === undefined ? {} : { max: Math.min(1, max / largest) }),
  };
}
