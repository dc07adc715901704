import { CartesianGrid, Line, LineChart, ReferenceArea, XAxis, YAxis } from 'recharts';
import { classNames } from '../parts/classNames';
import { formatNumber } from '../parts/numberText';
import type { ChartScene, DrawnLine } from './chartScene';
import { labelPlaces } from './labelPlaces';
import styles from './ViscosityChart.module.css';

const MARGIN = { top: 8, right: 108, bottom: 4, left: 0 };
const Y_AXIS = 46;
const X_AXIS = 40;
const LABEL_HEIGHT = 13;

/** Height left for the plot itself [px]. */
export function plotHeightOf(height: number): number {
  return height - MARGIN.top - MARGIN.bottom - X_AXIS;
}

/** The lines and windows on D341 axes. Names stand at the lines' warm ends. */
export default function ViscosityChart({ scene, width, height }: { scene: ChartScene; width: number; height: number }) {
  const { xDomain, yDomain, temperatures, viscosities, lines, windows } = scene;
  const plotHeight = plotHeightOf(height);
  const labelled = lines.filter(({ end }) => end !== undefined);
  const pixels = labelled.map(
    ({ end }) => MARGIN.top + plotHeight * (1 - ((end?.y ?? 0) - yDomain[0]) / (yDomain[1] - yDomain[0])),
  );
  const places = labelPlaces(pixels, LABEL_HEIGHT, MARGIN.top, height - MARGIN.bottom - X_AXIS);
  const labels = new Map(viscosities.map(({ at, value }) => [at, value]));
  const celsius = new Map(temperatures.map(({ at, value }) => [at, value]));
  return (
    <LineChart width={width} height={height} margin={MARGIN} accessibilityLayer={false} className={styles.chart}>
      <CartesianGrid className={styles.grid} />
      <XAxis
        type="number"
        dataKey="x"
        domain={xDomain}
        ticks={temperatures.map(({ at }) => at)}
        tickFormatter={(at: number) => formatNumber(celsius.get(at), 0)}
        interval={0}
        height={X_AXIS}
        allowDataOverflow
        label={{ value: 'Temperature, °C', position: 'insideBottom', offset: 4, className: styles.axisLabel }}
      />
      <YAxis
        type="number"
        dataKey="y"
        domain={yDomain}
        ticks={viscosities.map(({ at }) => at)}
        tickFormatter={(at: number) => kvText(labels.get(at))}
        interval={0}
        width={Y_AXIS}
        allowDataOverflow
      />
      {windows.map(({ key, kind, x1, x2, y1, y2 }) => (
        <ReferenceArea
          key={key}
          x1={x1}
          x2={x2}
          y1={y1}
          y2={y2}
          ifOverflow="hidden"
          className={kind === 'limit' ? styles.limit : styles.grade}
        />
      ))}
      {[...lines].reverse().flatMap(strokes)}
      {labelled.map(({ id, name, isMix }, place) => (
        <text
          key={id}
          x={width - MARGIN.right + 6}
          y={(places[place] ?? 0) + 4}
          className={classNames(styles.label, isMix && styles.mixLabel)}
        >
          {name.length > 17 ? `${name.slice(0, 16)}…` : name}
        </text>
      ))}
    </LineChart>
  );
}

function kvText(kv: number | undefined): string {
  if (kv === undefined) return '';
  return formatNumber(kv, Number.isInteger(kv) ? 0 : 1);
}

function strokes({ id, isMix, solid, dashed }: DrawnLine) {
  const shared = { dataKey: 'y', type: 'linear', isAnimationActive: false, activeDot: false } as const;
  const className = classNames(styles.line, isMix && styles.mix);
  return [
    ...dashed.map((data, place) => (
      <Line
        key={`${id} dashed ${data[0]?.x ?? place}`}
        {...shared}
        data={data}
        dot={false}
        className={classNames(className, styles.dashed)}
      />
    )),
    <Line key={`${id} solid`} {...shared} data={solid} dot={{ r: isMix ? 3 : 2 }} className={className} />,
  ];
}
