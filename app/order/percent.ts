/** Shares are kept as mass fractions [0..1] and shown in per cent. */

export function toPercent(fraction: number | undefined): number | undefined {
  return fraction === undefined ? undefined : Number((fraction * 100).toPrecision(12));
}

export function fromPercent(percent: number | undefined): number | undefined {
  return percent === undefined ? undefined : Number((percent / 100).toPrecision(12));
}
