import type { PropertyDefinition } from '../../src';
import { classNames } from '../parts/classNames';
import { withUnit } from '../parts/limitWords';
import styles from './Rail.module.css';
import { RAIL } from './railLayout';
import { type RailScale, toFraction } from './railScale';
import type { StockMark } from './stockOnRail';

/** A faint mark for each stock in the mix; an arrowhead at the edge for those off the scale. */
export function RailStocks({
  marks,
  definition,
  scale,
  x,
  stale,
}: {
  marks: readonly StockMark[];
  definition: PropertyDefinition;
  scale: RailScale;
  x(value: number): number;
  stale: boolean;
}) {
  return (
    <g className={classNames(styles.stocks, stale && styles.stale)}>
      {marks.map((mark) => (
        <path key={mark.stockId} className={styles.stock} d={shape(toFraction(scale, mark.value), x(mark.value))}>
          <title>{`${mark.name}: ${withUnit(mark.value, definition)}`}</title>
        </path>
      ))}
    </g>
  );
}

function shape(fraction: number, at: number): string {
  const middle = (RAIL.trackBottom + RAIL.marksBottom) / 2 + 1;
  if (fraction < 0) return `M${at - 3} ${middle - 4}v8l-6 -4z`;
  if (fraction > 1) return `M${at + 3} ${middle - 4}v8l6 -4z`;
  return `M${at - 1} ${RAIL.trackBottom + 1}h2v${RAIL.marksBottom - RAIL.trackBottom - 1}h-2z`;
}
