import { memo, useState } from 'react';
import {
  type Limit,
  type OwnProperty,
  PROPERTY_TABLE,
  type PropertyDefinition,
  VI_DEFINITION,
  type WorkbookOrder,
} from '../../src';
import { isSameProperty } from '../parts/limitEnds';
import { limitName, shortLimitName } from '../parts/limitWords';
import { Select, type SelectOption } from '../parts/Select';
import { editWorkbook, useWorkbook } from '../state/workbookStore';
import { figureKey } from '../stocks/productFigures';
import styles from './LimitList.module.css';
import { OwnPropertyDialog } from './OwnPropertyDialog';
import { editOrder } from './useOrder';

/** Where a viscosity at a temperature of one's own starts; it is then changed in the row. */
const ANOTHER_TEMPERATURE = 20;

/** The choice that asks for a property first. */
const OF_ONES_OWN = 'a property of one’s own';

interface AddLimitProps {
  order: WorkbookOrder;
  onAdded(): void;
}

/** Only what is limited matters here: a limit that moves draws the long list of choices anew for nothing. */
function limitTheSame({ order: a }: AddLimitProps, { order: b }: AddLimitProps): boolean {
  return (
    a.id === b.id &&
    a.limits.length === b.limits.length &&
    a.limits.every((limit, place) => isSameProperty(limit, b.limits[place]))
  );
}

/** Adds an empty limit on a property; its ends are then typed. */
export const AddLimit = memo(function AddLimit({ order, onAdded }: AddLimitProps) {
  const ownProperties = useWorkbook(({ workbook }) => workbook.ownProperties);
  const choices = limitChoices(ownProperties).filter(
    ({ limit }) => !order.limits.some((existing) => isSameProperty(existing, limit)),
  );
  const option = ({ limit }: Choice): SelectOption<string> => ({
    value: figureKey(limit),
    label: limitName(limit, ownProperties),
  });
  const [asking, setAsking] = useState(false);
  const groups = ['Viscosity', 'Other properties', 'Own properties'].map((label) => ({
    label,
    options: choices.filter(({ group }) => group === label).map(option),
  }));

  function add(key: string) {
    if (key === OF_ONES_OWN) return setAsking(true);
    const choice = choices.find(({ limit }) => figureKey(limit) === key);
    if (!choice) return;
    const { limit } = choice;
    editOrder(order.id, `add a limit on ${shortLimitName(limit, ownProperties)}`, ({ limits }) => {
      limits.push({ ...limit });
    });
    onAdded();
  }

  function addOwn(property: Omit<OwnProperty, 'id'>) {
    const id = freshId(property.label, ownProperties);
    const limit = { property: id };
    editWorkbook(`add the property ${property.label}`, (workbook) => {
      workbook.ownProperties.push({ ...property, id });
      workbook.orders.find((other) => other.id === order.id)?.limits.push({ ...limit });
    });
    setAsking(false);
    onAdded();
  }

  return (
    <div className={styles.add}>
      <Select
        label="Add a limit"
        hideLabel
        value=""
        placeholder="Add a limit on …"
        options={[
          ...groups.filter(({ options }) => options.length > 0),
          { value: OF_ONES_OWN, label: 'a property of your own …' },
        ]}
        onChange={add}
      />
      <OwnPropertyDialog
        open={asking}
        takenLabels={[...PROPERTY_TABLE, VI_DEFINITION, ...ownProperties].map(({ label }) => label)}
        onClose={() => setAsking(false)}
        onMake={addOwn}
      />
    </div>
  );
}, limitTheSame);

interface Choice {
  group: string;
  limit: Limit;
}

function limitChoices(ownProperties: readonly OwnProperty[]): Choice[] {
  const table = PROPERTY_TABLE.filter(({ id }) => id !== 'pourPointDepressed');
  return [
    ...table.flatMap((definition) => choicesOf(definition, groupOf(definition))),
    { group: 'Viscosity', limit: { property: VI_DEFINITION.id } },
    ...ownProperties.map(({ id }) => ({ group: 'Own properties', limit: { property: id } })),
  ];
}

function choicesOf({ id, temperatures, anyTemperature }: PropertyDefinition, group: string): Choice[] {
  if (!temperatures) return [{ group, limit: { property: id } }];
  const all = anyTemperature ? [...temperatures, ANOTHER_TEMPERATURE] : temperatures;
  return all.map((celsius) => ({ group, limit: { property: id, celsius } }));
}

function groupOf({ index, unit }: PropertyDefinition): string {
  return index === 'viscosity' || unit === 'mPa·s' ? 'Viscosity' : 'Other properties';
}

/** An id that no property has: from the name, as far as it has plain letters. */
function freshId(label: string, ownProperties: readonly OwnProperty[]): string {
  const plain = label
    .toLowerCase()
    .normalize('NFKD')
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '');
  const base = `own-${plain || 'property'}`;
  const taken = new Set(ownProperties.map(({ id }) => id));
  let id = base;
  for (let count = 2; taken.has(id); count += 1) id = `${base}-${count}`;
  return id;
}
