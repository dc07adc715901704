import { CartesianGrid, Line, LineChart, ReferenceArea, XAxis, YAxis } from 'recharts';
import { classNames } from '../parts/classNames';
import { formatNumber } from '../parts/numberText';
import { CHART_HEIGHT, MARGIN, plotSize, X_AXIS_HEIGHT, Y_AXIS_WIDTH } from './chartLayout';
import type { ChartScene, DrawnLine } from './chartScene';
import { labelPlaces } from './labelPlaces';
import styles from './ViscosityChart.module.css';

/** Recharts colours its texts on the element itself, where no style sheet reaches. */
const TEXT = { fill: 'var(--ink-soft)', fontSize: 11 };
/** Height of a name [px]. */
const LABEL_HEIGHT = 13;
/** Letters of a name that fit beside the plot. */
const LABEL_LETTERS = 18;

/** The lines and windows on D341 axes. Names stand at the lines' warm ends. */
export default function ViscosityChart({ scene, width }: { scene: ChartScene; width: number }) {
  const { xDomain, yDomain, temperatures, viscosities, lines, windows } = scene;
  const plot = plotSize(width);
  const labelled = lines.filter(({ end }) => end !== undefined);
  const pixels = labelled.map(
    ({ end }) => MARGIN.top + plot.height * (1 - ((end?.y ?? 0) - yDomain[0]) / (yDomain[1] - yDomain[0])),
  );
  const places = labelPlaces(pixels, LABEL_HEIGHT, MARGIN.top, MARGIN.top + plot.height);
  const labels = new Map(viscosities.map(({ at, value }) => [at, value]));
  const celsius = new Map(temperatures.map(({ at, value }) => [at, value]));
  return (
    <LineChart width={width} height={CHART_HEIGHT} margin={MARGIN} accessibilityLayer={false}>
      <CartesianGrid />
      <XAxis
        type="number"
        dataKey="x"
        domain={xDomain}
        ticks={temperatures.map(({ at }) => at)}
        tickFormatter={(at: number) => formatNumber(celsius.get(at), 0)}
        interval={0}
        tick={TEXT}
        height={X_AXIS_HEIGHT}
        allowDataOverflow
        label={{ value: 'Temperature, °C', position: 'insideBottom', offset: 4, style: TEXT }}
      />
      <YAxis
        type="number"
        dataKey="y"
        domain={yDomain}
        ticks={viscosities.map(({ at }) => at)}
        tickFormatter={(at: number) => kvText(labels.get(at))}
        interval={0}
        tick={TEXT}
        width={Y_AXIS_WIDTH}
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
      {PENS.map((pen) => (
        <Line
          key={pen.name}
          data={strokes(lines, pen)}
          dataKey="y"
          type="linear"
          isAnimationActive={false}
          activeDot={false}
          dot={pen.dots && { r: 2, className: styles.dot }}
          className={classNames(styles.line, pen.mix && styles.mix, pen.dashed && styles.dashed)}
        />
      ))}
      {labelled.map(({ id, name, isMix }, place) => (
        <text
          key={id}
          x={width - MARGIN.right + 6}
          y={(places[place] ?? 0) + 4}
          className={classNames(styles.label, isMix && styles.mixLabel)}
        >
          {name.length > LABEL_LETTERS ? `${name.slice(0, LABEL_LETTERS - 1).trimEnd()}…` : name}
          {name.length > LABEL_LETTERS && <title>{name}</title>}
        </text>
      ))}
    </LineChart>
  );
}

/** A tick of the viscosity axis; 10⁵ and up as powers, which the narrow axis has room for. */
function kvText(kv: number | undefined): string {
  if (kv === undefined) return '';
  const power = POWERS[kv];
  return power ?? formatNumber(kv, Number.isInteger(kv) ? 0 : 1);
}

const POWERS: Readonly<Record<number, string>> = { 1e5: '10⁵', 1e6: '10⁶', 1e7: '10⁷' };

/** The mix is drawn last, over the stocks. Its line is calculated, so it has no points. */
const PENS = [
  { name: 'stocks dashed', mix: false, dashed: true, dots: false },
  { name: 'stocks', mix: false, dashed: false, dots: true },
  { name: 'mix dashed', mix: true, dashed: true, dots: false },
  { name: 'mix', mix: true, dashed: false, dots: false },
] as const;

/**
 * Everything one pen draws, as a single line with gaps: Recharts takes several milliseconds for each of its lines,
 * whatever is in it, and the chart has to keep up with a limit being dragged.
 */
function strokes(lines: readonly DrawnLine[], { mix, dashed }: (typeof PENS)[number]) {
  const parts = lines
    .filter(({ isMix }) => isMix === mix)
    .flatMap((line) => (dashed ? line.dashed : [line.solid]))
    .filter(({ length }) => length > 0);
  return parts.flatMap((part) => [...part, { x: part.at(-1)?.x, y: null }]);
}
