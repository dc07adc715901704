import { useId } from 'react';
import { classNames } from './classNames';
import styles from './field.module.css';

export interface SelectOption<Value extends string> {
  value: Value;
  label: string;
  disabled?: boolean;
}

export interface SelectGroup<Value extends string> {
  label: string;
  options: readonly SelectOption<Value>[];
}

export interface SelectProps<Value extends string> {
  label: string;
  value: Value | '';
  options: readonly (SelectOption<Value> | SelectGroup<Value>)[];
  onChange(value: Value): void;
  hideLabel?: boolean;
  inline?: boolean;
  /** Shown while nothing is chosen. */
  placeholder?: string;
  disabled?: boolean;
  hint?: string;
  className?: string;
}

/** The browser's own list of choices: known to every keyboard, finger and screen reader. */
export function Select<Value extends string>({
  label,
  value,
  options,
  onChange,
  hideLabel,
  inline,
  placeholder,
  disabled,
  hint,
  className,
}: SelectProps<Value>) {
  const id = useId();
  return (
    <span className={classNames(styles.field, inline && styles.inline, className)}>
      <label htmlFor={id} className={hideLabel ? 'visually-hidden' : styles.label}>
        {label}
      </label>
      <select
        id={id}
        className={styles.control}
        value={value}
        disabled={disabled}
        aria-describedby={hint ? `${id}-hint` : undefined}
        // The list holds nothing but the given options, so the text is one of them.
        onChange={(event) => onChange(event.target.value as Value)}
      >
        {placeholder !== undefined && (
          <option value="" disabled={value !== ''}>
            {placeholder}
          </option>
        )}
        {options.map((entry) =>
          'options' in entry ? (
            <optgroup key={entry.label} label={entry.label}>
              {entry.options.map((option) => (
                <Choice key={option.value} {...option} />
              ))}
            </optgroup>
          ) : (
            <Choice key={entry.value} {...entry} />
          ),
        )}
      </select>
      {hint && (
        <span id={`${id}-hint`} className={styles.hint}>
          {hint}
        </span>
      )}
    </span>
  );
}

function Choice({ value, label, disabled }: SelectOption<string>) {
  return (
    <option value={value} disabled={disabled}>
      {label}
    </option>
  );
}
