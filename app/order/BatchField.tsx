import type { WorkbookOrder } from '../../src';
import { classNames } from '../parts/classNames';
import { NumberField } from '../parts/NumberField';
import { RangeFields } from '../parts/RangeFields';
import { Select } from '../parts/Select';
import styles from './rules.module.css';

type Batch = WorkbookOrder['batchTonnes'];

const SENSE = { min: 0.000001, max: 1e6 };
const FIRST_BATCH = 10;

/** The size of the batch: any, fixed, or within the smallest and largest charge of the kettle. */
export function BatchField({ batch, onChange }: { batch: Batch; onChange(batch: Batch): void }) {
  const kind = batch === undefined ? 'any' : typeof batch === 'number' ? 'fixed' : 'within';
  const size = typeof batch === 'object' ? batch.max : (batch ?? FIRST_BATCH);

  function change(next: 'any' | 'fixed' | 'within') {
    onChange(next === 'any' ? undefined : next === 'fixed' ? size : { min: size, max: size });
  }

  return (
    <div className={classNames(styles.batch, batch !== undefined && styles.wide)}>
      <Select
        label="Batch"
        value={kind}
        options={[
          { value: 'any', label: 'any size' },
          { value: 'fixed', label: 'fixed' },
          { value: 'within', label: 'within' },
        ]}
        onChange={change}
      />
      {typeof batch === 'number' && (
        <NumberField
          label="Batch size"
          hideLabel
          unit="t"
          digits={2}
          step={0.5}
          sense={SENSE}
          value={batch}
          onCommit={(value) => onChange(value)}
        />
      )}
      {typeof batch === 'object' && (
        <RangeFields
          context="Batch size"
          unit="t"
          digits={2}
          sense={SENSE}
          value={batch}
          onChange={({ min, max }) => onChange({ min: min ?? batch.min, max: max ?? batch.max })}
        />
      )}
    </div>
  );
}
