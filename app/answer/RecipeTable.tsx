import { Button } from '../parts/Button';
import { formatNumber } from '../parts/numberText';
import { announce } from '../state/viewStore';
import { looksOf } from './familyTone';
import { ProportionBar, Swatch } from './ProportionBar';
import styles from './RecipeTable.module.css';
import { amountDigits, type Batch, type RecipeRow, type RecipeTotals } from './recipeRows';
import { recipeText } from './recipeText';

const percent = (share: number | undefined, digits: number) =>
  share === undefined ? '–' : formatNumber(share * 100, digits);

async function copy(text: string): Promise<void> {
  try {
    await navigator.clipboard.writeText(text);
    announce('The recipe is on the clipboard: paste it into a spreadsheet.');
  } catch {
    announce('The browser did not allow copying. Select the table with the mouse and copy it instead.');
  }
}

/** What goes into the kettle: shares, kilograms, litres, cost and what stays in the tank; each name above its figures. */
export function RecipeTable({
  rows,
  totals,
  batch,
}: {
  rows: readonly RecipeRow[];
  totals: RecipeTotals;
  batch: Batch;
}) {
  const looks = looksOf(rows.map(({ family }) => family));
  const digits = amountDigits(totals.kilograms);
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
              <td>{percent(1, 2)}</td>
              <td>{percent(totals.litres === undefined ? undefined : 1, 2)}</td>
              <td>{formatNumber(totals.kilograms, digits)}</td>
              <td>{formatNumber(totals.litres, digits)}</td>
              {showsCost && <td>{percent(1, 1)}</td>}
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
        <Button tone="quiet" icon="copy" onClick={() => void copy(recipeText(rows, totals, batch))}>
          Copy recipe
        </Button>
      </p>
    </>
  );
}
