import { type BlendOutcome, costOfShare, type Family, type Order, type Recipe } from '../../src';

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
  /** Share of the cost of the mix, price steps and what using it costs included [0..1]. */
  costShare?: number;
  /** Whole drums, where the stock comes in them and the batch is fixed. */
  drums?: number;
  /** What is left on hand after the batch [t]. */
  leftTonnes?: number;
}

/** The sums of the rows as they stand, so that a wrong row would show. A sum with an unknown part is unknown. */
export interface RecipeTotals {
  massFraction: number;
  volumeFraction?: number;
  kilograms: number;
  litres?: number;
  costShare?: number;
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
  // With a stock that is paid to be taken, shares of the cost say nothing.
  const hasShares = costPerTonne !== undefined && costPerTonne > 0 && usesNoNegativePrice(order, recipe);
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
        ...(hasShares && {
          costShare: costOfShare(stock, massFraction, order) / costPerTonne,
        }),
        ...(stock.lotTonnes !== undefined &&
          typeof order.batchTonnes === 'number' && { drums: Math.round(kilograms / 1000 / stock.lotTonnes) }),
        ...(batch.given && left !== undefined && { leftTonnes: left - kilograms / 1000 }),
      },
    ];
  });
  rows.sort((a, b) => b.massFraction - a.massFraction);
  return { rows, totals: totalsOf(rows), batch };
}

function usesNoNegativePrice({ stocks }: Order, recipe: Recipe): boolean {
  const used = new Set(recipe.flatMap(({ stockId, massFraction }) => (massFraction > 0 ? [stockId] : [])));
  return stocks.every(({ id, pricePerTonne }) => pricePerTonne >= 0 || !used.has(id));
}

function totalsOf(rows: readonly RecipeRow[]): RecipeTotals {
  const sum = (read: (row: RecipeRow) => number | undefined) =>
    rows.reduce<number | undefined>((total, row) => {
      const part = read(row);
      return total === undefined || part === undefined ? undefined : total + part;
    }, 0);
  const [volumeFraction, litres, costShare] = [
    sum((row) => row.volumeFraction),
    sum((row) => row.litres),
    sum((row) => row.costShare),
  ];
  return {
    massFraction: sum((row) => row.massFraction) ?? 0,
    kilograms: sum((row) => row.kilograms) ?? 0,
    ...(volumeFraction !== undefined && { volumeFraction }),
    ...(litres !== undefined && { litres }),
    ...(costShare !== undefined && { costShare }),
  };
}
