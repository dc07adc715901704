import type { Order, SolveProgress } from '../../src';
import { Button } from '../parts/Button';
import { formatMoney } from '../parts/money';
import { formatNumber } from '../parts/numberText';
import { useCommands } from '../state/commands';
import styles from './AnswerPanel.module.css';
import { hasAim } from './proofInWords';

/** How far a long search has come, and the way to end it. */
export function Progress({
  progress,
  currency,
  order,
}: {
  progress: SolveProgress | undefined;
  currency: string;
  order: SearchedOrder;
}) {
  const { cancelSolve } = useCommands();
  return (
    <div className={styles.progress}>
      <span>{progressInWords(progress, currency, order)}</span>
      <Button disabled={!cancelSolve.enabled()} onClick={() => cancelSolve.run()}>
        {cancelSolve.label}
      </Button>
    </div>
  );
}

type SearchedOrder = Pick<Order, 'costBasis' | 'limits'>;

/**
 * "Searching, 3 s: best so far €1,182.00 per tonne; proven: none below €1,180.10 per tonne." The best cost is plain
 * and per tonne; the bound is one on what the search makes least, so the two are not subtracted.
 */
export function progressInWords(
  progress: SolveProgress | undefined,
  currency: string,
  { costBasis, limits }: SearchedOrder,
): string {
  if (!progress) return 'Searching …';
  const { milliseconds, bestCost, lowerBound } = progress;
  const perVolume = costBasis === 'cubic metre';
  const parts: string[] = [];
  if (bestCost !== undefined) parts.push(`best so far ${formatMoney(bestCost, currency)} per tonne`);
  // Per m³ the search does not tell what it has found yet.
  else if (!perVolume) parts.push('no recipe yet');
  if (lowerBound !== undefined && Number.isFinite(lowerBound)) {
    const withAims = hasAim(limits) ? ', aims counted in' : '';
    const bound = `${formatMoney(lowerBound, currency)} per ${perVolume ? 'm³' : 'tonne'}${withAims}`;
    parts.push(`proven: none below ${bound}`);
  } else if (bestCost !== undefined) parts.push('nothing proven yet');
  const start = `Searching, ${formatNumber(milliseconds / 1000, 0)} s`;
  return parts.length > 0 ? `${start}: ${parts.join('; ')}.` : `${start} …`;
}
