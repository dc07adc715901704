import { useState } from 'react';
import { OWN_RULES, type OwnProperty, type OwnRule } from '../../src';
import { Button } from '../parts/Button';
import { Dialog } from '../parts/Dialog';
import { Notice } from '../parts/Notice';
import { NumberField } from '../parts/NumberField';
import { Select } from '../parts/Select';
import { TextField } from '../parts/TextField';
import styles from './LimitList.module.css';

type Draft = Omit<OwnProperty, 'id'>;

const FRESH: Draft = { label: '', unit: '% m/m', rule: 'linear by mass', digits: 1 };

/** Asks for a property of the user's own: name, unit, decimals, and how it blends. */
export function OwnPropertyDialog({
  open,
  takenLabels,
  onClose,
  onMake,
}: {
  open: boolean;
  takenLabels: readonly string[];
  onClose(): void;
  onMake(property: Draft): void;
}) {
  const [draft, setDraft] = useState(FRESH);
  const [problem, setProblem] = useState<string>();
  const change = (part: Partial<Draft>) => setDraft((before) => ({ ...before, ...part }));

  function make() {
    const label = draft.label.trim();
    if (!label) return setProblem('Give the property a name.');
    if (takenLabels.includes(label)) return setProblem(`There is a property “${label}” already. Choose another name.`);
    onMake({ ...draft, label });
    setDraft(FRESH);
    setProblem(undefined);
  }

  return (
    <Dialog
      title="A property of your own"
      open={open}
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button tone="main" onClick={make}>
            Add it
          </Button>
        </>
      }
    >
      <div className={styles.dialogFields}>
        <TextField label="Name" value={draft.label} onCommit={(label) => change({ label })} />
        <TextField label="Unit" value={draft.unit} onCommit={(unit) => change({ unit: unit.trim() || '-' })} />
        <Select
          label="How it blends"
          value={draft.rule}
          options={OWN_RULES.map((rule) => ({ value: rule, label: rule }))}
          onChange={(rule: OwnRule) => change({ rule })}
        />
        <NumberField
          label="Decimals reported"
          value={draft.digits}
          digits={0}
          sense={{ min: 0, max: 6 }}
          check={(value) => (Number.isInteger(value) ? undefined : 'Decimals are counted in whole numbers.')}
          onCommit={(digits) => change({ digits: digits ?? FRESH.digits })}
        />
        {problem && (
          <Notice tone="bad" live>
            {problem}
          </Notice>
        )}
      </div>
    </Dialog>
  );
}
