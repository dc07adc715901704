import styles from './Icon.module.css';

/** Line drawings on a grid of 16. */
const PATHS = {
  add: 'M8 3v10M3 8h10',
  remove: 'M4 4l8 8M12 4l-8 8',
  copy: 'M5.5 5.5h8v8h-8zM10.5 3v-.5h-8v8H3',
  bin: 'M3 4.5h10M6.5 4V2.5h3V4M4.5 4.5l.5 9h6l.5-9M7 7v4M9 7v4',
  undo: 'M3 6h6.5a3.5 3.5 0 0 1 0 7H6M3 6l3-3M3 6l3 3',
  redo: 'M13 6H6.5a3.5 3.5 0 0 0 0 7H10M13 6l-3-3M13 6l-3 3',
  more: 'M3 8h.01M8 8h.01M13 8h.01',
  down: 'M4 6l4 4 4-4',
  right: 'M6 4l4 4-4 4',
  sun: 'M8 5.2a2.8 2.8 0 1 1 0 5.6 2.8 2.8 0 0 1 0-5.6M8 1.2v1.6M8 13.2v1.6M1.2 8h1.6M13.2 8h1.6M3.2 3.2l1.1 1.1M11.7 11.7l1.1 1.1M12.8 3.2l-1.1 1.1M4.3 11.7l-1.1 1.1',
  moon: 'M13.2 9.7A5.7 5.7 0 0 1 6.3 2.8a5.7 5.7 0 1 0 6.9 6.9z',
  contrast: 'M8 2.2a5.8 5.8 0 1 1 0 11.6A5.8 5.8 0 0 1 8 2.2zM8 2.2v11.6M10 3v10M12 4.6v6.8',
  book: 'M3 2.5h8.5l1.5 1.5v9.5H3zM5.5 6h5M5.5 8.5h5M5.5 11h3',
  warning: 'M8 2.2 14.2 13.5H1.8zM8 6.5v3.2M8 11.6h.01',
  error: 'M8 2a6 6 0 1 1 0 12A6 6 0 0 1 8 2zM8 5v3.8M8 11h.01',
  check: 'M3 8.5l3.5 3.5L13 4.5',
  info: 'M8 2a6 6 0 1 1 0 12A6 6 0 0 1 8 2zM8 7.4V11M8 5h.01',
  tune: 'M2 5h6M12 5h2M2 11h2M8 11h6M10 3v4M6 9v4',
} as const;

export type IconName = keyof typeof PATHS;

/** A drawing beside words that say the same; never read aloud. */
export function Icon({ name }: { name: IconName }) {
  return (
    <svg className={styles.icon} viewBox="0 0 16 16" aria-hidden="true" focusable="false">
      <path d={PATHS[name]} />
    </svg>
  );
}
