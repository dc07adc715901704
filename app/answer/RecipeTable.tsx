import { formatNumber } from '../parts/numberText';
import { CopyRecipe } from './CopyRecipe';
import { looksOf } from './familyTone';
import { ProportionBar, Swatch } from './ProportionBar';
import styles from './RecipeTable.module.css';
import { amountDigits, type Batch, type RecipeRow, type RecipeTotals } from './recipeRows';

const percent = (share: number | undefined, digits: number) =>
  share === undefined ? '–' : formatNumber(share * 100, digits);

/** What goes into the kettle: shares, kilograms, litres, cost and what stays in the tank; each name above its figures. */
export function RecipeTable({
  rows,
  totals,
  batch,
  text,
}: {
  rows: readonly RecipeRow[];
  totals: RecipeTotals;
  batch: Batch;
  /** The recipe to be copied. */
  text(): string;
}) {
  const looks = looksOf(rows.map(({ family }) => family));
  const digits = amountDigits(batch.kilograms);
  const showsLeft = rows.some(({ leftTonnes }) => leftTonnes !== undefined);
  const showsCost = rows.some(({ costShare }) => costShare !== undefined);
  const width = 4 + Number(showsCost) + Number(showsLeft);
  return (
    <>
      <ProportionBar rows={rows} />
      <section className={styles.scroll} aria-label="Recipe">
        <table className={styles.table}>
          <caption className="visually-hidden">Recipe, kilograms and litres {batch.words}</caption>
          <thead>
            <tr>
              <th scope="col">% mass</th>
              <th scope="col">% vol.</th>
              <th scope="col">kg</th>
              <th scope="col">L, 15 °C</th>
              {showsCost && <th scope="col">% cost</th>}
              {showsLeft && <th scope="col">left, t</th>}
            </tr>
          </thead>
          {rows.map((row, place) => (
            <tbody key={row.stockId}>
              <tr className={styles.nameRow}>
                <th scope="rowgroup" colSpan={width}>
                  <span className={styles.stock}>
                    <Swatch look={looks[place]} />
                    <span>{row.name}</span>
                    <span className={styles.family}>{row.family}</span>
                  </span>
                </th>
              </tr>
              <tr>
                <td>{percent(row.massFraction, 2)}</td>
                <td>{percent(row.volumeFraction, 2)}</td>
                <td>{formatNumber(row.kilograms, digits)}</td>
                <td>{formatNumber(row.litres, digits)}</td>
                {showsCost && <td>{percent(row.costShare, 1)}</td>}
                {showsLeft && <td>{formatNumber(row.leftTonnes, 1)}</td>}
              </tr>
            </tbody>
          ))}
          <tfoot>
            <tr className={styles.nameRow}>
              <th scope="rowgroup" colSpan={width}>
                Total
              </th>
            </tr>
            <tr>
              <td>{percent(totals.massFraction, 2)}</td>
              <td>{percent(totals.volumeFraction, 2)}</td>
              <td>{formatNumber(totals.kilograms, digits)}</td>
              <td>{formatNumber(totals.litres, digits)}</td>
              {showsCost && <td>{percent(totals.costShare, 1)}</td>}
              {showsLeft && <td />}
            </tr>
          </tfoot>
        </table>
      </section>
      <p className={styles.foot}>
        <span>
          Kilograms and litres {batch.words}
          {batch.given ? '.' : '; give the order a batch for its own.'}
        </span>
        <CopyRecipe text={text} />
      </p>
    </>
  );
}
