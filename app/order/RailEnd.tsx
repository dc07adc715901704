import type { Limit, PropertyDefinition } from '../../src';
import { classNames } from '../parts/classNames';
import { type End, upperEnd } from '../parts/limitEnds';
import { limitName, withUnit } from '../parts/limitWords';
import styles from './Rail.module.css';
import { RAIL } from './railLayout';
import type { RailScale } from './railScale';
import { useEndDrag } from './useEndDrag';

/** One end of the allowed zone, to be taken by pointer, finger or keys. */
export function RailEnd({
  end,
  value,
  other,
  limit,
  definition,
  scale,
  width,
  x,
  onMove,
  onEnd,
  onDragging,
}: {
  end: End;
  value: number;
  /** The opposite end; a drag stops there (typing may pass it, and is then told so). */
  other: number | undefined;
  limit: Limit;
  definition: PropertyDefinition;
  scale: RailScale;
  width: number;
  x(value: number): number;
  onMove(end: End, value: number): void;
  onEnd(): void;
  onDragging(dragging: boolean): void;
}) {
  const { sense, reportingUnit } = definition;
  const crossed = other !== undefined && (end === 'min' ? value > other : value < other);
  const bound = crossed ? undefined : other;
  const { dragging, handlers } = useEndDrag({
    value,
    scale,
    width,
    left: RAIL.margin,
    reportingUnit,
    least: end === 'max' && bound !== undefined ? bound : sense.min,
    most: end === 'min' && bound !== undefined ? bound : sense.max,
    onMove: (next) => onMove(end, next),
    onEnd,
    onDragging,
  });
  const at = x(value);
  // The grip stands on the outer side of its end, so that two ends close together can still be told apart.
  const grip = end === 'min' ? at - 7 : at + 1;
  const word = end === 'min' ? 'least' : upperEnd(limit).strict ? 'below' : 'most';
  return (
    <g
      className={classNames(styles.end, dragging && styles.dragging)}
      role="slider"
      tabIndex={0}
      aria-label={`${limitName(limit)}, ${word}`}
      aria-valuemin={Math.min(scale.lo, value)}
      aria-valuemax={Math.max(scale.hi, value)}
      aria-valuenow={value}
      aria-valuetext={withUnit(value, definition)}
      aria-orientation="horizontal"
      {...handlers}
    >
      <rect className={styles.target} x={end === 'min' ? at - 30 : at - 6} y={4} width={36} height={44} />
      <line className={styles.edge} x1={at} x2={at} y1={RAIL.trackTop - 1} y2={RAIL.trackBottom + 1} />
      <rect
        className={styles.grip}
        x={grip}
        y={RAIL.trackTop}
        width={6}
        height={RAIL.trackBottom - RAIL.trackTop}
        rx={2}
      />
    </g>
  );
}
