import type { BlendOutcome, Family, Order } from '../../src';

/** One stock of the recipe, with everything the table says of it. */
export interface RecipeRow {
  stockId: string;
  name: string;
  family: Family;
  massFraction: number;
  volumeFraction?: number;
  kilograms: number;
  /** At 15 °C. */
  litres?: number;
  /** Share of the cost of the mix [0..1]. */
  costShare?: number;
  /** What is left on hand after the batch [t]. */
  leftTonnes?: number;
}

export interface RecipeTotals {
  kilograms: number;
  litres?: number;
}

/** The batch the kilograms are for. */
export interface Batch {
  kilograms: number;
  words: string;
  /** False: no batch is given, so the table is for a round quantity and takes nothing from the tanks. */
  given: boolean;
}

export function batchOf({ batchTonnes }: Pick<Order, 'batchTonnes'>): Batch {
  if (typeof batchTonnes === 'number') return { kilograms: batchTonnes * 1000, words: 'for the batch', given: true };
  if (batchTonnes) return { kilograms: batchTonnes.min * 1000, words: 'for the smallest batch', given: true };
  return { kilograms: 1000, words: 'for 1000 kg', given: false };
}

/** The recipe's rows, largest share first, and their sums. No recipe: no rows. */
export function recipeRows(
  order: Order,
  outcome: BlendOutcome,
): { rows: RecipeRow[]; totals: RecipeTotals; batch: Batch } {
  const batch = batchOf(order);
  const { recipe = [], properties, costPerTonne } = outcome;
  const density = properties?.properties.find(({ property }) => property === 'density')?.value;
  const totalLitres = density === undefined ? undefined : (batch.kilograms / density) * 1000;
  const rows = recipe.flatMap(({ stockId, massFraction }, place): RecipeRow[] => {
    const stock = order.stocks.find(({ id }) => id === stockId);
    if (!stock || !(massFraction > 0)) return [];
    const kilograms = massFraction * batch.kilograms;
    const volumeFraction = properties?.volumeFractions?.[place];
    const left = stock.availableTonnes;
    return [
      {
        stockId,
        name: stock.name,
        family: stock.family,
        massFraction,
        kilograms,
        ...(volumeFraction !== undefined && { volumeFraction }),
        ...(volumeFraction !== undefined && totalLitres !== undefined && { litres: volumeFraction * totalLitres }),
        ...(costPerTonne ? { costShare: (massFraction * stock.pricePerTonne) / costPerTonne } : {}),
        ...(batch.given && left !== undefined && { leftTonnes: left - kilograms / 1000 }),
      },
    ];
  });
  rows.sort((a, b) => b.massFraction - a.massFraction);
  const totals = { kilograms: batch.kilograms, ...(totalLitres !== undefined && { litres: totalLitres }) };
  return { rows, totals, batch };
}

/** Decimals of kilograms and litres: what a scale of that batch can show. */
export function amountDigits(totalKilograms: number): number {
  if (totalKilograms >= 10_000) return 0;
  return totalKilograms >= 500 ? 1 : 2;
}
