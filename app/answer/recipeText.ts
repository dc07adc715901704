import { formatNumber } from '../parts/numberText';
import { amountDigits, type Batch, type RecipeRow, type RecipeTotals } from './recipeRows';

/** The recipe as a block for a spreadsheet: tabs between cells, headings with units. */
export function recipeText(rows: readonly RecipeRow[], totals: RecipeTotals, batch: Batch): string {
  const digits = amountDigits(totals.kilograms);
  const number = (value: number | undefined, decimals: number) =>
    value === undefined ? '' : formatNumber(value, decimals);
  const percent = (share: number | undefined, decimals: number) =>
    share === undefined ? '' : formatNumber(share * 100, decimals);
  const lines = [
    ['Stock', 'Family', '% m/m', '% v/v', `kg ${batch.words}`, `L at 15 °C ${batch.words}`, '% of cost', 'left [t]'],
    ...rows.map((row) => [
      row.name,
      row.family,
      percent(row.massFraction, 3),
      percent(row.volumeFraction, 3),
      number(row.kilograms, digits),
      number(row.litres, digits),
      percent(row.costShare, 1),
      number(row.leftTonnes, 2),
    ]),
    [
      'Total',
      '',
      percent(1, 3),
      percent(totals.litres === undefined ? undefined : 1, 3),
      number(totals.kilograms, digits),
      number(totals.litres, digits),
      '',
      '',
    ],
  ];
  return lines.map((cells) => cells.map((cell) => cell.replace(/[\t\n]/g, ' ')).join('\t')).join('\n');
}
