import { useId } from 'react';
import type { Limit, PropertyDefinition } from '../../src';
import { upperEnd, upperMargin } from '../parts/limitEnds';
import styles from './Rail.module.css';
import { RAIL } from './railLayout';

/** The allowed zone, with the margin hatched inside each stated end. Open to the side where no end is stated. */
export function RailZone({
  limit,
  definition,
  x,
  right,
}: {
  limit: Limit;
  definition: PropertyDefinition;
  x(value: number): number;
  right: number;
}) {
  const hatch = useId();
  const upper = upperEnd(limit).value;
  if (limit.min === undefined && upper === undefined) return null;
  const from = limit.min === undefined ? RAIL.margin : x(limit.min);
  const to = upper === undefined ? right : x(upper);
  const height = RAIL.trackBottom - RAIL.trackTop;
  if (limit.min !== undefined && upper !== undefined && limit.min > upper) {
    return <rect className={styles.nothing} x={to} width={from - to} y={RAIL.trackTop + 6} height={4} />;
  }
  const inside = limit.insideBy ?? 0;
  const marginLow = limit.min !== undefined && inside > 0 ? x(limit.min + inside) - from : 0;
  const margin = upperMargin(limit, definition.reportingUnit);
  const marginHigh = upper !== undefined && margin > 0 ? to - x(upper - margin) : 0;
  return (
    <g>
      <pattern id={hatch} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        <line className={styles.hatch} x1="0" x2="0" y1="0" y2="5" />
      </pattern>
      <rect className={styles.zone} x={from} width={Math.max(to - from, 0)} y={RAIL.trackTop} height={height} />
      {[
        { key: 'low', x: from, width: Math.min(marginLow, to - from) },
        { key: 'high', x: Math.max(to - marginHigh, from), width: Math.min(marginHigh, to - from) },
      ].map(({ key, ...place }) => (
        <rect key={key} {...place} y={RAIL.trackTop} height={height} fill={`url(#${hatch})`} />
      ))}
    </g>
  );
}
