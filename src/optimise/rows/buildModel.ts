import type { Order } from '../order';
import type { OrderProblem } from '../outcome';
import type { Candidates } from './candidates';
import { addDoses, addStockBounds } from './doseRows';
import { addLimits } from './limitRows';
import { ModelBuilder } from './modelBuilder';
import type { SearchModel } from './searchModel';
import { addMostStocks, addShares } from './shareRows';
import { viLimits } from './viLimits';
import { drumsThatDoNotAddUp } from './wholeDrums';

/** Turns a valid order and its usable stocks into columns and rows, or says what is wrong. */
export function buildModel(order: Order, candidates: Candidates): { model: SearchModel; problems: OrderProblem[] } {
  const { stocks, quantities, takingTheRest } = candidates;
  const builder = new ModelBuilder(stocks);
  addStockBounds(builder, order, takingTheRest);
  addDoses(builder, order);
  addShares(builder, order);
  addMostStocks(builder, order);
  const limitProblems = addLimits(builder, order, quantities);
  const { vi, problems: viProblems } = viLimits(order, quantities);
  const model = builder.build();
  return {
    model: vi ? { ...model, vi } : model,
    problems: [...limitProblems, ...viProblems, ...drumsThatDoNotAddUp(order, model)],
  };
}
