import { FAMILIES } from '../stock/family';
import { FIGURE_ORIGINS, type Figure } from '../stock/figure';
import type { PriceStep } from '../stock/stock';
import { dictionaryOf, identity, listOf, number, oneOf, optional, record, text } from './readers';
import type { Lot, Product } from './workbook';

const readFigure = record<Figure>({
  property: identity,
  celsius: optional(number),
  value: optional(number),
  origin: oneOf(...FIGURE_ORIGINS),
  standardDeviation: optional(number),
  method: optional(text),
  date: optional(text),
});

const readLot = record<Lot>({
  id: identity,
  name: text,
  tank: optional(text),
  certificateDate: optional(text),
  availableTonnes: optional(number),
  pricePerTonne: optional(number),
  figures: listOf(readFigure),
});

/** A product from untrusted data. */
export const readProduct = record<Product>({
  id: identity,
  name: text,
  supplier: optional(text),
  family: oneOf(...FAMILIES),
  pricePerTonne: optional(number),
  figures: listOf(readFigure),
  blendWeight: optional(number),
  leastDoseIfUsed: optional(number),
  greatestDose: optional(number),
  lotTonnes: optional(number),
  priceSteps: optional(listOf(record<PriceStep>({ fromTonnes: number, pricePerTonne: number }))),
  priceStepsFor: optional(oneOf<NonNullable<Product['priceStepsFor']>>('all tonnes', 'the excess')),
  flushCost: optional(number),
  flags: optional(listOf(text)),
  lots: listOf(readLot),
  note: optional(text),
  unread: optional(dictionaryOf(text)),
});
