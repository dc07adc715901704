/** Places in the drawing of a rail [px]: number of the mix, track, marks of the stocks, numbers of the scale. */
export const RAIL = {
  margin: 14,
  mixNumber: 10,
  trackTop: 16,
  middle: 24,
  trackBottom: 32,
  marksBottom: 39,
  numbers: 51,
  height: 54,
} as const;
