import { type ComponentProps, lazy, memo, Suspense, useDeferredValue, useMemo } from 'react';
import type { BlendOutcome, Order } from '../../src';
import { ErrorBoundary } from '../parts/ErrorBoundary';
import { usePaced } from '../parts/usePaced';
import { useWidth } from '../parts/useWidth';
import { ChartTable } from './ChartTable';
import { CHART_HEIGHT, plotSize } from './chartLayout';
import { chartScene } from './chartScene';
import styles from './ViscosityChart.module.css';
import { viscosityLines } from './viscosityLines';
import { viscosityWindows } from './viscosityWindows';

/** Recharts is a third of the page's weight: it is fetched when the rest is already on screen. */
const fetched = () => lazy(() => import('./ViscosityChart'));

/** Drawing the chart takes about as long as all the rest of an answer. */
const REDRAWN_EVERY_MS = 150;

let Fetched = fetched();

/** React keeps a download that failed for good: another try needs a new one. */
function fetchAgain(): void {
  Fetched = fetched();
}

function Drawn(props: ComponentProps<typeof Fetched>) {
  return <Fetched {...props} />;
}

interface ChartProps {
  order: Order;
  outcome: BlendOutcome;
}

/** The viscosity-temperature chart of a recipe, its table, and what not to read into it. */
export function LazyViscosityChart({ order, outcome }: ChartProps) {
  const answer = useMemo(() => ({ order, outcome }), [order, outcome]);
  // The chart may lag behind while a limit is dragged; numbers may not.
  const drawn = useDeferredValue(usePaced(answer, REDRAWN_EVERY_MS));
  return (
    <ErrorBoundary what="The chart" onRetry={fetchAgain}>
      <Chart order={drawn.order} outcome={drawn.outcome} />
    </ErrorBoundary>
  );
}

const Chart = memo(function Chart({ order, outcome }: ChartProps) {
  const [frame, width] = useWidth<HTMLDivElement>(400);
  const lines = useMemo(() => viscosityLines(order, outcome), [order, outcome]);
  const windows = useMemo(() => viscosityWindows(order, outcome), [order, outcome]);
  const scene = useMemo(() => chartScene(lines, windows, plotSize(width)), [lines, windows, width]);
  if (lines.length === 0) return <p className={styles.note}>No line: viscosities at two temperatures are needed.</p>;
  const grade = windows.find(({ kind }) => kind === 'grade');
  return (
    <div ref={frame} className={styles.frame}>
      <Suspense fallback={<Placeholder width={width} />}>
        <div
          className={styles.chart}
          role="img"
          aria-label="Viscosity against temperature on ASTM D341 axes. The table below it says the same."
        >
          <Drawn scene={scene} width={width} />
        </div>
      </Suspense>
      <p className={styles.key}>
        <span>mm²/s on ASTM D341 axes</span>
        {windows.some(({ kind }) => kind === 'limit') && <span className={styles.limitKey}>limit</span>}
        {grade && <span className={styles.gradeKey}>{grade.name}</span>}
      </p>
      <p className={styles.note}>
        Dashed: extrapolated beyond the known points. It means nothing below the cloud or pour point.
      </p>
      <ChartTable lines={lines} windows={windows} />
    </div>
  );
});

function Placeholder({ width }: { width: number }) {
  return (
    <div className={styles.placeholder} style={{ width, height: CHART_HEIGHT }}>
      The chart is on its way …
    </div>
  );
}
