import { formatNumber } from '../parts/numberText';
import type { Batch, RecipeRow, RecipeTotals } from './recipeRows';
import { type AmountTexts, recipeTexts } from './recipeTexts';

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
  const texts = recipeTexts(rows, totals, batch, { percent: 3, costPercent: 1 }, '');
  const cells = (of: AmountTexts | undefined) =>
    of ? [of.massPercent, of.volumePercent, of.kilograms, of.litres, of.costPercent] : [];
  const left = ({ leftTonnes }: RecipeRow) => (leftTonnes === undefined ? '' : formatNumber(leftTonnes, 2));
  const lines = [
    [plain(title)],
    [plain(`${proof} A prediction: passing is for the laboratory.`)],
    ...[...new Set(remarks)].map((remark) => [plain(remark)]),
    ['Stock', 'Family', '% m/m', '% v/v', `kg ${batch.words}`, `L at 15 °C ${batch.words}`, '% of cost', 'left [t]'],
    ...rows.map((row, place) => [plain(row.name), row.family, ...cells(texts.rows[place]), left(row)]),
    ['Total', '', ...cells(texts.total), ''],
  ];
  return lines.map((line) => line.join('\t')).join('\n');
}

/** A text that stays one cell, and that no spreadsheet takes for a formula. */
function plain(text: string): string {
  const oneLine = text.replace(/[\t\r\n]+/g, ' ');
  return /^[=+@-]/.test(oneLine) ? `'${oneLine}` : oneLine;
}
