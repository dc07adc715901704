import { useState } from 'react';
import { GRADES, type Grade, propertyDefinition, type WorkbookOrder } from '../../src';
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
    editOrder(order.id, `set limits from ${grade.id}`, (draft) => applyGrade(draft, grade));
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

/** Puts the grade's limits in place of those on the same property, or after the others; lists what only tests show. */
export function applyGrade(order: WorkbookOrder, grade: Grade): void {
  for (const limit of grade.limits) {
    const place = order.limits.findIndex((existing) => isSameProperty(existing, limit));
    if (place >= 0) order.limits[place] = { ...limit };
    else order.limits.push({ ...limit });
  }
  order.laboratoryOnly.push(...grade.laboratoryOnly.filter((test) => !order.laboratoryOnly.includes(test)));
}

/** "ISO VG 46 set: Kinematic viscosity at 40 °C 41.40 to 50.60 mm²/s. ISO 3448; check the current edition." */
function gradeInWords({ id, limits, laboratoryOnly, note }: Grade): string {
  const set = limits.flatMap((limit) => {
    const definition = propertyDefinition(limit.property);
    return definition ? [`${limitName(limit)} ${rangeInWords(limit, definition)}`] : [];
  });
  const tests = laboratoryOnly.length ? ` For the laboratory: ${laboratoryOnly.join('; ')}.` : '';
  return `${id} set: ${set.join('; ')}.${tests} ${note}`;
}

function gradeGroups() {
  const systems = [...new Set(GRADES.map(({ system }) => system))];
  return systems.map((system) => ({
    label: system,
    options: GRADES.filter((grade) => grade.system === system).map(({ id }) => ({ value: id, label: id })),
  }));
}
