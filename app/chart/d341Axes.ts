import { logTemperature, waltherIndex } from '../../src';

/**
 * The axes of ASTM D341: abscissa log10 of the absolute temperature, ordinate W = log10(log10 Z) of the kinematic
 * viscosity. On them a viscosity-temperature line is straight. Ticks are in °C and mm²/s.
 */

/** A tick of either axis: where it stands and what it says. */
export interface Tick {
  at: number;
  value: number;
}

/** Round viscosities [mm²/s], from the thinnest spindle oil to grease. */
const NICE_KV = [0.5, 1, 1.5, 2, 3, 5, 7, 10, 20, 30, 50, 100, 200, 500, 1000, 2000, 5000, 1e4, 1e5, 1e6, 1e7];

/** Nice viscosities within [min, max] mm²/s, no two nearer than `apart` on the axis (in W); rounder ones stay. */
export function viscosityTicks(min: number, max: number, apart: number): Tick[] {
  const inside = NICE_KV.filter((value) => value >= min && value <= max);
  const byRoundness = inside.sort((a, b) => roundness(a) - roundness(b) || a - b);
  return spaced(byRoundness, waltherIndex, apart);
}

/** Powers of ten first, then 2 and 5, then the others. */
function roundness(value: number): number {
  const digit = value / 10 ** Math.floor(Math.log10(value) + 1e-9);
  if (Math.abs(digit - 1) < 1e-6) return 0;
  return Math.abs(digit - 2) < 1e-6 || Math.abs(digit - 5) < 1e-6 ? 1 : 2;
}

/** The temperatures that matter most on this chart come first when there is no room for all. */
const FIRST_CELSIUS = [40, 100];

/** Multiples of 20 °C within [min, max], no two nearer than `apart` on the axis; 40 and 100 °C stay. */
export function temperatureTicks(min: number, max: number, apart: number): Tick[] {
  const all: number[] = [];
  for (let celsius = Math.ceil(min / 20) * 20; celsius <= max; celsius += 20) all.push(celsius);
  const first = FIRST_CELSIUS.filter((celsius) => celsius >= min && celsius <= max);
  return spaced([...first, ...all.filter((celsius) => !first.includes(celsius))], logTemperature, apart);
}

/** Takes values in turn, leaving out what would stand too near to one already there; in the axis's order. */
function spaced(values: readonly number[], place: (value: number) => number, apart: number): Tick[] {
  const ticks: Tick[] = [];
  for (const value of values) {
    const at = place(value);
    if (ticks.every((tick) => Math.abs(tick.at - at) >= apart)) ticks.push({ at, value });
  }
  return ticks.sort((a, b) => a.at - b.at);
}

/** Place of a viscosity on the ordinate, undefined where D341 has none (0.21 to 2·10⁷ mm²/s). */
export function placeOfKv(kv: number): number | undefined {
  return kv >= 0.21 && kv <= 2e7 ? waltherIndex(kv) : undefined;
}
