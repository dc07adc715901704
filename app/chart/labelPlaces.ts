/** Moves labels apart along one direction, keeping their order: none nearer than `apart`, all within [low, high]. */
export function labelPlaces(wanted: readonly number[], apart: number, low: number, high: number): number[] {
  const order = wanted.map((_, place) => place).sort((a, b) => (wanted[a] ?? 0) - (wanted[b] ?? 0));
  const places = [...wanted];
  let floor = low;
  for (const place of order) {
    places[place] = Math.max(wanted[place] ?? low, floor);
    floor = (places[place] ?? low) + apart;
  }
  let ceiling = high;
  for (const place of order.reverse()) {
    places[place] = Math.min(places[place] ?? high, ceiling);
    ceiling = (places[place] ?? high) - apart;
  }
  return places;
}
