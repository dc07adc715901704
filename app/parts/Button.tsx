import type { ButtonHTMLAttributes } from 'react';
import styles from './Button.module.css';
import { classNames } from './classNames';
import { Icon, type IconName } from './Icon';

export interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  /** `main` for the one action a place is about, `quiet` for the rest of a busy row. */
  tone?: 'main' | 'plain' | 'quiet';
  icon?: IconName;
}

export function Button({ tone = 'plain', icon, className, children, ...rest }: ButtonProps) {
  return (
    <button type="button" className={classNames(styles.button, styles[tone], className)} {...rest}>
      {icon && <Icon name={icon} />}
      {children}
    </button>
  );
}
