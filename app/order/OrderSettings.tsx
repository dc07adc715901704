import { memo } from 'react';
import { VISCOSITY_RULE_TABLE, VISCOSITY_RULES, type WorkbookOrder } from '../../src';
import { Checkbox } from '../parts/Checkbox';
import { NumberField } from '../parts/NumberField';
import { wholeNumber } from '../parts/RangeFields';
import { Select } from '../parts/Select';
import { useWorkbook } from '../state/workbookStore';
import { BatchField } from './BatchField';
import { sameButForLimits } from './butForLimits';
import { fromPercent, toPercent } from './percent';
import styles from './rules.module.css';
import { editOrder } from './useOrder';

/** How the order is worked out: from which figures, by which rule, cheapest by what, for which batch. */
export const OrderSettings = memo(function OrderSettings({ order }: { order: WorkbookOrder }) {
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  const edit = (label: string, change: (draft: WorkbookOrder) => void) => editOrder(order.id, label, change);
  return (
    <div className={styles.settings}>
      <Select
        label="Work on"
        value={order.solveOn}
        options={[
          { value: 'products', label: 'typical figures' },
          { value: 'lots', label: 'lots on hand' },
        ]}
        onChange={(solveOn) => edit('change what the order works on', (draft) => Object.assign(draft, { solveOn }))}
      />
      <Select
        label="Cheapest"
        value={order.costBasis}
        options={[
          { value: 'tonne', label: `${currency} per tonne` },
          { value: 'cubic metre', label: `${currency} per m³` },
        ]}
        onChange={(costBasis) => edit('change the cost basis', (draft) => Object.assign(draft, { costBasis }))}
      />
      <Select
        className={styles.wide}
        label="Viscosity blends by"
        value={order.viscosityRule}
        options={VISCOSITY_RULES.map((rule) => ({ value: rule, label: VISCOSITY_RULE_TABLE[rule].label }))}
        onChange={(rule) => edit('change the viscosity rule', (draft) => Object.assign(draft, { viscosityRule: rule }))}
      />
      <BatchField
        batch={order.batchTonnes}
        onChange={(batch) =>
          edit('change the batch', (draft) => {
            if (batch === undefined) delete draft.batchTonnes;
            else draft.batchTonnes = batch;
          })
        }
      />
      <NumberField
        label="Most stocks"
        value={order.mostStocks}
        digits={0}
        sense={{ min: 1, max: 1000 }}
        check={wholeNumber}
        placeholder="any"
        onCommit={(value) =>
          edit('change the number of stocks', (draft) => {
            if (value === undefined) delete draft.mostStocks;
            else draft.mostStocks = value;
          })
        }
      />
      <NumberField
        label="“As the rest” up to"
        unit="%"
        value={toPercent(order.greatestDoseAsTheRest)}
        digits={1}
        sense={{ min: 0, max: 100 }}
        placeholder="2"
        onCommit={(value) =>
          edit('change the dose of stocks taken as the rest', (draft) => {
            const fraction = fromPercent(value);
            if (fraction === undefined) delete draft.greatestDoseAsTheRest;
            else draft.greatestDoseAsTheRest = fraction;
          })
        }
      />
      <Checkbox
        className={styles.whole}
        label="depressant used: pour points with depressant count"
        checked={order.depressant}
        onChange={(depressant) => edit('change the use of depressant', (draft) => Object.assign(draft, { depressant }))}
      />
    </div>
  );
}, sameButForLimits);
