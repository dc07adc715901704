import { type BlendOutcome, gradesOfViscosity, type Order } from '../../src';
import { upperEnd } from '../parts/limitEnds';

/** A range of viscosity at one temperature, drawn as a bar: a limit of the order, or a viscosity grade. */
export interface ViscosityWindow {
  kind: 'limit' | 'grade';
  name: string;
  celsius: number;
  /** [mm²/s]; absent: open. */
  min?: number;
  max?: number;
}

/** The order's limits on kinematic viscosity, and the ISO grade that the mix falls into at 40 °C. */
export function viscosityWindows(order: Order, { properties }: BlendOutcome): ViscosityWindow[] {
  const limits = order.limits.flatMap((limit): ViscosityWindow[] => {
    const { value: max } = upperEnd(limit);
    const { property, celsius = 40, min } = limit;
    if (property !== 'kv' || (min === undefined && max === undefined)) return [];
    return [{ kind: 'limit', name: `Limit at ${celsius} °C`, celsius, ...given(min, max) }];
  });
  const kv40 = properties?.properties.find(({ property, celsius }) => property === 'kv' && celsius === 40)?.value;
  const grades = gradesOfViscosity(kv40 === undefined ? {} : { kv40 }).map(
    ({ grade, celsius, min, max }): ViscosityWindow => ({ kind: 'grade', name: grade.id, celsius, ...given(min, max) }),
  );
  return [...limits, ...grades];
}

function given(min: number | undefined, max: number | undefined) {
  return { ...(min !== undefined && { min }), ...(max !== undefined && { max }) };
}
