import type { Grade, GradeLimit } from './grade';
import { ISO_3448_GRADES } from './iso3448';
import { J300_GRADES } from './saeJ300';
import { J306_GRADES } from './saeJ306';

/** Every grade, by system, thin to thick. */
export const GRADES: readonly Grade[] = [...ISO_3448_GRADES, ...J300_GRADES, ...J306_GRADES];

/** A window of kinematic viscosity [mm²/s] that a grade asks for. */
export interface GradeWindow {
  grade: Grade;
  /** Temperature of the window [°C]: 40 or 100. */
  celsius: number;
  min: number;
  /** Greatest value, itself inside (ISO 3448). */
  max?: number;
  /** The value itself is outside (SAE). Neither: open above. */
  below?: number;
  /** "inside the KV100 window of SAE 30": no claim to the grade. */
  words: string;
}

function windowOf(grade: Grade): GradeWindow | undefined {
  const kv = grade.limits.find((limit) => limit.property === 'kv');
  if (kv?.celsius === undefined || kv.min === undefined) return undefined;
  const { celsius, min, max, below } = kv;
  const words = `inside the KV${celsius} window of ${grade.id}`;
  return {
    grade,
    celsius,
    min,
    ...(max === undefined ? {} : { max }),
    ...(below === undefined ? {} : { below }),
    words,
  };
}

/**
 * A W grade asks for a least KV100 only: its low-temperature figures decide, so no viscosity window speaks for it.
 * Of the two rows of SAE 40, which share a window, the one with the bare name stands for both.
 */
function hasWindow({ system, name }: Grade): boolean {
  return system === 'ISO 3448' || !name.includes('W');
}

/** One window for each grade number, W grades left out. */
export const GRADE_WINDOWS: readonly GradeWindow[] = GRADES.filter(hasWindow).flatMap((grade) => windowOf(grade) ?? []);

function holds(value: number, { min, max, below }: Pick<GradeLimit, 'max' | 'below'> & { min: number }): boolean {
  return value >= min && (max === undefined || value <= max) && (below === undefined || value < below);
}

/**
 * The windows that the viscosities [mm²/s] at 40 and 100 °C of a mix fall into: ISO 3448 by KV40, SAE J300 and J306 by
 * KV100. Windows of J300 overlap, so there may be two. Nothing is said for a viscosity that is absent, and no W
 * grade is ever claimed. Takes the values as they are: round first where the report is rounded.
 */
export function gradesOfViscosity({ kv40, kv100 }: { kv40?: number; kv100?: number }): GradeWindow[] {
  return GRADE_WINDOWS.filter((window) => {
    const value = window.celsius === 40 ? kv40 : kv100;
    return value !== undefined && holds(value, window);
  });
}
