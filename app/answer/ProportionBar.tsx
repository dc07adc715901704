import { classNames } from '../parts/classNames';
import { formatNumber } from '../parts/numberText';
import { useWidth } from '../parts/useWidth';
import { type Look, looksOf } from './familyTone';
import styles from './ProportionBar.module.css';
import type { RecipeRow } from './recipeRows';

/** Width of a letter of the labels, roughly [px]. */
const LETTER = 6.6;

/** The recipe as one bar, shares by mass. The table beside it says the same in numbers. */
export function ProportionBar({ rows }: { rows: readonly RecipeRow[] }) {
  const [ref, width] = useWidth<HTMLDivElement>(400);
  const looks = looksOf(rows.map(({ family }) => family));
  return (
    <div ref={ref} className={styles.bar} aria-hidden="true">
      {rows.map(({ stockId, name, massFraction }, place) => {
        const look = looks[place];
        const fits = name.length * LETTER + 10 < massFraction * width;
        return (
          <span
            key={stockId}
            className={classNames(styles.part, look && swatchClass(look))}
            style={{ flexGrow: massFraction }}
            title={`${name}, ${formatNumber(massFraction * 100, 2)} %`}
          >
            {fits && <span className={styles.label}>{name}</span>}
          </span>
        );
      })}
    </div>
  );
}

export function Swatch({ look }: { look: Look | undefined }) {
  return <span className={classNames(styles.swatch, look && swatchClass(look))} aria-hidden="true" />;
}

function swatchClass({ tone, pattern }: Look): string {
  return classNames(styles[tone], styles[pattern]);
}
