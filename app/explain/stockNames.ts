import type { Order } from '../../src';

export function nameOf({ stocks }: Pick<Order, 'stocks'>, stockId: string): string {
  return stocks.find(({ id }) => id === stockId)?.name ?? stockId;
}

/** "SN 150, SN 500 and Bright stock". */
export function namesOf(order: Pick<Order, 'stocks'>, stockIds: readonly string[]): string {
  const names = stockIds.map((id) => nameOf(order, id));
  const last = names.at(-1) ?? '';
  return names.length < 2 ? last : `${names.slice(0, -1).join(', ')} and ${last}`;
}
