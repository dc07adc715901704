import { type KeyboardEvent, useId, useState } from 'react';
import { classNames } from './classNames';
import styles from './field.module.css';

export interface TextFieldProps {
  label: string;
  value: string;
  onCommit(value: string): void;
  hideLabel?: boolean;
  placeholder?: string;
  /** Why the text is not taken, or nothing. The text stays in the field. */
  check?(text: string): string | undefined;
  /** Several lines; Enter then starts a new one. */
  rows?: number;
  /** One line of text that may be shown on several; Enter commits. */
  wrap?: boolean;
  className?: string;
  controlClassName?: string;
}

/** A text, committed by Enter or on leaving; Escape goes back. */
export function TextField({
  label,
  value,
  onCommit,
  hideLabel,
  placeholder,
  check,
  rows,
  wrap,
  className,
  controlClassName,
}: TextFieldProps) {
  const id = useId();
  const [draft, setDraft] = useState<string>();
  const [problem, setProblem] = useState<string>();

  function commit() {
    if (draft === undefined) return;
    const refused = check?.(draft);
    setProblem(refused);
    if (refused) return;
    setDraft(undefined);
    if (draft !== value) onCommit(draft);
  }

  function onKeyDown(event: KeyboardEvent) {
    if (event.key === 'Enter' && !rows) {
      event.preventDefault();
      commit();
    }
    if (event.key === 'Escape' && draft !== undefined) {
      // In a dialog the first Escape is for the draft, not for closing.
      event.preventDefault();
      event.stopPropagation();
      setDraft(undefined);
      setProblem(undefined);
    }
  }

  const shared = {
    id,
    value: draft ?? value,
    placeholder,
    onKeyDown,
    onBlur: commit,
    onChange: (event: { target: { value: string } }) =>
      setDraft(wrap ? event.target.value.replace(/\s*\n\s*/g, ' ') : event.target.value),
    className: classNames(styles.control, styles.text, (rows !== undefined || wrap) && styles.grows, controlClassName),
    'aria-invalid': problem ? true : undefined,
    'aria-describedby': problem ? `${id}-problem` : undefined,
    'data-dirty': draft !== undefined || undefined,
  };

  return (
    <span className={classNames(styles.field, className)}>
      <label htmlFor={id} className={hideLabel ? 'visually-hidden' : styles.label}>
        {label}
      </label>
      {rows || wrap ? <textarea rows={rows ?? 1} {...shared} /> : <input type="text" autoComplete="off" {...shared} />}
      {problem && (
        <span id={`${id}-problem`} className={styles.problem} role="status">
          {problem}
        </span>
      )}
    </span>
  );
}
