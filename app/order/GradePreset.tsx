import { useState } from 'react';
import { GRADES, type WorkbookOrder } from '../../src';
import { IconButton } from '../parts/IconButton';
import { Notice } from '../parts/Notice';
import { Select } from '../parts/Select';
import { announce } from '../state/viewStore';
import { applyGrade, gradeInWords } from './applyGrade';
import styles from './GradePreset.module.css';
import { editOrder } from './useOrder';

/** Sets limits from a published grade and says what it set. Limits on other properties stay as they are. */
export function GradePreset({ order }: { order: WorkbookOrder }) {
  const [said, setSaid] = useState<string>();

  function setFrom(id: string) {
    const grade = GRADES.find((candidate) => candidate.id === id);
    if (!grade) return;
    const words = gradeInWords(order, grade);
    editOrder(order.id, `set limits from ${grade.id}`, (draft) => applyGrade(draft, grade));
    setSaid(words);
    announce(words);
  }

  return (
    <>
      <Select
        label="Set limits from a grade"
        hideLabel
        value=""
        placeholder="Set limits from a grade …"
        options={gradeGroups()}
        onChange={setFrom}
      />
      {said && (
        <Notice className={styles.said}>
          <span>{said}</span>
          <IconButton icon="remove" label="Hide this message" onClick={() => setSaid(undefined)} />
        </Notice>
      )}
    </>
  );
}

function gradeGroups() {
  const systems = [...new Set(GRADES.map(({ system }) => system))];
  return systems.map((system) => ({
    label: system,
    options: GRADES.filter((grade) => grade.system === system).map(({ id }) => ({ value: id, label: id })),
  }));
}
