import styles from './Checkbox.module.css';
import { classNames } from './classNames';

/** A yes or no with its words beside it. */
export function Checkbox({
  label,
  checked,
  onChange,
  disabled,
  className,
}: {
  label: string;
  checked: boolean;
  onChange(checked: boolean): void;
  disabled?: boolean;
  className?: string;
}) {
  return (
    <label className={classNames(styles.checkbox, className)}>
      <input
        type="checkbox"
        checked={checked}
        disabled={disabled}
        onChange={(event) => onChange(event.target.checked)}
      />
      <span>{label}</span>
    </label>
  );
}
