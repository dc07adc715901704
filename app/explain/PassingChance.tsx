import { chanceOfPassing, type LimitCheck } from '../../src';
import { classNames } from '../parts/classNames';
import { formatNumber } from '../parts/numberText';
import type { Answer } from '../state/answerStore';
import styles from './Explain.module.css';

/** "97 %", "over 99.9 %", "under 0.1 %": a chance is never shown as certain. */
export function chanceInWords(chance: number): string {
  const percent = chance * 100;
  if (percent > 99.9) return `over ${formatNumber(99.9, 1)} %`;
  if (percent < 0.1) return `under ${formatNumber(0.1, 1)} %`;
  return `${formatNumber(percent, percent > 99 || percent < 1 ? 1 : 0)} %`;
}

/** How surely one result of a laboratory lies within a limit, where the method's precision is known. */
export function PassingChance({
  answer: { order, outcome },
  check,
  stale,
}: {
  answer: Answer;
  check: LimitCheck | undefined;
  stale: boolean;
}) {
  const chance = check && order && chanceOfPassing(check, order, outcome?.properties);
  if (chance === undefined) return null;
  return (
    <p className={classNames(styles.chance, stale && styles.stale)}>
      Chance that one test result passes if the mix is as predicted: <b>{chanceInWords(chance)}</b>{' '}
      <span className={styles.soft}>(by the method’s reproducibility, normal distribution)</span>
    </p>
  );
}
