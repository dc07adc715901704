import styles from './PageNav.module.css';

const PLACES = [
  { id: 'order', label: 'Order' },
  { id: 'answer', label: 'Answer' },
  { id: 'stocks', label: 'Stocks' },
];

/** Ways to the places of the page where it is one long column. */
export function PageNav() {
  return (
    <nav className={styles.nav} aria-label="On this page">
      {PLACES.map(({ id, label }) => (
        <a key={id} href={`#${id}`}>
          {label}
        </a>
      ))}
    </nav>
  );
}
