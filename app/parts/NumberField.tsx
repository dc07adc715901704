import { useEffect, useId } from 'react';
import { classNames } from './classNames';
import styles from './field.module.css';
import { type NumberDraftOptions, useNumberDraft } from './useNumberDraft';

export interface NumberFieldProps extends NumberDraftOptions {
  label: string;
  unit?: string;
  /** The unit is read aloud only; the page shows it elsewhere. */
  hideUnit?: boolean;
  /** Read aloud before the label where the page shows it elsewhere: the row's name. */
  context?: string;
  /** The label is read aloud only. */
  hideLabel?: boolean;
  /** Label to the left instead of above. */
  inline?: boolean;
  placeholder?: string;
  disabled?: boolean;
  /** Something wrong with the value that only the caller can know ("above the most"). */
  problem?: string;
  /** Id of a message elsewhere that says what is wrong with the value. */
  problemId?: string;
  /**
   * Told what is wrong with the typed text, for a caller that shows it where there is room (and names the place in
   * `problemId`); the field then shows no message of its own.
   */
  onProblem?(message: string | undefined): void;
  hint?: string;
  className?: string;
}

/**
 * A number with its unit. What is typed stays as typed until it is read: Enter or leaving the field commits, Escape
 * goes back, arrow keys step (Shift: ten steps). A text that cannot be read stays, with the reason below it.
 */
export function NumberField({
  label,
  unit,
  hideUnit,
  context,
  hideLabel,
  inline,
  placeholder,
  disabled,
  problem,
  problemId,
  onProblem,
  hint,
  className,
  ...draftOptions
}: NumberFieldProps) {
  const id = useId();
  const draft = useNumberDraft(draftOptions);
  const message = onProblem ? undefined : (draft.problem ?? (draft.dirty ? undefined : problem));

  // biome-ignore lint/correctness/useExhaustiveDependencies: the caller is told once for each message
  useEffect(() => onProblem?.(draft.problem), [draft.problem]);

  const describedBy = [message && `${id}-problem`, problemId, hint && `${id}-hint`].filter(Boolean).join(' ');
  return (
    <span className={classNames(styles.field, inline && styles.inline, className)}>
      <label htmlFor={id} className={hideLabel ? 'visually-hidden' : styles.label}>
        {label}
        {unit && <span className="visually-hidden">, {unit}</span>}
      </label>
      <span className={styles.box}>
        <input
          id={id}
          aria-label={context && [context, label, unit].filter(Boolean).join(', ')}
          className={classNames(styles.control, styles.number)}
          type="text"
          inputMode="decimal"
          autoComplete="off"
          spellCheck={false}
          placeholder={placeholder}
          disabled={disabled}
          aria-invalid={message || problemId || draft.problem ? true : undefined}
          aria-describedby={describedBy || undefined}
          data-dirty={draft.dirty || undefined}
          {...draft.inputProps}
        />
        {unit && !hideUnit && (
          <span className={styles.unit} aria-hidden="true">
            {unit}
          </span>
        )}
      </span>
      {message && (
        <span id={`${id}-problem`} className={styles.problem} role="status">
          {message}
        </span>
      )}
      {hint && (
        <span id={`${id}-hint`} className={styles.hint}>
          {hint}
        </span>
      )}
    </span>
  );
}
