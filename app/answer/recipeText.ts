import { formatNumber } from '../parts/numberText';
import { amountDigits, type Batch, type RecipeRow, type RecipeTotals } from './recipeRows';

export interface RecipeToCopy {
  title: string;
  /** What is proven: a recipe that leaves the screen says so. */
  proof: string;
  /** Cautions, and what was left out with its reason. */
  remarks: readonly string[];
  rows: readonly RecipeRow[];
  totals: RecipeTotals;
  batch: Batch;
}

/** The recipe as a block for a spreadsheet: tabs between cells, headings with units, proof and remarks above. */
export function recipeText({ title, proof, remarks, rows, totals, batch }: RecipeToCopy): string {
  const digits = amountDigits(batch.kilograms);
  const number = (value: number | undefined, decimals: number) =>
    value === undefined ? '' : formatNumber(value, decimals);
  const percent = (share: number | undefined, decimals: number) =>
    share === undefined ? '' : formatNumber(share * 100, decimals);
  const figures = (of: RecipeTotals & Pick<RecipeRow, 'leftTonnes'>) => [
    percent(of.massFraction, 3),
    percent(of.volumeFraction, 3),
    number(of.kilograms, digits),
    number(of.litres, digits),
    percent(of.costShare, 1),
    number(of.leftTonnes, 2),
  ];
  const lines = [
    [plain(title)],
    [plain(`${proof} A prediction: passing is for the laboratory.`)],
    ...[...new Set(remarks)].map((remark) => [plain(remark)]),
    ['Stock', 'Family', '% m/m', '% v/v', `kg ${batch.words}`, `L at 15 °C ${batch.words}`, '% of cost', 'left [t]'],
    ...rows.map((row) => [plain(row.name), row.family, ...figures(row)]),
    ['Total', '', ...figures(totals)],
  ];
  return lines.map((cells) => cells.join('\t')).join('\n');
}

/** A text that stays one cell, and that no spreadsheet takes for a formula. */
function plain(text: string): string {
  const oneLine = text.replace(/[\t\r\n]+/g, ' ');
  return /^[=+@-]/.test(oneLine) ? `'${oneLine}` : oneLine;
}
