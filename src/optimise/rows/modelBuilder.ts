import type { Stock } from '../../stock/stock';
import { type PriceSegment, priceSegments } from './priceSegments';
import type { ModelRow, Presence, RowSource, SearchModel, WholeLots } from './searchModel';

/** From this share on a stock counts as used where a rule asks for "at least so many" and it has no least dose. */
export const LEAST_SHARE_THAT_COUNTS = 1e-6;

/** Collects columns and rows of a search model. */
export class ModelBuilder {
  readonly rows: ModelRow[] = [];
  readonly presences: Presence[] = [];
  readonly wholeLots: WholeLots[] = [];
  readonly #cost: number[] = [];
  readonly #lower: number[] = [];
  readonly #upper: number[] = [];
  readonly #place: ReadonlyMap<string, number>;

  constructor(readonly stocks: Stock[]) {
    this.#place = new Map(stocks.map((stock, place) => [stock.id, place]));
    for (const stock of stocks) this.addColumn(stock.pricePerTonne, 0, 1);
    this.addRow(
      { kind: 'sum' },
      1,
      1,
      stocks.map((_, place) => [place, 1]),
    );
  }

  placeOf(stockId: string): number | undefined {
    return this.#place.get(stockId);
  }

  addColumn(cost: number, lower: number, upper: number): number {
    this.#cost.push(cost);
    this.#lower.push(lower);
    this.#upper.push(upper);
    return this.#cost.length - 1;
  }

  addRow(source: RowSource, lower: number, upper: number, entries: readonly (readonly [number, number])[]): void {
    const used = entries.filter(([, value]) => value !== 0);
    this.rows.push({
      source,
      lower,
      upper,
      columns: used.map(([column]) => column),
      values: used.map(([, value]) => value),
    });
  }

  lower(column: number): number {
    return this.#lower[column];
  }

  upper(column: number): number {
    return this.#upper[column];
  }

  raiseLower(column: number, value: number): void {
    this.#lower[column] = Math.max(this.#lower[column], value);
  }

  cutUpper(column: number, value: number): void {
    this.#upper[column] = Math.min(this.#upper[column], value);
  }

  /** The presence of a stock: absent, or at least `least`. Rows tie it to the share once bounds are final. */
  presenceOf(stock: number): Presence {
    const found = this.presences.find((presence) => presence.stock === stock);
    if (found) return found;
    const presence: Presence = {
      stock,
      column: this.addColumn(0, 0, 1),
      least: this.stocks[stock].leastDoseIfUsed ?? 0,
    };
    this.presences.push(presence);
    return presence;
  }

  /** Makes the presence of a stock cost something per tonne of mix. */
  payForPresence(stock: number, cost: number): void {
    this.#cost[this.presenceOf(stock).column] += cost;
  }

  /**
   * Spreads a stock's share over the stretches of its price: the stock's own column then costs nothing, each stretch is
   * absent or within its tonnes, and one at most is used.
   */
  addPriceSegments(stock: number, segments: readonly PriceSegment[], batchTonnes: number): void {
    this.#cost[stock] = 0;
    const used: [number, number][] = [];
    const shares: [number, number][] = [[stock, 1]];
    for (const { from, to, pricePerTonne, fixed } of segments) {
      const share = this.addColumn(pricePerTonne, 0, Math.min(1, to / batchTonnes));
      const presence = { stock: share, column: this.addColumn(fixed / batchTonnes, 0, 1), least: from / batchTonnes };
      this.presences.push(presence);
      used.push([presence.column, 1]);
      shares.push([share, -1]);
    }
    this.addRow({ kind: 'price step' }, 0, 0, shares);
    this.addRow({ kind: 'price step' }, -Infinity, 1, used);
  }

  /** Ties every presence to its share: share ≤ upper · presence, share ≥ least · presence. */
  #tiePresences(): void {
    for (const { stock, column, least } of this.presences) {
      if (this.#lower[stock] > 0) this.#lower[column] = 1;
      this.addRow({ kind: 'presence', stock, end: 'most' }, -Infinity, 0, [
        [stock, 1],
        [column, -this.#upper[stock]],
      ]);
      if (least > 0) {
        this.addRow({ kind: 'presence', stock, end: 'least' }, 0, Infinity, [
          [stock, 1],
          [column, -least],
        ]);
      }
    }
  }

  /** No more than whole drums of a stock that comes in them. */
  #cutToWholeLots(): void {
    for (const { stock, share } of this.wholeLots) {
      this.cutUpper(stock, Math.floor(this.#upper[stock] / share + 1e-9) * share);
    }
  }

  build(): SearchModel {
    this.#cutToWholeLots();
    this.#tiePresences();
    return {
      stocks: this.stocks,
      cost: Float64Array.from(this.#cost),
      prices: this.stocks.flatMap((stock) => priceSegments(stock).map(({ pricePerTonne }) => pricePerTonne)),
      lower: Float64Array.from(this.#lower),
      upper: Float64Array.from(this.#upper),
      rows: this.rows,
      presences: this.presences,
      wholeLots: this.wholeLots,
    };
  }
}
