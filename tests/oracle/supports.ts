import type { Order } from '../../src/index';
import { type OrderRows, orderRows } from './orderRows';
import { type OracleAnswer, searchRows } from './sliceSearch';

function allowed({ choices, lower, upper, least }: OrderRows, used: readonly boolean[]): boolean {
  const count = (places: readonly number[]) => places.filter((i) => used[i]).length;
  if (used.some((u, i) => (!u && lower[i] > 0) || (u && Math.max(lower[i], least[i]) > upper[i]))) return false;
  if (choices.most !== undefined && used.filter(Boolean).length > choices.most) return false;
  if (choices.counts.some(({ members, min, max }) => count(members) > max || count(members) < min)) return false;
  if (choices.needs.some(({ from, members }) => used[from] && count(members) === 0)) return false;
  return choices.excludes.every(({ from, members }) => !used[from] || count(members) === 0);
}

/** The rows of an order once it is settled which stocks are used: no choices are left. */
function settled(rows: OrderRows, used: readonly boolean[]): OrderRows {
  return {
    ...rows,
    lower: rows.lower.map((low, i) => (used[i] ? Math.max(low, rows.least[i]) : 0)),
    upper: rows.upper.map((high, i) => (used[i] ? high : 0)),
    least: rows.least.map(() => 0),
    fixed: rows.fixed.map(() => 0),
    choices: { counts: [], excludes: [], needs: [] },
  };
}

/**
 * Least cost by trying every set of stocks in turn: no integer programming at all, for up to about 8 stocks. A set
 * that lies inside a larger allowed one without least doses is not skipped: plain beats clever here.
 */
export function enumerateSupports(order: Order): Pick<OracleAnswer, 'status' | 'cost' | 'recipe'> {
  const rows = orderRows(order);
  const n = rows.stocks.length;
  if (n > 10) throw new Error('Too many stocks to enumerate.');
  let best: Pick<OracleAnswer, 'status' | 'cost' | 'recipe'> = { status: 'impossible', cost: Infinity, recipe: [] };
  for (let mask = 1; mask < 1 << n; mask++) {
    const used = rows.stocks.map((_, i) => (mask & (1 << i)) !== 0);
    if (!allowed(rows, used)) continue;
    const fixed = used.reduce((sum, u, i) => sum + (u ? rows.fixed[i] : 0), 0);
    const bare = searchRows(settled(rows, used), best.cost - fixed);
    const answer = bare.status === 'solved' ? { ...bare, cost: bare.cost + fixed } : bare;
    if (answer.status === 'undecided') return { status: 'undecided', cost: Number.NaN, recipe: [] };
    if (answer.status === 'solved' && answer.cost < best.cost) best = answer;
  }
  return best;
}
