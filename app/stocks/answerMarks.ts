import type { LeftOut, OmittedProduct, Product } from '../../src';
import { figureKey } from './productFigures';

/** By stock and column: why the order cannot use the stock, at the cell that would help. */
export type AnswerMarks = ReadonlyMap<string, ReadonlyMap<string, string>>;

const NO_MARKS: AnswerMarks = new Map();

/** Where to say why stocks stay out of an answer. What no column stands for is said at the name. */
export function answerMarks(
  products: readonly Product[],
  leftOut: readonly LeftOut[],
  omitted: readonly OmittedProduct[],
  columnIds: ReadonlySet<string>,
): AnswerMarks {
  if (leftOut.length === 0 && omitted.length === 0) return NO_MARKS;
  const productOf = new Map(products.map((product) => [product.id, product]));
  for (const product of products) for (const lot of product.lots) productOf.set(lot.id, product);
  const marks = new Map<string, Map<string, string>>();
  const mark = (product: Product | undefined, columnId: string, message: string) => {
    if (!product) return;
    const own = marks.get(product.id) ?? new Map<string, string>();
    const place = columnIds.has(columnId) ? columnId : 'name';
    marks.set(product.id, own.set(place, own.get(place) ?? message));
  };
  for (const entry of leftOut) mark(productOf.get(entry.stockId), leftOutColumn(entry), entry.message);
  for (const { productId, message } of omitted) {
    const product = productOf.get(productId);
    mark(product, product?.pricePerTonne === undefined ? 'pricePerTonne' : 'name', message);
  }
  return marks;
}

function leftOutColumn({ reason, property, celsius }: LeftOut): string {
  if (reason === 'missing flag') return 'flags';
  return property === undefined ? 'name' : figureKey({ property, ...(celsius !== undefined && { celsius }) });
}

/** The former marks of each stock where they say the same, so that its row need not be drawn again. */
export function sameMarks(former: AnswerMarks, next: AnswerMarks): AnswerMarks {
  if (next.size === 0) return NO_MARKS;
  const inWords = (own: ReadonlyMap<string, string> | undefined) => JSON.stringify(own && [...own]);
  return new Map(
    [...next].map(([id, own]) => {
      const before = former.get(id);
      return [id, before && inWords(before) === inWords(own) ? before : own];
    }),
  );
}
