import type { Product } from '../../src';

const plain = (name: string) => name.trim().toLowerCase().replace(/\s+/g, ' ');

/** By stock: how many bear its name, where it is not the only one. Empty names are another matter. */
export function namesakes(products: readonly Product[]): ReadonlyMap<string, number> {
  const counts = new Map<string, number>();
  for (const { name } of products) counts.set(plain(name), (counts.get(plain(name)) ?? 0) + 1);
  const shared = products.flatMap(({ id, name }): [string, number][] => {
    const count = counts.get(plain(name)) ?? 0;
    return count > 1 && plain(name) !== '' ? [[id, count]] : [];
  });
  return new Map(shared);
}
