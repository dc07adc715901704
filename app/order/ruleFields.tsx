import { type Range, RangeFields, wholeNumber } from '../parts/RangeFields';
import { Select } from '../parts/Select';
import { BasisSelect } from './BasisSelect';
import { fromPercent, toPercent } from './percent';
import styles from './rules.module.css';
import type { RuleFieldsProps } from './ShareRuleRow';
import { StockSetField } from './StockSetField';

/** The fields of each kind of rule, read as a sentence. */

export function ShareOfSetRule({ rule, products, onChange }: RuleFieldsProps<'share'>) {
  const range = { min: toPercent(rule.min), max: toPercent(rule.max) };
  return (
    <>
      <span className={styles.words}>Share of</span>
      <StockSetField
        label="Stocks counted"
        value={rule.set}
        products={products}
        onChange={(set) => onChange({ ...rule, set })}
      />
      <RangeFields
        context="Share"
        unit="%"
        digits={2}
        sense={{ min: 0, max: 100 }}
        value={range}
        onChange={({ min, max }) => onChange(withRange(rule, { min: fromPercent(min), max: fromPercent(max) }))}
      />
      <BasisSelect
        label="What the share is counted against"
        value={rule.of}
        onChange={(of) => onChange({ ...rule, of })}
      />
    </>
  );
}

/** A place in a formula with its approved alternatives. */
export function OneOfRule({ rule, products, onChange }: RuleFieldsProps<'one of'>) {
  return (
    <>
      <span className={styles.words}>One of</span>
      <StockSetField
        label="Stocks to choose from"
        value={rule.set}
        products={products}
        onChange={(set) => onChange({ ...rule, set })}
      />
      <RangeFields
        context="Share of the one chosen"
        unit="%"
        digits={2}
        sense={{ min: 0, max: 100 }}
        value={{ min: toPercent(rule.min), max: toPercent(rule.max) }}
        onChange={({ min, max }) => onChange(withRange(rule, { min: fromPercent(min), max: fromPercent(max) }))}
      />
      <span className={styles.words}>of the mix</span>
    </>
  );
}

export function RatioRule({ rule, products, onChange }: RuleFieldsProps<'ratio'>) {
  return (
    <>
      <span className={styles.words}>Mass of</span>
      <StockSetField
        label="Stocks counted"
        value={rule.set}
        products={products}
        onChange={(set) => onChange({ ...rule, set })}
      />
      <span className={styles.words}>to that of</span>
      <StockSetField
        label="Stocks compared with"
        value={rule.to}
        products={products}
        onChange={(to) => onChange({ ...rule, to })}
      />
      <RangeFields
        context="Ratio"
        unit="kg per kg"
        digits={2}
        sense={{ min: 0, max: 1e6 }}
        value={rule}
        onChange={(range) => onChange(withRange(rule, range))}
      />
    </>
  );
}

export function CountRule({ rule, products, onChange }: RuleFieldsProps<'count'>) {
  return (
    <>
      <span className={styles.words}>Number used of</span>
      <StockSetField
        label="Stocks counted"
        value={rule.set}
        products={products}
        onChange={(set) => onChange({ ...rule, set })}
      />
      <RangeFields
        context="Number of stocks"
        digits={0}
        sense={{ min: 0, max: 1000 }}
        check={wholeNumber}
        value={rule}
        onChange={(range) => onChange(withRange(rule, range))}
      />
    </>
  );
}

export function ExcludesRule(props: RuleFieldsProps<'excludes'>) {
  return <PairingRule {...props} what="excludes others" between="is used, none of" setLabel="Stocks excluded" />;
}

/** A stock that is used only where one of some others is. */
export function NeedsRule(props: RuleFieldsProps<'needs'>) {
  return <PairingRule {...props} what="needs others" between="is used, at least one of" setLabel="Stocks needed" />;
}

interface PairingWords {
  what: string;
  between: string;
  setLabel: string;
}

function PairingRule({
  rule,
  products,
  onChange,
  what,
  between,
  setLabel,
}: RuleFieldsProps<'excludes' | 'needs'> & PairingWords) {
  return (
    <>
      <span className={styles.words}>Where</span>
      <Select
        label={`The stock that ${what}`}
        hideLabel
        value={rule.stockId}
        placeholder="choose a stock …"
        options={products.map(({ id, name }) => ({ value: id, label: name }))}
        onChange={(stockId) => onChange({ ...rule, stockId })}
      />
      <span className={styles.words}>{between}</span>
      <StockSetField
        label={setLabel}
        value={rule.set}
        products={products}
        onChange={(set) => onChange({ ...rule, set })}
      />
    </>
  );
}

export function FlagRule({ rule, products, onChange }: RuleFieldsProps<'flag'>) {
  const flags = [
    ...new Set([...products.flatMap((product) => product.flags ?? []), ...(rule.flag ? [rule.flag] : [])]),
  ];
  return (
    <>
      <span className={styles.words}>Every stock carries</span>
      <Select
        label="The flag"
        hideLabel
        value={rule.flag}
        placeholder={flags.length ? 'choose a flag …' : 'no product carries a flag yet'}
        options={flags.map((flag) => ({ value: flag, label: flag }))}
        onChange={(flag) => onChange({ ...rule, flag })}
      />
    </>
  );
}

function withRange<Rule extends Range>(rule: Rule, { min, max }: Range): Rule {
  const { min: _min, max: _max, ...rest } = rule;
  // The rest is the rule less its two optional fields, so putting them back makes a whole rule again.
  return { ...rest, ...(min !== undefined && { min }), ...(max !== undefined && { max }) } as Rule;
}
