import type { Order } from '../../src';
import type { Rounding } from './explainStore';

const PERCENTS = [0.1, 0.01];
/** Divisions of scales [kg]. */
const DIVISIONS = [0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50];

/** Finest and coarsest step of a share worth asking for [mass fraction]. */
const FINEST = 1e-5;
const COARSEST = 0.01;

function isWhole(value: number): boolean {
  return Math.abs(value - Math.round(value)) < 1e-9 * value;
}

/** Size of a batch that is fixed [kg]. */
function batchKilograms({ batchTonnes }: Pick<Order, 'batchTonnes'>): number | undefined {
  return typeof batchTonnes === 'number' ? Number((batchTonnes * 1000).toPrecision(12)) : undefined;
}

/** The step of the shares that a rounding stands for in this order [mass fraction]; undefined where it has none. */
export function stepOf(rounding: Rounding, order: Pick<Order, 'batchTonnes'>): number | undefined {
  const [size, unit] = rounding.split(' ');
  if (unit === '%') return Number((Number(size) / 100).toPrecision(12));
  const kilograms = batchKilograms(order);
  return unit === 'kg' && kilograms ? Number(size) / kilograms : undefined;
}

/** What the recipe of this order can be rounded to: shares, and divisions of a scale that make up the batch. */
export function roundingsOf(order: Pick<Order, 'batchTonnes'>): Rounding[] {
  const kilograms = batchKilograms(order);
  const percents = PERCENTS.map((percent): Rounding => `${percent} %`);
  if (!kilograms) return percents;
  const divisions = DIVISIONS.filter((division) => {
    const step = division / kilograms;
    return step >= FINEST && step <= COARSEST && isWhole(kilograms / division);
  });
  return [...percents, ...divisions.map((division): Rounding => `${division} kg`)];
}
