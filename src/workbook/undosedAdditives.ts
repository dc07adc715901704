import type { Product, Workbook, WorkbookOrder } from './workbook';

/**
 * Packages and depressants are no base stocks: they enter an order only where it doses them or names them in a rule
 * (common practice, no source). Without this a depressant serves as a cheap thickener.
 */
export function isUndosedAdditive({ id, family }: Product, { doses, shares }: WorkbookOrder): boolean {
  if (family !== 'package' && family !== 'depressant') return false;
  if (doses.some(({ stockId }) => stockId === id)) return false;
  return !shares.some(
    (rule) => 'set' in rule && (rule.set.stockIds?.includes(id) || rule.set.families?.includes(family)),
  );
}

/** The note that tells which additives an order leaves aside; none where there are none. */
export function undosedNote({ products }: Workbook, order: WorkbookOrder): string[] {
  const excluded = new Set(order.excludedProductIds);
  const aside = products.filter((product) => !excluded.has(product.id) && isUndosedAdditive(product, order));
  if (aside.length === 0) return [];
  const names = aside.map(({ name }) => name).join(', ');
  return [`Packages and depressants are used only where the order doses them; not used here: ${names}.`];
}
