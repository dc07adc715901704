import { predictBlend } from '../../blend/predictBlend';
import type { Limit, Order } from '../../optimise/order';
import type { BlendOutcome } from '../../optimise/outcome';
import { predictionOptions } from '../../optimise/rows/candidates';
import { limitCelsius, limitDefinition } from '../../optimise/rows/limitEnds';
import type { SolveOptions } from '../../optimise/solveOptions';
import { kv100Of, LimitedSolves } from '../limitedSolves';
import { AIM_TIME_MS, type AimedRecipe, ceilingOf, isProvenAbove, isUnder, USUAL_CEILING } from './aimedRecipe';

export interface PropertyAim {
  property: string;
  celsius?: number;
  towards: 'higher' | 'lower';
}

export interface BestOfProperty extends AimedRecipe {
  /** The best value that a recipe under the ceiling has, in the property's unit. */
  value: number;
  /** Where `proven`: no recipe under the ceiling has a value better than this by more than `step`. */
  step: number;
}

/** Steps of the first reach beyond a value that is had; doubled from there. */
const FIRST_REACH = 16;

/** The value that a recipe has of the aim's property. */
function valueIn(order: Order, aim: PropertyAim, { recipe }: BlendOutcome): number | undefined {
  const definition = limitDefinition(aim, order);
  if (!definition || !recipe) return undefined;
  const celsius = limitCelsius(aim, definition);
  const at = celsius === undefined ? { property: aim.property } : { property: aim.property, celsius };
  const { properties } = predictBlend(order.stocks, recipe, { ...predictionOptions(order), wanted: [at] });
  return properties.find((entry) => entry.property === aim.property && entry.celsius === celsius)?.value;
}

/**
 * The best value of one property at a cost ceiling (`within`, default 5 %, above the cheapest, in the order's cost
 * basis): the property gets a further limit, which is moved by bisection between a value that a recipe under the
 * ceiling has and one that is proven to cost more or to be impossible, until they are a `step` apart (default a tenth
 * of a reporting unit).
 *
 * Undefined where the outcome has no recipe, or the property is unknown or cannot be predicted for it. One time limit
 * covers all solves, default 5 s.
 */
export async function bestOfProperty(
  order: Order,
  outcome: BlendOutcome,
  aim: PropertyAim,
  options: SolveOptions & { within?: number; step?: number } = {},
): Promise<BestOfProperty | undefined> {
  const { within = USUAL_CEILING, step: stated, ...solveOptions } = options;
  const definition = limitDefinition(aim, order);
  const start = valueIn(order, aim, outcome);
  const { costPerTonne } = outcome;
  if (!definition || start === undefined || costPerTonne === undefined || !outcome.recipe) return undefined;
  const step = stated ?? definition.reportingUnit / 10;
  if (!(step > 0)) throw new RangeError(`The step must be above 0, not ${step}.`);
  const solves = new LimitedSolves(solveOptions, AIM_TIME_MS);
  const ceiling = ceilingOf(outcome, within, solves.relativeGap);
  const sign = aim.towards === 'higher' ? 1 : -1;
  const edge = aim.towards === 'higher' ? definition.sense.max : definition.sense.min;
  let best = { value: start, found: outcome };
  let beyond: { value: number; proven: boolean } | undefined;
  let reach = FIRST_REACH * step;
  let stopped: AimedRecipe['stopped'] = 'finished';

  while (sign * ((beyond?.value ?? edge) - best.value) > step * (1 + 1e-6)) {
    const next = beyond ? (best.value + beyond.value) / 2 : best.value + sign * reach;
    const value = sign * (edge - next) < 0 ? edge : next;
    const found = solves.stopped ? undefined : await solves.solve(withLimit(order, aim, value), kv100Of(best.found));
    if (found && isUnder(found, ceiling)) {
      const had = valueIn(order, aim, found) ?? value;
      best = { value: sign * (had - value) > 0 ? had : value, found };
      reach *= 2;
      continue;
    }
    const why = found ? found.stopped : solves.stopped;
    if (why === 'time limit' || why === 'cancelled') {
      stopped = why;
      break;
    }
    beyond = { value, proven: found !== undefined && isProvenAbove(found, ceiling) };
  }
  const { recipe = [], costPerTonne: cost = Number.NaN } = best.found;
  return {
    recipe,
    costPerTonne: cost,
    dearerBy: cost - costPerTonne,
    value: best.value,
    step,
    proven: stopped === 'finished' && (beyond === undefined || beyond.proven),
    stopped,
    solves: solves.count,
  };
}

/** The order with one more limit; its other limits on the property stand. */
function withLimit(order: Order, { property, celsius, towards }: PropertyAim, value: number): Order {
  const at = celsius === undefined ? { property } : { property, celsius };
  const limit: Limit = towards === 'higher' ? { ...at, min: value } : { ...at, max: value };
  return { ...order, limits: [...order.limits, limit] };
}
