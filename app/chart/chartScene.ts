import { logTemperature, waltherIndex } from '../../src';
import { placeOfKv, type Tick, temperatureTicks, viscosityTicks } from './d341Axes';
import { isExtrapolated, kvOnLine, type ViscosityLine } from './viscosityLines';
import type { ViscosityWindow } from './viscosityWindows';

/** A place on the D341 axes. */
export interface Place {
  x: number;
  y: number;
}

/** A line cut into what was measured and what is extrapolated. */
export interface DrawnLine {
  id: string;
  name: string;
  isMix: boolean;
  solid: Place[];
  dashed: Place[][];
  /** The warm end, where the name stands. */
  end: Place | undefined;
}

export interface DrawnWindow {
  key: string;
  kind: ViscosityWindow['kind'];
  name: string;
  x1: number;
  x2: number;
  y1: number;
  y2: number;
}

/** Everything the chart draws, in places on the D341 axes. */
export interface ChartScene {
  xDomain: [number, number];
  yDomain: [number, number];
  temperatures: Tick[];
  viscosities: Tick[];
  lines: DrawnLine[];
  windows: DrawnWindow[];
}

const USUAL = { coldest: 0, warmest: 120 };
/** Half-widths of the bars [°C]; a grade's bar is drawn behind a limit's. */
const HALF_WIDTH = { limit: 3.5, grade: 6 };

function temperatureRange(lines: readonly ViscosityLine[], windows: readonly ViscosityWindow[]) {
  const all = [
    ...lines.flatMap(({ points }) => points.map(({ celsius }) => celsius)),
    ...windows.map(({ celsius }) => celsius),
  ];
  const beyond = (celsius: number, by: number) => Math.round((celsius + by) / 10) * 10;
  return {
    coldest: Math.min(USUAL.coldest, ...all.filter((celsius) => celsius <= USUAL.coldest).map((c) => beyond(c, -10))),
    warmest: Math.max(USUAL.warmest, ...all.filter((celsius) => celsius >= USUAL.warmest).map((c) => beyond(c, 10))),
  };
}

function placeAt(line: ViscosityLine, celsius: number): Place | undefined {
  const kv = kvOnLine(line, celsius);
  const y = kv === undefined ? undefined : placeOfKv(kv);
  return y === undefined ? undefined : { x: logTemperature(celsius), y };
}

function drawn(line: ViscosityLine, coldest: number, warmest: number): DrawnLine {
  const solid = line.points.map(({ celsius, kv }) => ({ x: logTemperature(celsius), y: waltherIndex(kv) }));
  const first = solid[0];
  const last = solid.at(-1);
  const cold = isExtrapolated(line, coldest) ? placeAt(line, coldest) : undefined;
  const warm = isExtrapolated(line, warmest) ? placeAt(line, warmest) : undefined;
  const dashed = [cold && first ? [cold, first] : [], last && warm ? [last, warm] : []].filter(
    ({ length }) => length > 0,
  );
  return { id: line.id, name: line.name, isMix: line.isMix, solid, dashed, end: warm ?? last };
}

function drawnWindow(window: ViscosityWindow, key: number, [low, high]: [number, number]): DrawnWindow[] {
  const { kind, name, celsius, min, max } = window;
  const half = HALF_WIDTH[kind];
  const y1 = min === undefined ? low : placeOfKv(min);
  const y2 = max === undefined ? high : placeOfKv(max);
  if (y1 === undefined || y2 === undefined) return [];
  return [
    {
      key: `${kind} ${key}`,
      kind,
      name,
      x1: logTemperature(celsius - half),
      x2: logTemperature(celsius + half),
      y1,
      y2,
    },
  ];
}

/** Least distance of two tick labels [px]. */
const TICKS_APART = { x: 28, y: 16 };

/** Lays out lines and windows on the D341 axes for a plot of so many pixels. */
export function chartScene(
  lines: readonly ViscosityLine[],
  windows: readonly ViscosityWindow[],
  plot: { width: number; height: number },
): ChartScene {
  const { coldest, warmest } = temperatureRange(lines, windows);
  const drawnLines = lines.map((line) => drawn(line, coldest, warmest));
  const ys = [
    ...drawnLines.flatMap(({ solid, dashed }) => [...solid, ...dashed.flat()].map(({ y }) => y)),
    ...windows.flatMap(({ min, max }) => [min, max].flatMap((kv) => (kv === undefined ? [] : (placeOfKv(kv) ?? [])))),
  ];
  const [low, high] = ys.length ? [Math.min(...ys), Math.max(...ys)] : [waltherIndex(2), waltherIndex(1000)];
  const room = Math.max(0.02, 0.04 * (high - low));
  const yDomain: [number, number] = [low - room, high + room];
  const xDomain: [number, number] = [logTemperature(coldest), logTemperature(warmest)];
  const apartX = (TICKS_APART.x * (xDomain[1] - xDomain[0])) / plot.width;
  const apartY = (TICKS_APART.y * (yDomain[1] - yDomain[0])) / plot.height;
  return {
    xDomain,
    yDomain,
    temperatures: temperatureTicks(coldest, warmest, apartX),
    viscosities: viscosityTicks(0.5, 1e7, apartY).filter(({ at }) => at >= yDomain[0] && at <= yDomain[1]),
    lines: drawnLines,
    windows: windows.flatMap((window, place) => drawnWindow(window, place, yDomain)),
  };
}
