/** Moves labels apart, keeping their order and staying within the plot: none nearer than `gap`. All in pixels. */
export function labelPlaces(wanted: readonly number[], gap: number, top: number, bottom: number): number[] {
  const order = wanted.map((_, place) => place).sort((one, other) => (wanted[one] ?? 0) - (wanted[other] ?? 0));
  // Where there is no room for all, they come closer rather than leave the plot.
  const step = order.length > 1 ? Math.min(gap, (bottom - top) / (order.length - 1)) : gap;
  const places = [...wanted];
  let floor = top;
  for (const place of order) {
    places[place] = Math.max(wanted[place] ?? top, floor);
    floor = (places[place] ?? top) + step;
  }
  let ceiling = bottom;
  for (const place of order.reverse()) {
    places[place] = Math.min(places[place] ?? bottom, ceiling);
    ceiling = (places[place] ?? bottom) - step;
  }
  return places;
}
