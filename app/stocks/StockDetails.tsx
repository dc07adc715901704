import type { OwnProperty, Product } from '../../src';
import { NumberField } from '../parts/NumberField';
import { AddViscosity } from './AddViscosity';
import type { Column } from './column';
import { FigurePanel } from './FigurePanel';
import styles from './FigurePanel.module.css';
import { editProduct } from './stockEdits';

/** Below the table: what the chosen cell's figure carries beside its value, and what no column stands for. */
export function StockDetails({
  product,
  column,
  ownProperties,
}: {
  product: Product;
  column: Column;
  ownProperties: readonly OwnProperty[];
}) {
  const isViscosity = column.figure?.property === 'kv' || column.id === 'vi';
  return (
    <div className={styles.panel}>
      {column.figure && (
        <FigurePanel
          key={`${product.id} ${column.id}`}
          product={product}
          column={column}
          ownProperties={ownProperties}
        />
      )}
      <section className={styles.fields} aria-label={`More about ${product.name}`}>
        <NumberField
          key={product.id}
          label="Weight in viscosity blending"
          digits={2}
          sense={{ min: 0.01, max: 100 }}
          placeholder="1"
          value={product.blendWeight}
          onCommit={(weight) =>
            editProduct(product.id, `blending weight of ${product.name}`, (draft) => {
              if (weight === undefined) delete draft.blendWeight;
              else draft.blendWeight = weight;
            })
          }
        />
        {isViscosity && <AddViscosity key={`${product.id} further`} product={product} />}
      </section>
    </div>
  );
}
