import { formatNumber } from '../parts/numberText';
import { amountDigits, columnTexts } from './amountDigits';
import type { Batch, RecipeRow, RecipeTotals } from './recipeRows';

/** The amounts of one line of the recipe, as they are shown and copied. */
export interface AmountTexts {
  massPercent: string;
  volumePercent: string;
  kilograms: string;
  litres: string;
  costPercent: string;
}

/** Least decimals of a recipe's percentages. */
interface Digits {
  percent: number;
  costPercent: number;
}

/** The amounts of each row and of the total as texts, each with decimals enough to weigh by. */
export function recipeTexts(
  rows: readonly RecipeRow[],
  totals: RecipeTotals,
  batch: Batch,
  digits: Digits,
  unknown: string,
): { rows: AmountTexts[]; total: AmountTexts } {
  const column = (read: (of: RecipeRow | RecipeTotals) => number | undefined, least: number) =>
    columnTexts(rows.map(read), read(totals), least, unknown);
  const percent = (share: number | undefined) => (share === undefined ? undefined : share * 100);
  const plain = (share: number | undefined, decimals: number) =>
    share === undefined ? unknown : formatNumber(share * 100, decimals);
  const columns = {
    massPercent: column((of) => percent(of.massFraction), digits.percent),
    volumePercent: column((of) => percent(of.volumeFraction), digits.percent),
    kilograms: column((of) => of.kilograms, amountDigits(batch.kilograms)),
    litres: column((of) => of.litres, amountDigits(batch.kilograms)),
    // Money is not weighed: shares of the cost have the same decimals throughout.
    costPercent: {
      parts: rows.map((row) => plain(row.costShare, digits.costPercent)),
      total: plain(totals.costShare, digits.costPercent),
    },
  };
  const line = (pick: (texts: { parts: string[]; total: string }) => string | undefined): AmountTexts => ({
    massPercent: pick(columns.massPercent) ?? unknown,
    volumePercent: pick(columns.volumePercent) ?? unknown,
    kilograms: pick(columns.kilograms) ?? unknown,
    litres: pick(columns.litres) ?? unknown,
    costPercent: pick(columns.costPercent) ?? unknown,
  });
  return { rows: rows.map((_, place) => line(({ parts }) => parts[place])), total: line(({ total }) => total) };
}
