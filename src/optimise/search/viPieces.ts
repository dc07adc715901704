import { TABLE_H, TABLE_L, TABLE_Y } from '../../property/d2270Table1';
import { basicValuesAboveTable, highIndexExponent, TABLE_END_KV100, tableRow } from '../../property/viscosityIndex';

/**
 * KV40 at a given viscosity index, U_r(Y), on the pieces where ASTM D2270 gives it in closed form: between the knots
 * of Table 1, and above KV100 = 70 by the standard's formulas on pieces of 3 %.
 */

const GROWTH = 1.03;
const TABLE_PIECES = TABLE_Y.length - 1;

/** Lower end [mm²/s] of a piece; the upper end is that of the next. */
export function knot(piece: number): number {
  return piece <= TABLE_PIECES ? TABLE_Y[piece] : TABLE_END_KV100 * GROWTH ** (piece - TABLE_PIECES);
}

/** The piece that holds a KV100 [mm²/s] of at least 2; at a knot the piece that begins there. */
export function pieceOf(kv100: number): number {
  if (kv100 < TABLE_END_KV100) return tableRow(kv100);
  let piece = TABLE_PIECES + Math.max(0, Math.floor(Math.log(kv100 / TABLE_END_KV100) / Math.log(GROWTH)));
  while (knot(piece + 1) <= kv100) piece++;
  while (piece > TABLE_PIECES && knot(piece) > kv100) piece--;
  return piece;
}

/** U_r at a KV100 within a piece: value [mm²/s], slope [-] and relative curvature U''/U' [s/mm²]. */
export interface ViKv40 {
  value: number;
  slope: number;
  curvature: number;
}

/** A polynomial a + b y + c y² with its derivatives. */
interface Basis {
  value: number;
  slope: number;
  second: number;
}

function tableBasis(column: Readonly<Float64Array>, piece: number, kv100: number): Basis {
  const slope = (column[piece + 1] - column[piece]) / (TABLE_Y[piece + 1] - TABLE_Y[piece]);
  // From the nearer knot, so that both ends of a piece give the table's own figures.
  const near = kv100 - TABLE_Y[piece] <= TABLE_Y[piece + 1] - kv100 ? piece : piece + 1;
  return { value: column[near] + slope * (kv100 - TABLE_Y[near]), slope, second: 0 };
}

function bases(piece: number, kv100: number): { L: Basis; H: Basis } {
  if (piece < TABLE_PIECES) return { L: tableBasis(TABLE_L, piece, kv100), H: tableBasis(TABLE_H, piece, kv100) };
  const { L, H } = basicValuesAboveTable(kv100);
  return {
    L: { value: L, slope: 2 * 0.8353 * kv100 + 14.67, second: 2 * 0.8353 },
    H: { value: H, slope: 2 * 0.1684 * kv100 + 11.85, second: 2 * 0.1684 },
  };
}

/** U_r at a KV100 inside (or at an end of) a piece. */
export function viKv40(vi: number, piece: number, kv100: number): ViKv40 {
  const { L, H } = bases(piece, kv100);
  if (vi <= 100) {
    const share = vi / 100;
    const slope = L.slope - share * (L.slope - H.slope);
    return {
      value: L.value - share * (L.value - H.value),
      slope,
      curvature: (L.second - share * (L.second - H.second)) / slope,
    };
  }
  const k = highIndexExponent(vi);
  const value = H.value / kv100 ** k;
  const h = H.slope / H.value;
  const q = h - k / kv100;
  const dq = H.second / H.value - h * h + k / (kv100 * kv100);
  return { value, slope: value * q, curvature: q + dq / q };
}

/**
 * Bounds over a part [from, to] of a piece by interval evaluation: least slope U' and greatest U''/U'.
 * `undefined` where the slope cannot be shown to be positive.
 */
export function viKv40Bounds(
  vi: number,
  piece: number,
  from: number,
  to: number,
): { leastSlope: number; greatestCurvature: number } | undefined {
  const a = bases(piece, from);
  const b = bases(piece, to);
  if (vi <= 100) {
    const share = vi / 100;
    const slopeAt = ({ L, H }: typeof a) => L.slope - share * (L.slope - H.slope);
    const leastSlope = Math.min(slopeAt(a), slopeAt(b));
    if (!(leastSlope > 0)) return undefined;
    const second = a.L.second - share * (a.L.second - a.H.second);
    return { leastSlope, greatestCurvature: Math.max(0, second) / leastSlope };
  }
  const k = highIndexExponent(vi);
  // H' and H rise, so H'/H lies between these quotients; on a linear piece H' is one number.
  const hLeast = a.H.slope / b.H.value;
  const hMost = b.H.slope / a.H.value;
  const qLeast = hLeast - k / from;
  const qMost = hMost - k / to;
  if (!(qLeast > 0)) return undefined;
  const dqMost = a.H.second / a.H.value - hLeast * hLeast + k / (from * from);
  const leastValue = a.H.value / to ** k;
  return {
    leastSlope: leastValue * qLeast,
    greatestCurvature: qMost + (dqMost > 0 ? dqMost / qLeast : dqMost / qMost),
  };
}
