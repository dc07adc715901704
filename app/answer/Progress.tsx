import type { SolveProgress, WorkbookOrder } from '../../src';
import { Button } from '../parts/Button';
import { formatMoney } from '../parts/money';
import { formatNumber } from '../parts/numberText';
import { useCommands } from '../state/commands';
import styles from './AnswerPanel.module.css';
import { percentUp } from './proofInWords';

/** How far a long search has come, and the way to end it. */
export function Progress({
  progress,
  currency,
  costBasis,
}: {
  progress: SolveProgress | undefined;
  currency: string;
  costBasis: WorkbookOrder['costBasis'];
}) {
  const { cancelSolve } = useCommands();
  return (
    <div className={styles.progress}>
      <span>{progressInWords(progress, currency, costBasis === 'cubic metre' ? 'per m³' : 'per tonne')}</span>
      <Button disabled={!cancelSolve.enabled()} onClick={() => cancelSolve.run()}>
        {cancelSolve.label}
      </Button>
    </div>
  );
}

/** "Searching, 3 s: best so far €1,182.00 per tonne, no recipe below €1,180.10: at most 0.17 % to gain." */
export function progressInWords(progress: SolveProgress | undefined, currency: string, measure: string): string {
  if (!progress) return 'Searching …';
  const { milliseconds, bestCost, lowerBound } = progress;
  const start = `Searching, ${formatNumber(milliseconds / 1000, 0)} s`;
  if (bestCost === undefined) return `${start}: no recipe yet.`;
  const best = `${start}: best so far ${formatMoney(bestCost, currency)} ${measure}`;
  if (lowerBound === undefined || !Number.isFinite(lowerBound)) return `${best}; nothing proven yet.`;
  const gap = bestCost === 0 ? undefined : (bestCost - lowerBound) / Math.abs(bestCost);
  const left = gap === undefined ? '' : `, at most ${percentUp(gap)} to gain`;
  return `${best}; proven: none below ${formatMoney(lowerBound, currency)}${left}.`;
}
