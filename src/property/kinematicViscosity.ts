/**
 * Viscosity and temperature by ASTM D341 (Walther / MacCoull):
 *
 *   Z(ν) = ν + 0.7 + exp(-1.47 - 1.84 ν - 0.51 ν²),   W(ν) = log10(log10 Z),   W = A - B·log10(T)
 *
 * with ν in mm²/s and T in kelvin. Source: ASTM D341. Valid from 0.21 mm²/s to 2·10⁷ mm²/s; the standard
 * claims no accuracy outside the measured points (see DEVELOPERS.md, "How far a line may be trusted").
 */

/** One measured viscosity. */
export interface ViscosityPoint {
  /** Temperature [°C]. */
  celsius: number;
  /** Kinematic viscosity [mm²/s]. */
  kv: number;
}

const KELVIN = 273.15;
/** Range of D341's formula [mm²/s]. */
export const LEAST_KV = 0.21;
export const GREATEST_KV = 2e7;

/** log10 of the absolute temperature, the abscissa of D341. */
export function logTemperature(celsius: number): number {
  if (!(celsius > -KELVIN)) throw new RangeError(`A temperature of ${celsius} °C is below absolute zero.`);
  return Math.log10(celsius + KELVIN);
}

function correction(kv: number): number {
  return Math.exp(-1.47 - 1.84 * kv - 0.51 * kv * kv);
}

function transform(kv: number): number {
  return kv + 0.7 + correction(kv);
}

/** W(ν) = log10(log10 Z), the ordinate of D341 [-], of a viscosity in mm²/s. Throws RangeError out of range. */
export function waltherIndex(kv: number): number {
  if (!(kv >= LEAST_KV && kv <= GREATEST_KV)) {
    throw new RangeError(`A kinematic viscosity of ${kv} mm²/s is outside ASTM D341 (0.21 to 20 000 000 mm²/s).`);
  }
  return Math.log10(Math.log10(transform(kv)));
}

/** dW/dν [s/mm²]. */
export function waltherSlope(kv: number): number {
  const z = transform(kv);
  const dz = 1 + correction(kv) * (-1.84 - 1.02 * kv);
  return dz / (z * Math.log(z) * Math.LN10);
}

/** κ(ν) = -W''/W' = (Z'/Z)(1 + 1/ln Z) - Z''/Z' [s/mm²], the relative curvature that decides concavity. */
export function waltherCurvature(kv: number): number {
  const z = transform(kv);
  const c = correction(kv);
  const slope = -1.84 - 1.02 * kv;
  const dz = 1 + c * slope;
  const d2z = c * (slope * slope - 1.02);
  return (dz / z) * (1 + 1 / Math.log(z)) - d2z / dz;
}

/**
 * The standard's explicit inverse, ν = (Z-0.7) - exp(-0.7487 - 3.295(Z-0.7) + 0.6119(Z-0.7)² - 0.3193(Z-0.7)³)
 * [mm²/s]; approximate, the starting point of the exact one. (Coefficients from memory; checked against the exact
 * inverse in tests/reference.)
 */
export function explicitKvFromWalther(index: number): number {
  const q = 10 ** (10 ** index) - 0.7;
  return q - Math.exp(-0.7487 - 3.295 * q + 0.6119 * q * q - 0.3193 * q * q * q);
}

/** Kinematic viscosity [mm²/s] of a W(ν): safeguarded Newton on ν + exp(...) = Z - 0.7, exact to rounding. */
export function kvFromWalther(index: number): number {
  const target = 10 ** (10 ** index) - 0.7;
  // Beyond 10 mm²/s the correction is below 1e-30: ν = Z - 0.7 to the last digit.
  if (target > 10) return target;
  let low = 0;
  let high = target;
  let kv = Math.min(high, Math.max(low, explicitKvFromWalther(index)));
  for (let step = 0; step < 60; step++) {
    const residual = kv + correction(kv) - target;
    if (residual > 0) high = kv;
    else low = kv;
    const newton = kv - residual / (1 + correction(kv) * (-1.84 - 1.02 * kv));
    const next = newton > low && newton < high ? newton : (low + high) / 2;
    if (Math.abs(next - kv) <= 1e-15 * kv) return next;
    kv = next;
  }
  return kv;
}

/** Sorted copy of at least two points whose viscosity falls as temperature rises; throws RangeError otherwise. */
function fallingPoints(points: readonly ViscosityPoint[]): ViscosityPoint[] {
  if (points.length < 2) {
    throw new RangeError('A viscosity-temperature line needs two measured points; give a second temperature.');
  }
  const sorted = [...points].sort((a, b) => a.celsius - b.celsius);
  for (const { kv } of sorted) waltherIndex(kv);
  for (let i = 1; i < sorted.length; i++) {
    if (!(sorted[i].celsius > sorted[i - 1].celsius) || !(sorted[i].kv < sorted[i - 1].kv)) {
      throw new RangeError(
        `Viscosity must fall as temperature rises: ${sorted[i - 1].kv} mm²/s at ${sorted[i - 1].celsius} °C and ` +
          `${sorted[i].kv} mm²/s at ${sorted[i].celsius} °C do not.`,
      );
    }
  }
  return sorted;
}

/**
 * Kinematic viscosity [mm²/s] at a temperature [°C] by ASTM D341 through measured points: exact at every point, a
 * straight line in (log10 T, W) between neighbours, the nearest line beyond the ends (an extrapolation).
 * Throws RangeError for fewer than two points, points that do not fall, or a result outside D341.
 */
export function kinematicViscosityAt(celsius: number, points: readonly ViscosityPoint[]): number {
  const sorted = fallingPoints(points);
  const exact = sorted.find((point) => point.celsius === celsius);
  if (exact) return exact.kv;
  const after = sorted.findIndex((point) => point.celsius > celsius);
  const right = after === -1 ? sorted.length - 1 : Math.max(1, after);
  const a = sorted[right - 1];
  const b = sorted[right];
  const ta = logTemperature(a.celsius);
  const wa = waltherIndex(a.kv);
  const slope = (waltherIndex(b.kv) - wa) / (logTemperature(b.celsius) - ta);
  const index = wa + slope * (logTemperature(celsius) - ta);
  const kv = kvFromWalther(index);
  if (!(kv >= LEAST_KV && kv <= GREATEST_KV)) {
    throw new RangeError(`At ${celsius} °C the line leaves the range of ASTM D341 (0.21 to 20 000 000 mm²/s).`);
  }
  return kv;
}
