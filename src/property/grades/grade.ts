/** A limit as a grade's standard states it: values in the unit of the property table. */
export interface GradeLimit {
  /** Property id of the property table. */
  property: string;
  /** Temperature [°C] where the property has one. */
  celsius?: number;
  min?: number;
  max?: number;
  /** Strict upper end: the standard says "less than". */
  below?: number;
}

export type GradeSystem = 'ISO 3448' | 'SAE J300' | 'SAE J306';

/** A published grade. */
export interface Grade {
  /** What the trade writes, unique: 'ISO VG 46', 'SAE 30', 'SAE 5W', 'SAE J306 90'. */
  id: string;
  system: GradeSystem;
  /** Short name inside its system: 'VG 46', '30', '5W'. */
  name: string;
  /** Limits that a prediction can be held against. */
  limits: readonly GradeLimit[];
  /** What the standard asks for besides, and no prediction here covers. */
  laboratoryOnly: readonly string[];
  /** Edition, and what to mind. */
  note: string;
}
