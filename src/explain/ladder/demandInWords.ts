import { limitInWords } from '../../optimise/checkLimits';
import type { Dose, Order } from '../../optimise/order';
import { limitDefinition } from '../../optimise/rows/limitEnds';
import { doseInWords, percent, ruleInWords } from '../../optimise/ruleInWords';
import type { Stock } from '../../stock/stock';
import type { Demand } from '../explanation';
import { type LimitEnd, statedEnd } from '../limitEnd';

function endInWords(at: LimitEnd, order: Order): string {
  const limit = order.limits[at.limit];
  const unit = limitDefinition(limit, order)?.unit ?? '';
  const withUnit = (value: number) => (unit === '' || unit === '-' ? `${value}` : `${value} ${unit}`);
  const { stated } = statedEnd(order, at);
  const isStrict = limit.below === true || (limit.below === stated && limit.max !== stated);
  const sense = at.end === 'min' ? 'at least' : isStrict ? 'below' : 'at most';
  const margin = limit.insideBy ? `, inside by ${withUnit(limit.insideBy)}` : '';
  return `${limitInWords(limit, order)} ${sense} ${withUnit(stated)}${margin}`;
}

function smallestBatch({ batchTonnes }: Order): number | undefined {
  return typeof batchTonnes === 'object' ? batchTonnes.min : batchTonnes;
}

function boundInWords(kind: Extract<Demand, { stockId: string }>['kind'], stock: Stock, order: Order): string {
  const { name } = stock;
  switch (kind) {
    case 'amount on hand':
      return `${name}: ${stock.availableTonnes} t on hand for a batch of ${smallestBatch(order)} t`;
    case 'greatest dose':
      return `${name} at most ${percent(stock.greatestDose ?? 1)} of the mix (its greatest dose)`;
    case 'least dose':
      return `${name} absent or at least ${percent(stock.leastDoseIfUsed ?? 0)} of the mix`;
    case 'whole drums':
      return `${name} in whole drums of ${stock.lotTonnes} t`;
  }
}

function wordsOfDose(dose: Dose, { stocks }: Order): string {
  const words = doseInWords(dose, stocks);
  const isOptional = dose.required === false && (dose.exactly ?? dose.min ?? 0) > 0;
  if (isOptional) return `${words}, or none`;
  const saysNoAmount = dose.exactly === undefined && dose.min === undefined && dose.max === undefined;
  return saysNoAmount ? `${stocks.find(({ id }) => id === dose.stockId)?.name ?? dose.stockId} in the mix` : words;
}

/** A demand in the words of the trade, "Noack volatility at most 8 % m/m", "ester at most 15 % of the mix". */
export function demandInWords(demand: Demand, order: Order): string {
  switch (demand.kind) {
    case 'limit':
      return endInWords(demand, order);
    case 'dose': {
      const dose = order.doses?.[demand.dose];
      return dose ? wordsOfDose(dose, order) : `dose ${demand.dose + 1}`;
    }
    case 'share': {
      const rule = order.shares?.[demand.share];
      return rule ? ruleInWords(rule, order.stocks) : `rule ${demand.share + 1}`;
    }
    case 'most stocks':
      return order.mostStocks === 1 ? 'only 1 stock in the mix' : `at most ${order.mostStocks} stocks in the mix`;
    default: {
      const stock = order.stocks.find(({ id }) => id === demand.stockId);
      return stock ? boundInWords(demand.kind, stock, order) : demand.stockId;
    }
  }
}
