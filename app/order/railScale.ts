/** The scale a rail is drawn on: from where to where, straight or logarithmic, and where the numbers stand. */

export interface RailScale {
  lo: number;
  hi: number;
  logarithmic: boolean;
}

export interface ScaleWish {
  /** Values that must be seen: the ends of the limit, the aim, the value of the mix. */
  values: readonly number[];
  logarithmic: boolean;
  reportingUnit: number;
  sense: { min: number; max: number };
}

/** A step of 1, 2 or 5 times a power of ten that is at least as large as asked. */
export function niceStep(least: number): number {
  const power = 10 ** Math.floor(Math.log10(least));
  const factor = [1, 2, 5, 10].find((candidate) => candidate * power >= least * (1 - 1e-9)) ?? 10;
  return Number((factor * power).toPrecision(6));
}

/** A scale that shows all values with room to drag at both sides, from one round number to another. */
export function chooseScale({ values, logarithmic, reportingUnit, sense }: ScaleWish): RailScale {
  const usable = values.filter((value) => Number.isFinite(value) && (!logarithmic || value > 0));
  const least = usable.length ? Math.min(...usable) : Math.max(sense.min, logarithmic ? 1 : 0);
  const most = usable.length ? Math.max(...usable) : least;
  const centre = Math.abs(least + most) / 2;
  const span = Math.max(most - least, 0.12 * centre, 12 * reportingUnit);
  const pad = 0.7 * span;
  const lowest = logarithmic ? Math.max(least - pad, least / 2, sense.min) : Math.max(least - pad, sense.min);
  const highest = Math.min(Math.max(most, least + span * 0.2) + pad, sense.max);
  const step = niceStep((highest - lowest) / 8);
  const lo = Math.max(Math.floor(lowest / step + 1e-9) * step, sense.min);
  const hi = Math.min(Math.ceil(highest / step - 1e-9) * step, sense.max);
  const tidy = (value: number) => Number(value.toPrecision(10));
  return {
    lo: logarithmic && lo <= 0 ? tidy(lowest) : tidy(lo),
    hi: hi > lo ? tidy(hi) : tidy(lo + step),
    logarithmic,
  };
}

/** Keeps the scale it has as long as everything can be seen on it and the values are not lost in a corner. */
export function keepScale(previous: RailScale | undefined, wish: ScaleWish): RailScale {
  const fresh = chooseScale(wish);
  if (!previous || previous.logarithmic !== wish.logarithmic) return fresh;
  const at = wish.values.map((value) => toFraction(previous, value));
  const seen = at.every((fraction) => fraction >= 0.04 && fraction <= 0.96);
  const tooWide = previous.hi - previous.lo > 3 * (fresh.hi - fresh.lo);
  return seen && !tooWide ? previous : fresh;
}

/** Place on the rail, 0 at its left end and 1 at its right; outside that range for values outside the scale. */
export function toFraction({ lo, hi, logarithmic }: RailScale, value: number): number {
  if (!logarithmic) return (value - lo) / (hi - lo);
  return value > 0 ? Math.log(value / lo) / Math.log(hi / lo) : -Infinity;
}

export function fromFraction({ lo, hi, logarithmic }: RailScale, fraction: number): number {
  return logarithmic ? lo * (hi / lo) ** fraction : lo + (hi - lo) * fraction;
}

/** Round numbers along the scale, at most about so many. */
export function scaleNumbers(scale: RailScale, most: number): number[] {
  const { lo, hi, logarithmic } = scale;
  if (logarithmic && hi / lo > 8) return decades(lo, hi).slice(0, 2 * most);
  const step = niceStep((hi - lo) / Math.max(most, 1));
  const first = Math.ceil(lo / step - 1e-9);
  const last = Math.floor(hi / step + 1e-9);
  return Array.from({ length: last - first + 1 }, (_, index) => Number(((first + index) * step).toPrecision(10)));
}

function decades(lo: number, hi: number): number[] {
  const numbers: number[] = [];
  for (let power = Math.floor(Math.log10(lo)); power <= Math.ceil(Math.log10(hi)); power += 1) {
    for (const factor of [1, 2, 5]) {
      const value = Number((factor * 10 ** power).toPrecision(6));
      if (value >= lo && value <= hi) numbers.push(value);
    }
  }
  return numbers;
}

/** The step a drag moves by: about one pixel, a round number, never finer than a laboratory reports. */
export function dragStep(scale: RailScale, width: number, reportingUnit: number): number {
  return Math.max(niceStep((scale.hi - scale.lo) / Math.max(width, 1)), reportingUnit);
}

/** The nearest multiple of a step. */
export function snap(value: number, step: number): number {
  return Number((Math.round(value / step) * step).toPrecision(10));
}
