import { useState } from 'react';
import { GRADES, type Grade, type Limit, propertyDefinition, type WorkbookOrder } from '../../src';
import { IconButton } from '../parts/IconButton';
import { Notice } from '../parts/Notice';
import { Select } from '../parts/Select';
import { announce } from '../state/viewStore';
import styles from './GradePreset.module.css';
import { isSameProperty } from './limitEnds';
import { limitName, rangeInWords } from './limitWords';
import { editOrder } from './useOrder';

/** Sets limits from a published grade and says what it set. Limits on other properties stay as they are. */
export function GradePreset({ order }: { order: WorkbookOrder }) {
  const [said, setSaid] = useState<string>();

  function setFrom(id: string) {
    const grade = GRADES.find((candidate) => candidate.id === id);
    if (!grade) return;
    editOrder(order.id, `set limits from ${gradeName(grade)}`, ({ limits }) => applyGrade(limits, grade));
    const words = gradeInWords(grade);
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

/** Puts the grade's limits in place of those on the same property, or after the others. */
export function applyGrade(limits: Limit[], grade: Grade): void {
  for (const limit of grade.limits) {
    const place = limits.findIndex((existing) => isSameProperty(existing, limit));
    if (place >= 0) limits[place] = { ...limit };
    else limits.push({ ...limit });
  }
}

/** "ISO VG 46 set: Kinematic viscosity at 40 °C, 41.4 to 50.6 mm²/s." */
function gradeInWords(grade: Grade): string {
  const limits = grade.limits.flatMap((limit) => {
    const definition = propertyDefinition(limit.property);
    return definition ? [`${limitName(limit)} ${rangeInWords(limit, definition)}`] : [];
  });
  const note = grade.note ? ` ${grade.note}` : '';
  return `${gradeName(grade)} set: ${limits.join('; ')}.${note}`;
}

function gradeName({ system, name }: Grade): string {
  return name.startsWith(system) ? name : `${system} ${name}`;
}

function gradeGroups() {
  const systems = [...new Set(GRADES.map(({ system }) => system))];
  return systems.map((system) => ({
    label: system,
    options: GRADES.filter((grade) => grade.system === system).map(({ id, name }) => ({ value: id, label: name })),
  }));
}
