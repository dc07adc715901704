import type { ModelRow, SearchModel } from '../rows/searchModel';

/** A share below this is no share: the engines' tolerance. */
export const NO_SHARE = 1e-9;
/** How far from a whole drum a share may be: in drums, and as a share of the mix. */
const WHOLE = 1e-6;
const WHOLE_SHARE = 1e-8;

/** A choice to branch on: two alternatives, each a list of column bounds. */
export interface Choice {
  alternatives: { column: number; lower: number; upper: number }[][];
}

/** Rows over presences: counts, places, exclusions, needs, most stocks, one stretch of a price. */
export function presenceRows(model: SearchModel): ModelRow[] {
  const columns = new Set(model.presences.map((presence) => presence.column));
  return model.rows.filter(
    (row) => row.source.kind !== 'presence' && row.columns.some((column) => columns.has(column)),
  );
}

/** Which presences the shares mean: column of the presence → 0 or 1. */
export function impliedPresences(model: SearchModel, values: ArrayLike<number>): Map<number, number> {
  return new Map(model.presences.map(({ stock, column }) => [column, values[stock] > NO_SHARE ? 1 : 0]));
}

function activity(row: ModelRow, presences: ReadonlyMap<number, number>): number {
  return row.columns.reduce((sum, column, k) => sum + row.values[k] * (presences.get(column) ?? 0), 0);
}

/** True where the shares keep every least dose and every rule over presences. */
export function keepsPresences(model: SearchModel, rows: readonly ModelRow[], values: ArrayLike<number>): boolean {
  const presences = impliedPresences(model, values);
  const doses = model.presences.every(
    ({ stock, least }) => !(values[stock] > NO_SHARE) || values[stock] >= least - NO_SHARE,
  );
  // A stock in the mix is paid for in full, not by the part of its presence that the relaxation needs.
  const paid = model.presences.every(
    ({ stock, column }) => model.cost[column] <= 0 || !(values[stock] > NO_SHARE) || values[column] >= 1 - NO_SHARE,
  );
  return (
    doses &&
    paid &&
    rows.every((row) => activity(row, presences) >= row.lower - 1e-9 && activity(row, presences) <= row.upper + 1e-9)
  );
}

function drums(values: ArrayLike<number>, stock: number, share: number): number {
  return values[stock] / share;
}

/** How far from a whole number of drums a count may be. */
function wholeWithin(share: number): number {
  return Math.min(WHOLE, WHOLE_SHARE / share);
}

/** True where every stock that comes in drums is charged in whole ones. */
export function keepsWholeLots(model: SearchModel, values: ArrayLike<number>): boolean {
  return model.wholeLots.every(({ stock, share }) => {
    const count = drums(values, stock, share);
    return Math.abs(count - Math.round(count)) <= wholeWithin(share);
  });
}

function presenceChoice(
  model: SearchModel,
  values: ArrayLike<number>,
  lower: Float64Array,
  upper: Float64Array,
): Choice | undefined {
  let best: { stock: number; column: number; least: number } | undefined;
  let bestScore = -1;
  for (const presence of model.presences) {
    const { stock, column, least } = presence;
    if (lower[column] === upper[column]) continue;
    // Prefer an undecided presence; among equals the greatest share, which moves the cost most.
    const score =
      Math.min(values[column], 1 - values[column]) + (values[stock] > NO_SHARE ? 1 + 1e-3 * values[stock] : 0);
    const breaksDose = values[stock] > NO_SHARE && values[stock] < least - NO_SHARE;
    if (score + (breaksDose ? 1 : 0) > bestScore) {
      best = { stock, column, least };
      bestScore = score + (breaksDose ? 1 : 0);
    }
  }
  if (!best) return undefined;
  const { stock, column, least } = best;
  return {
    alternatives: [
      [
        { column, lower: 1, upper: 1 },
        { column: stock, lower: Math.max(lower[stock], least), upper: upper[stock] },
      ],
      [
        { column, lower: 0, upper: 0 },
        { column: stock, lower: lower[stock], upper: 0 },
      ],
    ],
  };
}

function drumChoice(
  model: SearchModel,
  values: ArrayLike<number>,
  lower: Float64Array,
  upper: Float64Array,
): Choice | undefined {
  let best: Choice | undefined;
  let worst = 0;
  for (const { stock, share } of model.wholeLots) {
    const count = drums(values, stock, share);
    const off = Math.abs(count - Math.round(count));
    if (off <= Math.max(worst, wholeWithin(share))) continue;
    worst = off;
    const floor = Math.floor(count);
    best = {
      alternatives: [
        [{ column: stock, lower: lower[stock], upper: Math.min(upper[stock], floor * share) }],
        [{ column: stock, lower: Math.max(lower[stock], (floor + 1) * share), upper: upper[stock] }],
      ],
    };
  }
  return best;
}

/** A presence that is not decided yet, whatever it is: where no solution says which matters. */
export function undecidedChoice(model: SearchModel, lower: Float64Array, upper: Float64Array): Choice | undefined {
  return presenceChoice(model, new Float64Array(model.cost.length), lower, upper);
}

/** The next discrete choice to branch on at a solution that breaks one; undefined where none is left to make. */
export function nextChoice(
  model: SearchModel,
  rows: readonly ModelRow[],
  values: ArrayLike<number>,
  lower: Float64Array,
  upper: Float64Array,
): Choice | undefined {
  if (!keepsPresences(model, rows, values)) return presenceChoice(model, values, lower, upper);
  return drumChoice(model, values, lower, upper);
}

/**
 * Bounds that settle every discrete choice near a solution, to try for a recipe: shares of at least half the least
 * dose stay, the smallest shares go where a count is exceeded, drums go to the nearest whole number.
 */
export function roundedBounds(
  model: SearchModel,
  rows: readonly ModelRow[],
  values: ArrayLike<number>,
  lower: Float64Array,
  upper: Float64Array,
): { column: number; lower: number; upper: number }[] {
  const present = new Map(
    model.presences.map(({ stock, column, least }) => [
      column,
      lower[column] > 0 || (upper[column] > 0 && values[stock] > Math.max(NO_SHARE, least / 2)) ? 1 : 0,
    ]),
  );
  const bySize = [...model.presences].sort((a, b) => values[a.stock] - values[b.stock]);
  for (const row of rows) {
    for (const { column } of bySize) {
      if (activity(row, present) <= row.upper + 1e-9) break;
      if (row.columns.includes(column) && lower[column] === 0) present.set(column, 0);
    }
    for (const { column } of [...bySize].reverse()) {
      if (activity(row, present) >= row.lower - 1e-9) break;
      if (row.columns.includes(column) && upper[column] > 0) present.set(column, 1);
    }
  }
  const bounds: { column: number; lower: number; upper: number }[] = [];
  for (const { stock, column, least } of model.presences) {
    const there = present.get(column) === 1;
    bounds.push({ column, lower: there ? 1 : 0, upper: there ? 1 : 0 });
    if (there) bounds.push({ column: stock, lower: Math.max(lower[stock], least), upper: upper[stock] });
    else bounds.push({ column: stock, lower: lower[stock], upper: 0 });
  }
  for (const { stock, share } of model.wholeLots) {
    const exact = Math.min(upper[stock], Math.max(lower[stock], Math.round(drums(values, stock, share)) * share));
    bounds.push({ column: stock, lower: exact, upper: exact });
  }
  return bounds;
}
