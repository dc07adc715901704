import { logTemperature, waltherIndex } from '../../src';
import { COLDEST, WARMEST } from './chartLayout';
import { placeOfKv, type Tick, temperatureTicks, viscosityTicks } from './d341Axes';
import { kvOnLine, type ViscosityLine } from './viscosityLines';
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

/** Half-widths of the bars [°C]; a grade's bar is drawn behind a limit's. */
const HALF_WIDTH = { limit: 3.5, grade: 6 };

/** The chart's temperatures [°C]; wider where a measured point or a limit lies outside. */
function temperatureRange(lines: readonly ViscosityLine[], windows: readonly ViscosityWindow[]) {
  const all = [...lines.flatMap(({ known }) => known), ...windows.map(({ celsius }) => celsius)];
  const coldest = Math.min(...all);
  const warmest = Math.max(...all);
  return {
    coldest: coldest < COLDEST ? Math.floor(coldest / 10) * 10 : COLDEST,
    warmest: warmest > WARMEST ? Math.ceil(warmest / 10) * 10 : WARMEST,
  };
}

function placeAt(line: ViscosityLine, celsius: number): Place | undefined {
  const kv = kvOnLine(line, celsius);
  const y = kv === undefined ? undefined : placeOfKv(kv);
  return y === undefined ? undefined : { x: logTemperature(celsius), y };
}

/** A line through all its bends within the chart, cut at the ends of what its figures carry. */
function drawn(line: ViscosityLine, coldest: number, warmest: number): DrawnLine {
  const [from, to] = line.known;
  const bends = line.points.map(({ celsius }) => celsius).filter((celsius) => celsius > coldest && celsius < warmest);
  const temperatures = [...new Set([coldest, ...bends, from, to, warmest])].sort((a, b) => a - b);
  const part = (low: number, high: number) =>
    temperatures
      .filter((celsius) => celsius >= low && celsius <= high)
      .flatMap((celsius) => placeAt(line, celsius) ?? []);
  const dashed = [part(coldest, from), part(to, warmest)].filter(({ length }) => length > 1);
  const solid = part(from, to);
  return { id: line.id, name: line.name, isMix: line.isMix, solid, dashed, end: dashed.at(-1)?.at(-1) ?? solid.at(-1) };
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

/** Where the viscosity axis may begin and end [mm²/s]: coarse steps, so that it stays put while the mix moves. */
const BOUNDS = [0.21, 0.5, 1, 1.5, 2, 3, 5, 10, 20, 50, 100, 1e3, 1e4, 1e5, 1e6, 1e7, 2e7].map(waltherIndex);

function boundsAround(places: readonly number[]): [number, number] {
  const least = Math.min(...places);
  const most = Math.max(...places);
  const low = BOUNDS.findLast((bound) => bound <= least);
  const high = BOUNDS.find((bound) => bound >= most);
  return low === undefined || high === undefined || low >= high ? [waltherIndex(1), waltherIndex(1e3)] : [low, high];
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
  const yDomain = boundsAround(ys);
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
