import type { Limit, PropertyDefinition } from '../../src';
import { Button } from '../parts/Button';
import { Checkbox } from '../parts/Checkbox';
import { assign, setStrict, upperEnd } from '../parts/limitEnds';
import { NumberField } from '../parts/NumberField';
import { formatNumber } from '../parts/numberText';
import { useWorkbook } from '../state/workbookStore';
import styles from './LimitList.module.css';

/** The rest of a limit: strictness, margin, aim, temperature, and how the property is measured and blended. */
export function LimitMore({
  limit,
  definition,
  name,
  unit,
  margin,
  onEdit,
}: {
  limit: Limit;
  definition: PropertyDefinition;
  name: string;
  unit: string | undefined;
  /** What the method's precision asks to stay inside by. */
  margin: number | undefined;
  onEdit(label: string, change: (limit: Limit) => void): void;
}) {
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  const { digits, reportingUnit } = definition;
  const shared = { digits, step: reportingUnit, context: name };
  return (
    <div className={styles.more}>
      <div className={styles.fields}>
        <NumberField
          {...shared}
          label="Stay inside by"
          unit={unit}
          value={limit.insideBy}
          sense={{ min: 0, max: Infinity }}
          placeholder="0"
          onCommit={(value) => onEdit('change a margin', (draft) => assign(draft, 'insideBy', value))}
        />
        {margin !== undefined && (
          <Button
            onClick={() => onEdit('set a margin from the method', (draft) => assign(draft, 'insideBy', margin))}
            title="One result, 95 %, one-sided: 0.59 of the reproducibility R (ISO 4259-2)"
          >
            by the method: {formatNumber(margin, digits)}
          </Button>
        )}
        <Checkbox
          label="strictly below the most"
          checked={upperEnd(limit).strict}
          disabled={upperEnd(limit).value === undefined}
          onChange={(strict) => onEdit('change how an end is meant', (draft) => setStrict(draft, strict))}
        />
      </div>
      <div className={styles.fields}>
        <NumberField
          {...shared}
          label="Aim at"
          unit={unit}
          value={limit.aim}
          sense={definition.sense}
          placeholder="none"
          onCommit={(value) =>
            onEdit('change an aim', (draft) => {
              assign(draft, 'aim', value);
              if (value === undefined) assign(draft, 'aimWeight', undefined);
            })
          }
        />
        {limit.aim !== undefined && (
          <NumberField
            context={name}
            label={`Each ${formatNumber(reportingUnit, digits)} off the aim counts`}
            unit={`${currency}/t`}
            value={limit.aimWeight}
            digits={2}
            sense={{ min: 0, max: Infinity }}
            placeholder="1"
            onCommit={(value) => onEdit('change the weight of an aim', (draft) => assign(draft, 'aimWeight', value))}
          />
        )}
        {definition.anyTemperature && (
          <NumberField
            context={name}
            label="At"
            unit="°C"
            value={limit.celsius}
            digits={0}
            step={1}
            sense={{ min: -60, max: 200 }}
            onCommit={(value) => {
              if (value !== undefined) onEdit('change a temperature', (draft) => assign(draft, 'celsius', value));
            }}
          />
        )}
      </div>
      <p className={styles.about}>
        {definition.method}. {definition.blending} Source: {definition.source}
      </p>
    </div>
  );
}
