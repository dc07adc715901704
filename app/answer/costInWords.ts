import type { BlendOutcome, Order } from '../../src';
import { formatMoney } from '../parts/money';

/** The cost that the order makes least, and the other one where it is known. */
export interface CostWords {
  main: string;
  mainUnit: string;
  second: string;
}

const PER_TONNE = 'per tonne';
const PER_CUBIC_METRE = 'per m³ at 15 °C';

/** "€1,500.00", "per tonne"; undefined where there is no recipe. */
export function costInWords(
  { costPerTonne, costPerCubicMetre }: BlendOutcome,
  { costBasis }: Pick<Order, 'costBasis'>,
  currency: string,
): CostWords | undefined {
  if (costPerTonne === undefined) return undefined;
  const perTonne = formatMoney(costPerTonne, currency);
  if (costPerCubicMetre === undefined) {
    return { main: perTonne, mainUnit: PER_TONNE, second: 'per m³ unknown: a density is missing' };
  }
  const perCubicMetre = formatMoney(costPerCubicMetre, currency);
  return costBasis === 'cubic metre'
    ? { main: perCubicMetre, mainUnit: PER_CUBIC_METRE, second: `${perTonne} ${PER_TONNE}` }
    : { main: perTonne, mainUnit: PER_TONNE, second: `${perCubicMetre} ${PER_CUBIC_METRE}` };
}
