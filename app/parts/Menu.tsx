import { createContext, type ReactNode, useContext, useEffect, useId, useRef, useState } from 'react';
import { Button } from './Button';
import type { IconName } from './Icon';
import styles from './Menu.module.css';

const Close = createContext<() => void>(() => undefined);

/** A button that unfolds a short list of actions. Escape, a click elsewhere or an action folds it again. */
export function Menu({ label, icon, children }: { label: string; icon?: IconName; children: ReactNode }) {
  const id = useId();
  const root = useRef<HTMLDivElement>(null);
  const [open, setOpen] = useState(false);

  useEffect(() => {
    if (!open) return;
    function onPointerDown(event: PointerEvent) {
      if (event.target instanceof Node && !root.current?.contains(event.target)) setOpen(false);
    }
    function onKeyDown(event: KeyboardEvent) {
      if (event.key !== 'Escape') return;
      setOpen(false);
      root.current?.querySelector('button')?.focus();
    }
    document.addEventListener('pointerdown', onPointerDown);
    document.addEventListener('keydown', onKeyDown);
    return () => {
      document.removeEventListener('pointerdown', onPointerDown);
      document.removeEventListener('keydown', onKeyDown);
    };
  }, [open]);

  return (
    <div ref={root} className={styles.menu}>
      <Button icon={icon} aria-expanded={open} aria-controls={id} onClick={() => setOpen(!open)}>
        {label}
      </Button>
      <div id={id} className={styles.list} hidden={!open}>
        <Close value={() => setOpen(false)}>{children}</Close>
      </div>
    </div>
  );
}

/** One action of a menu, with its key at the right. */
export function MenuItem({
  children,
  keys,
  disabled,
  onSelect,
}: {
  children: ReactNode;
  keys?: string;
  disabled?: boolean;
  onSelect(): void;
}) {
  const close = useContext(Close);
  return (
    <button
      type="button"
      className={styles.item}
      disabled={disabled}
      onClick={() => {
        close();
        onSelect();
      }}
    >
      <span>{children}</span>
      {keys && <kbd className={styles.keys}>{keys}</kbd>}
    </button>
  );
}
