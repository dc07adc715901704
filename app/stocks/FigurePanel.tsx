import {
  FIGURE_ORIGINS,
  type Figure,
  type FigureOrigin,
  type OwnProperty,
  type Product,
  type PropertyDefinition,
  propertyDefinition,
} from '../../src';
import { NumberField } from '../parts/NumberField';
import { exactText } from '../parts/numberText';
import { Select } from '../parts/Select';
import { TextField } from '../parts/TextField';
import type { Column } from './column';
import styles from './FigurePanel.module.css';
import { figureOf, putFigure } from './productFigures';
import { editProduct, writeCell } from './stockEdits';

const ORIGIN_OPTIONS = FIGURE_ORIGINS.map((origin) => ({ value: origin, label: origin }));

/** Everything a figure carries beside its value: where it comes from, its method, date and spread. */
export function FigurePanel({
  product,
  column,
  ownProperties,
}: {
  product: Product;
  column: Column;
  ownProperties: readonly OwnProperty[];
}) {
  const at = column.figure;
  const definition = at && propertyDefinition(at.property, ownProperties);
  if (!at || !definition) return null;
  const figure = product.unread?.[column.id] === undefined ? figureOf(product, at) : undefined;
  const change = (part: Partial<Figure>) =>
    editProduct(product.id, `${column.label} of ${product.name}`, (draft) => {
      const old = figureOf(draft, at);
      if (old) putFigure(draft, withoutEmpty({ ...old, ...part }));
    });

  return (
    <section className={styles.fields} aria-label={`Figure: ${column.label} of ${product.name}`}>
      <p className={styles.what}>
        <b>{product.name || 'Stock without a name'}</b>
        <span>{column.title}</span>
      </p>
      <Value product={product} column={column} definition={definition} figure={figure} />
      {figure ? (
        <>
          <Select
            label="Origin"
            value={figure.origin}
            options={ORIGIN_OPTIONS.map((option) => ({
              ...option,
              disabled: figure.value === undefined && option.value !== 'as the rest',
            }))}
            onChange={(origin: FigureOrigin) =>
              change({ origin, ...(origin === 'as the rest' && { value: undefined }) })
            }
          />
          <TextField
            label="Method"
            placeholder={definition.method}
            value={figure.method ?? ''}
            onCommit={(method) => change({ method: method.trim() || undefined })}
          />
          <TextField
            label="Date"
            placeholder="2026-01-31"
            value={figure.date ?? ''}
            check={dateProblem}
            onCommit={(date) => change({ date: date.trim() || undefined })}
          />
          <NumberField
            label="Standard deviation"
            unit={column.unit}
            digits={0}
            sense={{ min: 0, max: definition.sense.max }}
            value={figure.standardDeviation}
            onCommit={(standardDeviation) => change({ standardDeviation })}
          />
        </>
      ) : (
        <p className={styles.unknown}>Unknown. Type a value, or “rest” where the stock takes the value of the rest.</p>
      )}
    </section>
  );
}

function Value({
  product,
  column,
  definition,
  figure,
}: {
  product: Product;
  column: Column;
  definition: PropertyDefinition;
  figure: Figure | undefined;
}) {
  if (figure?.origin === 'as the rest') return <p className={styles.unknown}>takes the value of the rest</p>;
  return (
    <NumberField
      key={`${product.id} ${column.id}`}
      label="Value"
      unit={column.unit}
      digits={0}
      step={10 ** -definition.digits}
      value={figure?.value}
      unreadText={product.unread?.[column.id]}
      onCommit={(value) => writeCell(product, column, value === undefined ? '' : exactText(value))}
      onUnread={(text) => writeCell(product, column, text)}
    />
  );
}

function withoutEmpty(figure: Figure): Figure {
  const { property, origin, ...rest } = figure;
  const given = Object.entries(rest).filter(([, value]) => value !== undefined);
  return { property, ...Object.fromEntries(given), origin };
}

/** Why a text is no date of the calendar, or nothing. */
export function dateProblem(text: string): string | undefined {
  const trimmed = text.trim();
  if (trimmed === '') return undefined;
  const isDate = /^\d{4}-\d{2}-\d{2}$/.test(trimmed) && new Date(`${trimmed}T00:00:00Z`).toJSON()?.startsWith(trimmed);
  return isDate ? undefined : 'Write the date as year-month-day, such as 2026-01-31.';
}
