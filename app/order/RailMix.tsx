import type { PropertyDefinition } from '../../src';
import { classNames } from '../parts/classNames';
import { formatNumber } from '../parts/numberText';
import styles from './Rail.module.css';
import { RAIL } from './railLayout';
import { type RailScale, toFraction } from './railScale';

/** The value of the mix: a tick across the track with its number above it. */
export function RailMix({
  value,
  definition,
  scale,
  x,
  width,
  passes,
  stale,
}: {
  value: number;
  definition: PropertyDefinition;
  scale: RailScale;
  x(value: number): number;
  width: number;
  passes?: boolean;
  stale: boolean;
}) {
  const at = x(value);
  const fraction = toFraction(scale, value);
  const text = `${fraction < 0 ? '◂ ' : ''}${formatNumber(value, definition.digits)}${fraction > 1 ? ' ▸' : ''}`;
  const half = text.length * 3.8;
  return (
    <g
      className={classNames(styles.mix, passes === false && styles.outside, stale && styles.stale)}
      data-testid="mix"
      data-stale={stale || undefined}
    >
      <line x1={at} x2={at} y1={RAIL.trackTop - 3} y2={RAIL.trackBottom + 3} />
      <text x={Math.min(Math.max(at, half), width - half)} y={RAIL.mixNumber}>
        {text}
      </text>
    </g>
  );
}
