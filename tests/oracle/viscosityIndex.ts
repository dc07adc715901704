import { TABLE_1 } from './d2270Table';

/** ASTM D2270, written for the checks from the published text. All viscosities in mm²/s. */
export interface BasicValues {
  L: number;
  H: number;
}

/** Where D2270 changes formula: the rows of Table 1 below 70, and 3 % steps of our own above. */
export function breakpoints(low: number, high: number): number[] {
  const inside: number[] = [];
  for (const { y } of TABLE_1) if (y > low && y < high) inside.push(y);
  for (let y = 70 * 1.03; y < high; y *= 1.03) if (y > low) inside.push(y);
  return [low, ...inside, high];
}

/** L and H at a KV100; `above` reads the formula above the table even at exactly 70. */
export function basicValues(y: number, above = y > 70): BasicValues {
  if (!(y >= 2)) throw new RangeError(`D2270 is not defined at KV100 = ${y}.`);
  if (above) {
    return { L: 0.8353 * y * y + 14.67 * y - 216, H: 0.1684 * y * y + 11.85 * y - 97 };
  }
  let place = 0;
  for (let stride = 256; stride >= 1; stride /= 2) {
    if (place + stride <= TABLE_1.length - 2 && TABLE_1[place + stride].y <= y) place += stride;
  }
  const a = TABLE_1[place];
  const b = TABLE_1[place + 1];
  const share = (y - a.y) / (b.y - a.y);
  return { L: a.L * (1 - share) + b.L * share, H: a.H * (1 - share) + b.H * share };
}

/** Unrounded viscosity index. */
export function viOf(kv40: number, kv100: number): number {
  const { L, H } = basicValues(kv100);
  if (kv40 >= H) return (100 * (L - kv40)) / (L - H);
  const n = (Math.log10(H) - Math.log10(kv40)) / Math.log10(kv100);
  return (10 ** n - 1) / 0.00715 + 100;
}

/** KV40 at a viscosity index; rises with KV100 but for a step down at 70. */
export function kv40OfVi(vi: number, kv100: number, above = kv100 > 70): number {
  const { L, H } = basicValues(kv100, above);
  if (vi <= 100) return L - (vi * (L - H)) / 100;
  return H / kv100 ** Math.log10(1 + 0.00715 * (vi - 100));
}
