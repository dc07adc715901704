import { kvFromWalther } from '../../../src';

/** Temperature [°C] of a place on the chart's abscissa. */
export function celsiusAt(x: number): number {
  return 10 ** x - 273.15;
}

/** Viscosity [mm²/s] of a place on the chart's ordinate. */
export function kvAt(y: number): number {
  return kvFromWalther(y);
}
