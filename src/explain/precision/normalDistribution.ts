/** Beyond this many standard deviations the rest is below 1e-15. */
const FAR = 8;

/**
 * Chance that a normal variable lies below x standard deviations [0..1]: Φ(x) = 1/2 + φ(x)(x + x³/3 + x⁵/(3·5) + ...).
 * Source: Marsaglia, J. Stat. Softw. 11(4) (2004). Absolute error below 1e-14.
 */
export function normalBelow(x: number): number {
  if (Number.isNaN(x)) return Number.NaN;
  if (x < -FAR) return 0;
  if (x > FAR) return 1;
  let term = x;
  let sum = x;
  for (let i = 3; sum + term !== sum; i += 2) {
    term *= (x * x) / i;
    sum += term;
  }
  return Math.min(1, Math.max(0, 0.5 + (sum * Math.exp(-0.5 * x * x)) / Math.sqrt(2 * Math.PI)));
}
