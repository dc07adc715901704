import type { Dose, ShareBasis, WorkbookOrder } from '../../src';

/** What a dose is counted in: a share of the mix or of the base oil, or tonnes in the batch. */
export type DoseMeasure = ShareBasis | 'tonnes';

export function measureOf({ of, unit }: Dose): DoseMeasure {
  return unit === 'tonnes' ? 'tonnes' : (of ?? 'mix');
}

/** The batch that tonnes are counted on [t]: the smallest where it is free. */
export function batchTonnesOf({ batchTonnes }: Pick<WorkbookOrder, 'batchTonnes'>): number | undefined {
  return typeof batchTonnes === 'object' ? batchTonnes.min : batchTonnes;
}

/** The same dose counted otherwise. Between shares and tonnes its numbers are converted; without a batch they go. */
export function inMeasure(dose: Dose, measure: DoseMeasure, batch: number | undefined): Dose {
  const { of: _of, unit: _unit, exactly, min, max, ...rest } = dose;
  const factor =
    (dose.unit === 'tonnes' ? 1 / (batch ?? Number.NaN) : 1) * (measure === 'tonnes' ? (batch ?? Number.NaN) : 1);
  const isSame = (dose.unit === 'tonnes') === (measure === 'tonnes');
  const turned = (value: number | undefined) =>
    value === undefined || isSame ? value : Number((value * factor).toPrecision(6));
  const numbers = Object.entries({ exactly: turned(exactly), min: turned(min), max: turned(max) });
  const kept = Object.fromEntries(numbers.filter(([, value]) => value !== undefined && Number.isFinite(value)));
  return {
    ...rest,
    ...kept,
    ...(measure === 'base oil' && { of: 'base oil' as const }),
    ...(measure === 'tonnes' && { unit: 'tonnes' as const }),
  };
}
