import { formatNumber } from '../parts/numberText';
import { ScrollRegion } from '../parts/ScrollRegion';
import { CopyRecipe } from './CopyRecipe';
import { looksOf } from './familyTone';
import { ProportionBar, Swatch } from './ProportionBar';
import styles from './RecipeTable.module.css';
import type { Batch, RecipeRow, RecipeTotals } from './recipeRows';
import { type AmountTexts, recipeTexts } from './recipeTexts';

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
  const texts = recipeTexts(rows, totals, batch, { percent: 2, costPercent: 1 }, '–');
  const showsLeft = rows.some(({ leftTonnes }) => leftTonnes !== undefined);
  const showsCost = rows.some(({ costShare }) => costShare !== undefined);
  const width = 4 + Number(showsCost) + Number(showsLeft);
  return (
    <>
      <ProportionBar rows={rows} />
      <ScrollRegion className={styles.scroll} name="Recipe">
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
                    <span className={styles.family}>
                      {row.drums !== undefined && `${row.drums} ${row.drums === 1 ? 'drum' : 'drums'}, `}
                      {row.family}
                    </span>
                  </span>
                </th>
              </tr>
              <tr>
                <Amounts texts={texts.rows[place]} showsCost={showsCost} />
                {showsLeft && <td>{formatNumber(row.leftTonnes, 1)}</td>}
              </tr>
            </tbody>
          ))}
          <tfoot>
            <tr>
              <Amounts texts={texts.total} showsCost={showsCost} isTotal />
              {showsLeft && <td />}
            </tr>
          </tfoot>
        </table>
      </ScrollRegion>
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

function Amounts({
  texts,
  showsCost,
  isTotal,
}: {
  texts: AmountTexts | undefined;
  showsCost: boolean;
  isTotal?: boolean;
}) {
  return (
    <>
      <td>
        {isTotal && (
          <span className={styles.sum}>
            <span aria-hidden="true">Σ</span>
            <span className="visually-hidden">Total: </span>
          </span>
        )}
        {texts?.massPercent}
      </td>
      <td>{texts?.volumePercent}</td>
      <td>{texts?.kilograms}</td>
      <td>{texts?.litres}</td>
      {showsCost && <td>{texts?.costPercent}</td>}
    </>
  );
}
