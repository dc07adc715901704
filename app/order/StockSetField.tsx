import { useRef } from 'react';
import { FAMILIES, type Product, type StockSet } from '../../src';
import { IconButton } from '../parts/IconButton';
import { Select } from '../parts/Select';
import styles from './rules.module.css';

/** A set of stocks: families, single products and the carriers of one flag, put together. */
export function StockSetField({
  label,
  value,
  products,
  onChange,
}: {
  label: string;
  value: StockSet;
  products: readonly Product[];
  onChange(set: StockSet): void;
}) {
  const field = useRef<HTMLFieldSetElement>(null);
  const members = membersOf(value, products);
  const taken = new Set(members.map(({ key }) => key));
  const flags = [...new Set(products.flatMap((product) => product.flags ?? []))];
  const groups = [
    { label: 'Families', options: FAMILIES.map((family) => ({ value: `family:${family}`, label: family as string })) },
    { label: 'Products', options: products.map(({ id, name }) => ({ value: `stock:${id}`, label: name })) },
    { label: 'Flags', options: flags.map((flag) => ({ value: `flag:${flag}`, label: `carrying “${flag}”` })) },
  ];

  function takeOut(key: string) {
    // The button that was pressed goes with its stock: the focus must not fall off the page.
    field.current?.querySelector('select')?.focus();
    onChange(without(value, key));
  }

  return (
    <fieldset ref={field} className={styles.set} aria-label={label}>
      {members.map(({ key, name }) => (
        <span key={key} className={styles.chip}>
          {name}
          <IconButton icon="remove" label={`Take ${name} out of the set`} onClick={() => takeOut(key)} />
        </span>
      ))}
      <Select
        label={`Add to: ${label}`}
        hideLabel
        value=""
        placeholder={members.length ? 'and …' : 'choose stocks …'}
        options={groups
          .map((group) => ({ ...group, options: group.options.filter((option) => !taken.has(option.value)) }))
          .filter(({ options }) => options.length > 0)}
        onChange={(key) => onChange(including(value, key))}
      />
    </fieldset>
  );
}

interface Member {
  key: string;
  name: string;
}

function membersOf({ families = [], stockIds = [], flag }: StockSet, products: readonly Product[]): Member[] {
  return [
    ...families.map((family) => ({ key: `family:${family}`, name: family })),
    ...stockIds.map((id) => ({ key: `stock:${id}`, name: products.find((product) => product.id === id)?.name ?? id })),
    ...(flag === undefined ? [] : [{ key: `flag:${flag}`, name: `carrying “${flag}”` }]),
  ];
}

function including(set: StockSet, key: string): StockSet {
  const [kind, name] = splitKey(key);
  const family = FAMILIES.find((candidate) => candidate === name);
  if (kind === 'family' && family) return { ...set, families: [...(set.families ?? []), family] };
  if (kind === 'stock') return { ...set, stockIds: [...(set.stockIds ?? []), name] };
  return { ...set, flag: name };
}

function without(set: StockSet, key: string): StockSet {
  const [kind, name] = splitKey(key);
  const families = set.families?.filter((family) => kind !== 'family' || family !== name);
  const stockIds = set.stockIds?.filter((id) => kind !== 'stock' || id !== name);
  return {
    ...(families?.length && { families }),
    ...(stockIds?.length && { stockIds }),
    ...(set.flag !== undefined && kind !== 'flag' && { flag: set.flag }),
  };
}

function splitKey(key: string): [kind: string, name: string] {
  const colon = key.indexOf(':');
  return [key.slice(0, colon), key.slice(colon + 1)];
}
