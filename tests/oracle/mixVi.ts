import type { OrderRows } from './orderRows';
import { viOf } from './viscosityIndex';
import { invert } from './walther';

/** KV40 and KV100 of a mix by the oracle's own formulas. */
export function viscositiesOf(order: OrderRows, x: readonly number[]): { kv40: number; kv100: number } {
  if (!order.viscosity) throw new Error('No viscosity in this order.');
  const { terms, index } = order.viscosity;
  let weight = 0;
  let sum40 = 0;
  let sum100 = 0;
  terms.forEach((term, i) => {
    weight += x[i] * term.weight;
    sum40 += x[i] * term.weight * term.index40;
    sum100 += x[i] * term.weight * term.index100;
  });
  return { kv40: invert(index, sum40 / weight), kv100: invert(index, sum100 / weight) };
}

/** Whether a mix keeps the limits on the viscosity index, to `slack` points. */
export function meetsVi(order: OrderRows, x: readonly number[], slack = 1e-8): boolean {
  const { vi } = order;
  if (!vi) return true;
  const { kv40, kv100 } = viscositiesOf(order, x);
  if (kv100 < 2 - 1e-9 || kv40 <= kv100) return false;
  const value = viOf(kv40, Math.max(2, kv100));
  return value >= (vi.min ?? -Infinity) - slack && value <= (vi.max ?? Infinity) + slack;
}

/** Whether a mix sits on a limit of the viscosity index. */
export function viActive(order: OrderRows, x: readonly number[]): boolean {
  if (!order.vi) return false;
  const { kv40, kv100 } = viscositiesOf(order, x);
  const value = viOf(kv40, Math.max(2, kv100));
  return Math.abs(value - (order.vi.min ?? Infinity)) < 1e-4 || Math.abs(value - (order.vi.max ?? Infinity)) < 1e-4;
}
