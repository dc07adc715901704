import { type Ladder, type Order, propertyDefinition, type Relaxation, VI_DEFINITION } from '../../src';
import { shortLimitName, unitOf } from '../parts/limitWords';
import { formatNumber } from '../parts/numberText';

type EndChange = Relaxation['changes'][number];

/** "KV40 down to 44.10 mm²/s (asked at least 46.00)": an end of a limit moved out. */
export function changeInWords({ limit: place, end, stated, to }: EndChange, { limits, ownProperties }: Order): string {
  const limit = limits[place];
  if (!limit) return `limit ${place + 1}`;
  const definition = limit.property === 'vi' ? VI_DEFINITION : propertyDefinition(limit.property, ownProperties);
  const number = (value: number) => formatNumber(value, definition?.digits ?? 2);
  const unit = unitOf(definition);
  const way = end === 'min' ? 'down to' : 'up to';
  const asked = `(asked ${end === 'min' ? 'at least' : 'at most'} ${number(stated)})`;
  return `${shortLimitName(limit, ownProperties)} ${way} ${number(to)}${unit ? ` ${unit}` : ''} ${asked}`;
}

/** "KV40 down to 44.10 mm²/s (asked at least 46.00); Noack up to 9.0 % m/m (asked at most 8.0)". */
export function relaxationInWords({ changes }: Relaxation, order: Order): string {
  return changes.map((change) => changeInWords(change, order)).join('; ');
}

/** What the ladder could not do in its time; undefined where it is whole. */
export function unfinishedInWords({ stopped }: Ladder): string | undefined {
  return stopped === 'finished' ? undefined : 'The time ran out: more may be within reach than is listed here.';
}
