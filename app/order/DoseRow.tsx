import type { Dose } from '../../src';
import { NumberField } from '../parts/NumberField';
import { RangeFields } from '../parts/RangeFields';
import { Select } from '../parts/Select';
import { type DoseMeasure, inMeasure, measureOf } from './doseUnit';
import { fromPercent, toPercent } from './percent';
import { RuleRow } from './RuleRow';
import styles from './rules.module.css';

const MANNERS = {
  exactly: 'exactly',
  within: 'within',
  'if used, exactly': 'only if used: exactly',
  'if used, within': 'only if used: within',
} as const;

type Manner = keyof typeof MANNERS;

const MEASURES: Record<DoseMeasure, string> = {
  mix: 'of the mix',
  'base oil': 'of the base oil',
  tonnes: 'in the batch',
};

/** The dose of one product: exact or a range, compulsory or not, of the mix or of the base oil. */
export function DoseRow({
  dose,
  name,
  known,
  batch,
  problems,
  onChange,
  onRemove,
}: {
  dose: Dose;
  name: string;
  known: boolean;
  /** The batch of the order [t], if it has one. */
  batch: number | undefined;
  problems: readonly string[];
  onChange(dose: Dose): void;
  onRemove(): void;
}) {
  const manner = mannerOf(dose);
  const inTonnes = dose.unit === 'tonnes';
  const field = inTonnes
    ? { unit: 't', digits: 3, sense: { min: 0, max: 1e6 } }
    : { unit: '%', digits: 2, sense: { min: 0, max: 100 } };
  const shown = (value: number | undefined) => (inTonnes ? value : toPercent(value));
  const read = (value: number | undefined) => (inTonnes ? value : fromPercent(value));
  const said = [...problems, ...ownProblems(dose, name, known)];
  return (
    <RuleRow problems={said} removeLabel={`Remove the dose of ${name}`} onRemove={onRemove}>
      <span className={styles.kind}>{name}</span>
      <Select
        label={`How ${name} is dosed`}
        hideLabel
        value={manner}
        options={Object.entries(MANNERS).map(([value, label]) => ({ value: value as Manner, label }))}
        onChange={(next) => onChange(inManner(dose, next))}
      />
      {manner.endsWith('exactly') ? (
        <NumberField
          label={`Dose of ${name}`}
          hideLabel
          {...field}
          step={inTonnes ? 0.01 : 0.05}
          value={shown(dose.exactly)}
          onCommit={(value) => onChange(withField(dose, 'exactly', read(value)))}
        />
      ) : (
        <RangeFields
          context={`Dose of ${name}`}
          {...field}
          value={{ min: shown(dose.min), max: shown(dose.max) }}
          onChange={({ min, max }) => onChange(withField(withField(dose, 'min', read(min)), 'max', read(max)))}
        />
      )}
      <Select
        label={`What the dose of ${name} is counted against`}
        hideLabel
        value={measureOf(dose)}
        options={Object.entries(MEASURES).map(([value, label]) => ({ value: value as DoseMeasure, label }))}
        onChange={(measure) => onChange(inMeasure(dose, measure, batch))}
      />
    </RuleRow>
  );
}

function mannerOf({ exactly, min, max, required }: Dose): Manner {
  const kind = exactly === undefined && (min !== undefined || max !== undefined) ? 'within' : 'exactly';
  return required === false ? `if used, ${kind}` : kind;
}

/** Going from exact to a range and back keeps the number. */
function inManner(dose: Dose, manner: Manner): Dose {
  const { stockId, of, unit, exactly, min, max } = dose;
  const base: Dose = {
    stockId,
    ...(of && { of }),
    ...(unit && { unit }),
    ...(manner.startsWith('if used') && { required: false }),
  };
  if (manner.endsWith('exactly')) return withField(base, 'exactly', exactly ?? min ?? max);
  return withField(withField(base, 'min', min ?? exactly ?? 0), 'max', max ?? exactly);
}

function withField(dose: Dose, key: 'exactly' | 'min' | 'max', value: number | undefined): Dose {
  const { [key]: _old, ...rest } = dose;
  return value === undefined ? rest : { ...rest, [key]: value };
}

function ownProblems(dose: Dose, name: string, known: boolean): string[] {
  if (!known) return ['This product is no longer in the workbook. Remove the dose, or undo its removal.'];
  const nothing = dose.exactly === undefined && dose.min === undefined && dose.max === undefined;
  return nothing ? [`No dose given yet: ${name} is taken by cost alone until a number stands here.`] : [];
}
