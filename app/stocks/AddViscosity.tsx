import { useState } from 'react';
import type { Product } from '../../src';
import { Button } from '../parts/Button';
import { NumberField } from '../parts/NumberField';
import { figureKey, putFigure } from './productFigures';
import { editProduct } from './stockEdits';

/** Temperatures a viscosity can be stated at [°C]. */
const TEMPERATURES = { min: -60, max: 250 };

/** A viscosity at a further temperature; it gets a column of its own. */
export function AddViscosity({ product }: { product: Product }) {
  const [celsius, setCelsius] = useState<number>();
  const [value, setValue] = useState<number>();
  const taken =
    celsius !== undefined &&
    product.figures.some((figure) => figureKey(figure) === figureKey({ property: 'kv', celsius }));

  function add() {
    if (celsius === undefined || value === undefined || taken) return;
    editProduct(product.id, `KV${celsius} of ${product.name}`, (draft) =>
      putFigure(draft, { property: 'kv', celsius, value, origin: 'typical' }),
    );
    setCelsius(undefined);
    setValue(undefined);
  }

  return (
    <>
      <NumberField
        label="Further viscosity at"
        unit="°C"
        digits={0}
        sense={TEMPERATURES}
        value={celsius}
        problem={taken ? 'This stock has a viscosity at that temperature. Change it in the table.' : undefined}
        onCommit={setCelsius}
      />
      <NumberField
        label="Viscosity there"
        unit="mm²/s"
        digits={2}
        sense={{ min: 0.3, max: 1e6 }}
        value={value}
        onCommit={setValue}
      />
      <Button icon="add" disabled={celsius === undefined || value === undefined || taken} onClick={add}>
        Add
      </Button>
    </>
  );
}
