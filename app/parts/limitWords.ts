import { type Limit, type LimitCheck, type OwnProperty, type PropertyDefinition, propertyDefinition } from '../../src';
import { upperEnd, upperMargin } from './limitEnds';
import { formatNumber } from './numberText';

/** "Kinematic viscosity at 40 °C"; the id itself where the property is not known. */
export function limitName(limit: Limit, ownProperties: readonly OwnProperty[] = []): string {
  const label = propertyDefinition(limit.property, ownProperties)?.label ?? limit.property;
  return limit.celsius === undefined ? label : `${label} at ${plain(limit.celsius)} °C`;
}

/** "KV40", "Noack", "CCS −30 °C": for narrow places. */
export function shortLimitName(limit: Limit, ownProperties: readonly OwnProperty[] = []): string {
  const short = propertyDefinition(limit.property, ownProperties)?.short ?? limit.property;
  if (limit.celsius === undefined || limit.property === 'density') return short;
  return limit.property === 'kv' ? `${short}${plain(limit.celsius)}` : `${short} ${plain(limit.celsius)} °C`;
}

/** "46 mm²/s"; a unit of "-" is left out. */
export function withUnit(value: number, definition: PropertyDefinition): string {
  const number = formatNumber(value, definition.digits);
  return unitOf(definition) ? `${number} ${unitOf(definition)}` : number;
}

export function unitOf(definition: PropertyDefinition | undefined): string | undefined {
  return definition && definition.unit !== '-' ? definition.unit : undefined;
}

/** "41.4 to 50.6 mm²/s", "at least 95", "below 9.3 mm²/s". */
export function rangeInWords(limit: Limit, definition: PropertyDefinition): string {
  const upper = upperEnd(limit);
  const parts: string[] = [];
  if (limit.min !== undefined && upper.value !== undefined && !upper.strict) {
    parts.push(`${formatNumber(limit.min, definition.digits)} to ${withUnit(upper.value, definition)}`);
  } else {
    if (limit.min !== undefined) parts.push(`at least ${withUnit(limit.min, definition)}`);
    if (upper.value !== undefined) {
      parts.push(`${upper.strict ? 'below' : 'at most'} ${withUnit(upper.value, definition)}`);
    }
  }
  if (limit.aim !== undefined) parts.push(`near ${withUnit(limit.aim, definition)}`);
  return parts.length ? parts.join(', ') : 'no end set';
}

/** How the mix stands to the limit: "room 0.4 mm²/s", "on the limit", "outside by 2 °C". */
export function roomInWords(check: LimitCheck, definition: PropertyDefinition): string {
  if (check.onLimit) return 'on the limit';
  if (check.room === undefined) return 'no end set';
  const size = Math.abs(check.room);
  const rounds = size < 0.5 * 10 ** -definition.digits;
  const distance = rounds ? `under ${withUnit(10 ** -definition.digits, definition)}` : withUnit(size, definition);
  return check.room < 0 ? `outside by ${distance}` : `room ${distance}`;
}

/** What is wrong with a limit as it is written, whatever the stocks; undefined where nothing is. */
export function contradiction(limit: Limit, definition: PropertyDefinition): string | undefined {
  const { value: most, strict } = upperEnd(limit);
  if (limit.min === undefined || most === undefined) return undefined;
  const least = withUnit(limit.min, definition);
  if (limit.min > most)
    return `The least, ${least}, is above the most, ${withUnit(most, definition)}. Change one of them.`;
  if (strict && limit.min > most - definition.reportingUnit + 1e-9 * definition.reportingUnit) {
    return `Nothing lies at or above ${least} and below ${withUnit(most, definition)}. Change one of them.`;
  }
  const inside = (limit.insideBy ?? 0) + upperMargin(limit, definition.reportingUnit);
  if (limit.min + inside > most + 1e-9 * definition.reportingUnit) {
    return `The margin inside leaves nothing between ${least} and ${withUnit(most, definition)}. Make it smaller.`;
  }
  return undefined;
}

function plain(celsius: number): string {
  return formatNumber(celsius, Number.isInteger(celsius) ? 0 : 1);
}
