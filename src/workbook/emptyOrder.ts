import type { WorkbookOrder } from './workbook';

/** An order that asks for nothing yet: every product, no limits, the default blending rule. */
export function emptyOrder(id: string, name: string): WorkbookOrder {
  return {
    id,
    name,
    solveOn: 'products',
    excludedProductIds: [],
    limits: [],
    doses: [],
    shares: [],
    depressant: false,
    viscosityRule: 'wright',
    costBasis: 'tonne',
    laboratoryOnly: [],
  };
}
