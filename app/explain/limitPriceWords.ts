import type { LimitPrice, PropertyDefinition } from '../../src';
import { unitOf } from '../parts/limitWords';
import { formatNumber } from '../parts/numberText';
import { type CostUnit, difference, isNothing } from './costWords';

/** How amounts are written. */
export interface Money {
  currency: string;
  unit: CostUnit;
}

const MOST_DIGITS = 6;

/** A value or a step of a limit: the method's decimals, or more where those would hide it. */
function inUnit(value: number, definition: PropertyDefinition, step = value): string {
  let { digits } = definition;
  while (digits < MOST_DIGITS && Math.abs(Number(step.toFixed(digits)) - step) > 1e-9 + 0.01 * Math.abs(step)) digits++;
  const unit = unitOf(definition);
  return unit ? `${formatNumber(value, digits)} ${unit}` : formatNumber(value, digits);
}

/** The end moved by a step: `outward` loosens it. */
function moved({ end, stated, step }: LimitPrice, outward: boolean): number {
  return (end === 'min') === outward ? stated - step : stated + step;
}

export function endInWords(
  { end, stated }: Pick<LimitPrice, 'end' | 'stated'>,
  definition: PropertyDefinition,
): string {
  return `${end === 'min' ? 'least' : 'most'} ${inUnit(stated, definition)}`;
}

/** "0.10 mm²/s looser saves €1.20/t", "1 unit looser saves €34.84/t": what stands beside the rail. */
export function priceInShort(price: LimitPrice, definition: PropertyDefinition, { currency, unit }: Money): string {
  const step = unitOf(definition) ? inUnit(price.step, definition) : `${inUnit(price.step, definition)} unit`;
  const saves = difference(price.looserSaves, currency, unit);
  return `${step} looser saves ${saves}${price.proven ? '' : ' (not proven)'}`;
}

/** What one end costs, line by line: each a difference of cost, with the end it speaks of. */
export function priceStory(price: LimitPrice, definition: PropertyDefinition, money: Money): string[] {
  const { currency, unit } = money;
  const { looserSaves, tighterCosts, holdsTo, withoutSaves, step, end, proven } = price;
  const at = (outward: boolean) =>
    `by ${inUnit(step, definition)} (${inUnit(moved(price, outward), definition, step)})`;
  const tighter =
    tighterCosts === undefined
      ? `Tighter ${at(false)}: ${proven ? 'no recipe meets it' : 'no recipe was found'}.`
      : `Tighter ${at(false)} adds ${difference(tighterCosts, currency, unit)}.`;
  const lines = [`Looser ${at(true)} saves ${difference(looserSaves, currency, unit)}.`];
  if (holdsTo !== undefined && !isNothing(looserSaves)) {
    const way = end === 'min' ? 'down' : 'up';
    lines.push(`Loosening goes on saving at this rate ${way} to ${inUnit(holdsTo, definition)}.`);
  }
  lines.push(tighter, `Without this end the order costs ${lessCost(withoutSaves, money)}.`);
  return lines;
}

function lessCost(amount: number, { currency, unit }: Money): string {
  return isNothing(amount) ? 'the same' : `${difference(amount, currency, unit)} less`;
}

/** How the figures came about, and whether they are proven. */
export function priceOrigin(proven: boolean, hasAims: boolean): string {
  const solved = `Each figure is the difference of two solved orders${hasAims ? ', aims counted in' : ''}`;
  return proven ? `${solved}, both proven.` : `${solved}; not all of them were proven in the time.`;
}
