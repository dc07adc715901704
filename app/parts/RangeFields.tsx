import { NumberField } from './NumberField';
import styles from './RangeFields.module.css';

export interface Range {
  min?: number;
  max?: number;
}

/** "from … to …": two numbers with one unit, either of them may stay empty. What contradicts is said below. */
export function RangeFields({
  context,
  value,
  unit,
  digits,
  sense,
  check,
  onChange,
}: {
  /** Read aloud before "from" and "to". */
  context: string;
  value: Range;
  unit?: string;
  digits: number;
  sense: { min: number; max: number };
  check?(value: number): string | undefined;
  onChange(value: Range): void;
}) {
  const { min, max } = value;
  const crossed = min !== undefined && max !== undefined && min > max;
  const shared = { context, digits, sense, check, inline: true };
  return (
    <span className={styles.range}>
      <NumberField {...shared} label="from" value={min} onCommit={(next) => onChange(rangeOf(next, max))} />
      <NumberField
        {...shared}
        label="to"
        unit={unit}
        value={max}
        problem={crossed ? 'This is below the “from” beside it. Change one of them.' : undefined}
        onCommit={(next) => onChange(rangeOf(min, next))}
      />
    </span>
  );
}

function rangeOf(min: number | undefined, max: number | undefined): Range {
  return { ...(min !== undefined && { min }), ...(max !== undefined && { max }) };
}

/** A check for fields that count things. */
export function wholeNumber(value: number): string | undefined {
  return Number.isInteger(value) ? undefined : 'This counts stocks: a whole number is needed.';
}
