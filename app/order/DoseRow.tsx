import type { Dose } from '../../src';
import { NumberField } from '../parts/NumberField';
import { RangeFields } from '../parts/RangeFields';
import { Select } from '../parts/Select';
import { BasisSelect } from './BasisSelect';
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

/** The dose of one product: exact or a range, compulsory or not, of the mix or of the base oil. */
export function DoseRow({
  dose,
  name,
  known,
  problems,
  onChange,
  onRemove,
}: {
  dose: Dose;
  name: string;
  known: boolean;
  problems: readonly string[];
  onChange(dose: Dose): void;
  onRemove(): void;
}) {
  const manner = mannerOf(dose);
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
          unit="%"
          digits={2}
          step={0.05}
          sense={{ min: 0, max: 100 }}
          value={toPercent(dose.exactly)}
          onCommit={(value) => onChange(withField(dose, 'exactly', fromPercent(value)))}
        />
      ) : (
        <RangeFields
          context={`Dose of ${name}`}
          unit="%"
          digits={2}
          sense={{ min: 0, max: 100 }}
          value={{ min: toPercent(dose.min), max: toPercent(dose.max) }}
          onChange={({ min, max }) =>
            onChange(withField(withField(dose, 'min', fromPercent(min)), 'max', fromPercent(max)))
          }
        />
      )}
      <BasisSelect
        label={`What the dose of ${name} is counted against`}
        value={dose.of}
        onChange={(of) => onChange({ ...dose, of })}
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
  const { stockId, of, exactly, min, max } = dose;
  const base: Dose = { stockId, ...(of && { of }), ...(manner.startsWith('if used') && { required: false }) };
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
