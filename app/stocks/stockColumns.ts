import { type OwnProperty, PROPERTY_TABLE, type Product, propertyDefinition, type WorkbookOrder } from '../../src';
import {
  DRUM_COLUMN,
  flushColumn,
  GREATEST_DOSE_COLUMN,
  LEAST_DOSE_COLUMN,
  ON_HAND_COLUMN,
  priceColumn,
} from './amountColumns';
import type { Column } from './column';
import { figureColumn } from './figureColumn';
import { FAMILY_COLUMN, FLAGS_COLUMN, NAME_COLUMN, SUPPLIER_COLUMN } from './plainColumns';
import { PRICE_STEPS_COLUMN } from './priceStepsColumn';
import { figureKey } from './productFigures';
import { VI_COLUMN } from './viColumn';

const NOTHING = () => ({ text: '', edit: '' });

export const SHARE_COLUMN: Column = {
  id: 'share',
  label: 'In recipe',
  unit: '%',
  title: 'Share in the recipe of the order on screen [% m/m]',
  kind: 'share',
  read: NOTHING,
};

export const USE_COLUMN: Column = {
  id: 'use',
  label: 'Use',
  title: 'May be used in the order on screen',
  kind: 'use',
  read: NOTHING,
};

/** Figures every stocks table has a column for, left and right of the viscosity index. */
const BEFORE_VI = ['density@15', 'kv@40', 'kv@100'];
const AFTER_VI = ['noack', 'pourPoint', 'pourPointDepressed', 'flashPoint', 'sulphur'];
const ALWAYS = new Set([...BEFORE_VI, ...AFTER_VI]);

/** Further figures worth a column: those that a stock has, the user's own, and those that the order limits. */
export function furtherFigures(
  products: readonly Product[],
  ownProperties: readonly OwnProperty[],
  order: WorkbookOrder | undefined,
): string[] {
  const keys = new Set([
    ...products.flatMap(({ figures }) => figures.map(figureKey)),
    ...ownProperties.map(({ id }) => id),
  ]);
  for (const { property, celsius } of order?.limits ?? []) {
    // The viscosity index is calculated, and viscosities at other temperatures follow from two.
    if (property === 'vi' || property === 'kv') continue;
    keys.add(figureKey({ property, celsius: celsius ?? propertyDefinition(property)?.temperatures?.[0] }));
  }
  keys.delete('vi');
  return [...keys].filter((key) => !ALWAYS.has(key)).sort(byPropertyTable);
}

const placeOf = (key: string) => {
  const place = PROPERTY_TABLE.findIndex(({ id }) => id === key.split('@')[0]);
  return place < 0 ? PROPERTY_TABLE.length : place;
};

function byPropertyTable(a: string, b: string): number {
  return placeOf(a) - placeOf(b) || a.localeCompare(b);
}

function columnOf(key: string, ownProperties: readonly OwnProperty[]): Column[] {
  const [property = '', celsius] = key.split('@');
  const definition = propertyDefinition(property, ownProperties);
  return definition ? [figureColumn(definition, celsius === undefined ? undefined : Number(celsius))] : [];
}

/** The columns of the stocks table, left to right. */
export function stockColumns(
  further: readonly string[],
  ownProperties: readonly OwnProperty[],
  currency: string,
  hasOrder: boolean,
): Column[] {
  const figures = (keys: readonly string[]) => keys.flatMap((key) => columnOf(key, ownProperties));
  return [
    ...(hasOrder ? [USE_COLUMN] : []),
    NAME_COLUMN,
    ...(hasOrder ? [SHARE_COLUMN] : []),
    SUPPLIER_COLUMN,
    FAMILY_COLUMN,
    priceColumn(currency),
    ...figures(BEFORE_VI),
    VI_COLUMN,
    ...figures(AFTER_VI),
    ...figures(further),
    ON_HAND_COLUMN,
    LEAST_DOSE_COLUMN,
    GREATEST_DOSE_COLUMN,
    DRUM_COLUMN,
    flushColumn(currency),
    PRICE_STEPS_COLUMN,
    FLAGS_COLUMN,
  ];
}
