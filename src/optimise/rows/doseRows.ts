import { isBaseOil } from '../../stock/family';
import type { Dose, Order } from '../order';
import { greatestDoseAsTheRest, isCompulsory } from './candidates';
import { doseShares } from './doseShares';
import { LEAST_SHARE_THAT_COUNTS, type ModelBuilder } from './modelBuilder';
import { priceSegments } from './priceSegments';

/** Smallest batch of the order [t]: the one for which stock on hand lasts longest. */
function smallestBatch(order: Order): number | undefined {
  return typeof order.batchTonnes === 'object' ? order.batchTonnes.min : order.batchTonnes;
}

/** Greatest shares of the stocks: by their own limit, the quantity on hand, and "as the rest". */
export function addStockBounds(builder: ModelBuilder, order: Order, takingTheRest: ReadonlyMap<string, string>): void {
  const batch = smallestBatch(order);
  builder.stocks.forEach((stock, place) => {
    if (stock.greatestDose !== undefined) builder.cutUpper(place, stock.greatestDose);
    if (stock.availableTonnes !== undefined && batch !== undefined) {
      builder.cutUpper(place, stock.availableTonnes / batch);
    }
    if (takingTheRest.has(stock.id)) builder.cutUpper(place, greatestDoseAsTheRest(order));
    const least = stock.leastDoseIfUsed ?? 0;
    if (least > 0) {
      if (isCompulsory(order, stock.id)) builder.raiseLower(place, least);
      else builder.presenceOf(place);
    }
    if (stock.priceSteps?.length && typeof order.batchTonnes === 'number') {
      builder.addPriceSegments(place, priceSegments(stock), order.batchTonnes);
    }
    if (stock.flushCost && typeof order.batchTonnes === 'number') {
      builder.payForPresence(place, stock.flushCost / order.batchTonnes);
    }
    if (stock.lotTonnes !== undefined && typeof order.batchTonnes === 'number') {
      builder.wholeLots.push({ stock: place, share: stock.lotTonnes / order.batchTonnes });
    }
  });
}

function addDoseOfMix(builder: ModelBuilder, place: number, dose: Dose, compulsory: boolean): void {
  const least = dose.exactly ?? dose.min ?? 0;
  const most = dose.exactly ?? dose.max ?? 1;
  builder.cutUpper(place, most);
  if (compulsory) builder.raiseLower(place, least);
  else if (least > 0) {
    const presence = builder.presenceOf(place);
    presence.least = Math.max(presence.least, least);
  }
}

/** A share of the base oil: x - d Σ base ≤ 0 and ≥ 0; a package in the base is counted on the base alone. */
function addDoseOfBase(builder: ModelBuilder, place: number, dose: Dose, index: number): void {
  const row = (share: number) =>
    builder.stocks.map(
      (stock, column) => [column, (column === place ? 1 : 0) - (isBaseOil(stock.family) ? share : 0)] as const,
    );
  const least = dose.exactly ?? dose.min;
  const most = dose.exactly ?? dose.max;
  if (least !== undefined) builder.addRow({ kind: 'dose', dose: index }, 0, Infinity, row(least));
  if (most !== undefined) builder.addRow({ kind: 'dose', dose: index }, -Infinity, 0, row(most));
}

/** The share from which a stock counts as present: its least dose, or a trace, but no more than it may be. */
function leastPresence(builder: ModelBuilder, place: number): number {
  const least = builder.stocks[place].leastDoseIfUsed ?? 0;
  return least > 0 ? least : Math.min(LEAST_SHARE_THAT_COUNTS, builder.upper(place));
}

/** The doses of the order. A dose of a stock that was left out (and is not compulsory) has nothing to say. */
export function addDoses(builder: ModelBuilder, order: Order): void {
  order.doses?.forEach((stated, index) => {
    const dose = doseShares(stated, order);
    const place = builder.placeOf(dose.stockId);
    if (place === undefined) return;
    const compulsory = isCompulsory(order, dose.stockId);
    if (dose.of === 'base oil') addDoseOfBase(builder, place, dose, index);
    else addDoseOfMix(builder, place, dose, compulsory);
    const hasLeast = (dose.exactly ?? dose.min ?? 0) > 0;
    if (compulsory && !hasLeast) builder.raiseLower(place, leastPresence(builder, place));
  });
}
