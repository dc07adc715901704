import { GRADES, type Grade, type Limit, propertyDefinition, type WorkbookOrder } from '../../src';
import { isSameProperty, upperEnd } from '../parts/limitEnds';
import { limitName, rangeInWords, withUnit } from '../parts/limitWords';

/**
 * Puts the grade's limits in place of those on the same property, or after the others; lists what only tests show. A
 * margin and an aim are the planner's own, not the grade's: they stay.
 */
export function applyGrade(order: WorkbookOrder, grade: Grade): void {
  for (const limit of grade.limits) {
    const place = order.limits.findIndex((existing) => isSameProperty(existing, limit));
    const old = order.limits[place];
    if (old) order.limits[place] = { ...ownOf(old), ...limit };
    else order.limits.push({ ...limit });
  }
  order.laboratoryOnly.push(...grade.laboratoryOnly.filter((test) => !order.laboratoryOnly.includes(test)));
}

function ownOf({ insideBy, aim, aimWeight }: Limit): Pick<Limit, 'insideBy' | 'aim' | 'aimWeight'> {
  return {
    ...(insideBy !== undefined && { insideBy }),
    ...(aim !== undefined && { aim }),
    ...(aimWeight !== undefined && { aimWeight }),
  };
}

/** "ISO VG 46 set: Kinematic viscosity at 40 °C 41.40 to 50.60 mm²/s. ISO 3448; check the current edition." */
export function gradeInWords(before: Pick<WorkbookOrder, 'limits' | 'laboratoryOnly'>, grade: Grade): string {
  const { id, limits, laboratoryOnly, note } = grade;
  const set = limits.flatMap(limitInWords);
  const tests = laboratoryOnly.length ? ` For the laboratory: ${laboratoryOnly.join('; ')}.` : '';
  return `${id} set: ${set.join('; ')}.${tests}${keptInWords(before, grade)}${remainsInWords(before, grade)} ${note}`;
}

function limitInWords(limit: Limit): string[] {
  const definition = propertyDefinition(limit.property);
  return definition ? [`${limitName(limit)} ${rangeInWords(limit, definition)}`] : [];
}

function keptInWords(before: Pick<WorkbookOrder, 'limits'>, grade: Grade): string {
  const kept = before.limits
    .filter((limit) => grade.limits.some((other) => isSameProperty(limit, other)))
    .flatMap((limit) => {
      const definition = propertyDefinition(limit.property);
      const { insideBy, aim } = limit;
      if (!definition) return [];
      return [
        ...(insideBy ? [`${limitName(limit)} inside by ${withUnit(insideBy, definition)}`] : []),
        ...(aim === undefined ? [] : [`${limitName(limit)} near ${withUnit(aim, definition)}`]),
      ];
    });
  return kept.length ? ` Kept as it was: ${kept.join('; ')}.` : '';
}

/** What an earlier grade put into the order, and this one neither replaces nor asks for. */
function remainsInWords({ limits, laboratoryOnly }: Pick<WorkbookOrder, 'limits' | 'laboratoryOnly'>, grade: Grade) {
  const others = GRADES.filter(({ id }) => id !== grade.id);
  const remains = [
    ...limits
      .filter((limit) => !grade.limits.some((other) => isSameProperty(limit, other)))
      .filter((limit) => others.some((other) => other.limits.some((stated) => hasSameEnds(limit, stated))))
      .flatMap(limitInWords),
    ...laboratoryOnly.filter(
      (test) => !grade.laboratoryOnly.includes(test) && others.some((other) => other.laboratoryOnly.includes(test)),
    ),
  ];
  return remains.length ? ` From another grade remain: ${remains.join('; ')}. Remove them if they are not meant.` : '';
}

function hasSameEnds(one: Limit, other: Limit): boolean {
  return isSameProperty(one, other) && one.min === other.min && upperEnd(one).value === upperEnd(other).value;
}
