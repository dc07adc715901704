import { useRef, useState } from 'react';
import type { Limit, PropertyDefinition } from '../../src';
import { type End, upperEnd } from '../parts/limitEnds';
import { formatNumber } from '../parts/numberText';
import { useWidth } from '../parts/useWidth';
import styles from './Rail.module.css';
import { RailEnd } from './RailEnd';
import { RailMix } from './RailMix';
import { RailStocks } from './RailStocks';
import { RailZone } from './RailZone';
import { RAIL } from './railLayout';
import { keepScale, type RailScale, scaleNumbers, toFraction } from './railScale';
import type { StockMark } from './stockOnRail';

export interface RailProps {
  limit: Limit;
  definition: PropertyDefinition;
  /** Value of the mix, where there is a recipe. */
  mix?: number;
  passes?: boolean;
  /** The answer is of an earlier order: greyed, never removed. */
  stale: boolean;
  marks: readonly StockMark[];
  onMove(end: End, value: number): void;
  onEnd(): void;
}

/** A limit as a scale: what is allowed, the margin inside it, the mix, and the stocks that pull it. */
export function Rail({ limit, definition, mix, passes, stale, marks, onMove, onEnd }: RailProps) {
  const [ref, width] = useWidth<HTMLDivElement>(320);
  const [dragging, setDragging] = useState(false);
  const kept = useRef<RailScale>(undefined);
  const upper = upperEnd(limit).value;

  if (!dragging || !kept.current) {
    kept.current = keepScale(kept.current, {
      values: [limit.min, upper, limit.aim, mix].filter((value) => value !== undefined),
      logarithmic: definition.index === 'viscosity' || definition.index === 'logarithmic',
      reportingUnit: definition.reportingUnit,
      sense: definition.sense,
    });
  }
  const scale = kept.current;
  const inner = Math.max(width - 2 * RAIL.margin, 40);
  const x = (value: number) => RAIL.margin + Math.min(Math.max(toFraction(scale, value), 0), 1) * inner;
  const shared = { limit, definition, scale, width: inner, onMove, onEnd, onDragging: setDragging };

  return (
    <div ref={ref} className={styles.rail}>
      {/* biome-ignore lint/a11y/noSvgWithoutTitle: its ends name themselves; a title would cover those of the marks */}
      <svg width={width} height={RAIL.height}>
        <ScaleNumbers scale={scale} x={x} most={Math.floor(inner / 70)} />
        <line className={styles.track} x1={RAIL.margin} x2={RAIL.margin + inner} y1={RAIL.middle} y2={RAIL.middle} />
        <RailZone limit={limit} definition={definition} x={x} right={RAIL.margin + inner} />
        <RailStocks marks={marks} definition={definition} scale={scale} x={x} stale={stale} />
        {limit.aim !== undefined && (
          <path className={styles.aim} d={`M${x(limit.aim)} 19l5 5-5 5-5-5z`}>
            <title>{`aim ${formatNumber(limit.aim, definition.digits)}`}</title>
          </path>
        )}
        {limit.min !== undefined && <RailEnd end="min" value={limit.min} other={upper} x={x} {...shared} />}
        {upper !== undefined && <RailEnd end="max" value={upper} other={limit.min} x={x} {...shared} />}
        {mix !== undefined && (
          <RailMix
            value={mix}
            definition={definition}
            scale={scale}
            x={x}
            width={width}
            passes={passes}
            stale={stale}
          />
        )}
      </svg>
    </div>
  );
}

function ScaleNumbers({ scale, x, most }: { scale: RailScale; x(value: number): number; most: number }) {
  const numbers = scaleNumbers(scale, Math.max(most, 2));
  const digits = Math.max(0, ...numbers.map((value) => (String(value).split('.')[1] ?? '').length));
  return (
    // biome-ignore lint/a11y/noAriaHiddenOnFocusable: the numbers of a scale take no focus
    <g aria-hidden="true">
      {spread(numbers, x).map((value) => (
        <g key={value}>
          <line className={styles.gridMark} x1={x(value)} x2={x(value)} y1={RAIL.middle - 2} y2={RAIL.middle + 2} />
          <text className={styles.number} x={x(value)} y={RAIL.numbers}>
            {formatNumber(value, digits)}
          </text>
        </g>
      ))}
    </g>
  );
}

/** Leaves out numbers that would stand on one another. */
function spread(numbers: readonly number[], x: (value: number) => number): number[] {
  let last = -Infinity;
  return numbers.filter((value) => {
    const fits = x(value) - last >= 34;
    if (fits) last = x(value);
    return fits;
  });
}
