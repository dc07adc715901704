import { type ReactNode, useId, useLayoutEffect, useRef } from 'react';
import styles from './Dialog.module.css';
import { IconButton } from './IconButton';

export interface DialogProps {
  title: string;
  open: boolean;
  onClose(): void;
  children: ReactNode;
  /** Buttons at the foot. */
  actions?: ReactNode;
}

/** A question that holds the page until it is answered; Escape closes it. */
export function Dialog({ title, open, onClose, children, actions }: DialogProps) {
  const ref = useRef<HTMLDialogElement>(null);
  const headingId = useId();

  // Before other effects: closing gives the focus back, and they may then place it elsewhere.
  useLayoutEffect(() => {
    const dialog = ref.current;
    if (dialog && open && !dialog.open) {
      dialog.showModal();
      dialog.querySelector<HTMLElement>('input, select, textarea')?.focus();
    }
    if (dialog && !open && dialog.open) dialog.close();
  }, [open]);

  return (
    <dialog ref={ref} className={styles.dialog} aria-labelledby={headingId} onClose={onClose}>
      {open && (
        <>
          <div className={styles.head}>
            <h2 id={headingId}>{title}</h2>
            <IconButton icon="remove" label="Close" onClick={onClose} />
          </div>
          {children}
          {actions && <div className={styles.actions}>{actions}</div>}
        </>
      )}
    </dialog>
  );
}
