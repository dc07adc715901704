import type { ButtonProps } from './Button';
import styles from './Button.module.css';
import { classNames } from './classNames';
import { Icon, type IconName } from './Icon';

export interface IconButtonProps extends Omit<ButtonProps, 'icon' | 'children' | 'aria-label'> {
  icon: IconName;
  /** Says what the button does; read aloud, and shown as a tooltip. */
  label: string;
}

export function IconButton({ icon, label, tone = 'quiet', className, title, ...rest }: IconButtonProps) {
  return (
    <button
      type="button"
      className={classNames(styles.button, styles.iconOnly, styles[tone], className)}
      aria-label={label}
      title={title ?? label}
      {...rest}
    >
      <Icon name={icon} />
    </button>
  );
}
