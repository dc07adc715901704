import type { OwnProperty } from '../property/ownProperty';
import type { ViscosityRule } from '../property/viscosityRule';

/** How a mix is predicted; every field has a default. */
export interface PredictionOptions {
  /** Default 'wright'. */
  viscosityRule?: ViscosityRule;
  /** Pour points read the figures "with depressant" where a stock has one. Default false. */
  depressant?: boolean;
  ownProperties?: readonly OwnProperty[];
}

/** A property, at a temperature [°C] where it has one. */
export interface PropertyAt {
  property: string;
  celsius?: number;
}

/** A property at a temperature, without the key where there is none. */
export function propertyAt(property: string, celsius: number | undefined): PropertyAt {
  return celsius === undefined ? { property } : { property, celsius };
}
