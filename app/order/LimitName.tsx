import { useId } from 'react';
import type { LimitCheck, PropertyDefinition } from '../../src';
import { classNames } from '../parts/classNames';
import { Icon } from '../parts/Icon';
import { roomInWords, unitOf } from '../parts/limitWords';
import styles from './LimitList.module.css';

/** The name of a limit, which opens the rest of it; its method as a tip; how the mix stands to it. */
export function LimitName({
  name,
  definition,
  check,
  stale,
  open,
  onToggle,
  detailsId,
}: {
  name: string;
  definition: PropertyDefinition;
  check: LimitCheck | undefined;
  stale: boolean;
  open: boolean;
  onToggle(): void;
  detailsId: string;
}) {
  const tipId = useId();
  return (
    <div className={styles.name}>
      <button
        type="button"
        className={styles.nameButton}
        aria-expanded={open}
        aria-controls={detailsId}
        aria-describedby={tipId}
        onClick={onToggle}
      >
        <Icon name="right" />
        {name}
        <span id={tipId} className={styles.tip} aria-hidden="true">
          {definition.method}
        </span>
      </button>
      <div className={styles.status}>
        {unitOf(definition) && <span>{unitOf(definition)}</span>}
        {check && (
          <span
            className={classNames(
              check.onLimit && styles.tight,
              !check.passes && styles.outside,
              stale && styles.stale,
            )}
          >
            {roomInWords(check, definition)}
          </span>
        )}
      </div>
    </div>
  );
}
