/** A seeded stream of numbers in [0, 1): the public-domain mulberry32. */
export function mulberry32(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

/** Draws used by the generators, on one stream. */
export class Draw {
  readonly next: () => number;

  constructor(seed: number) {
    this.next = mulberry32(seed);
  }

  between(low: number, high: number): number {
    return low + (high - low) * this.next();
  }

  /** Even in the logarithm. */
  ratio(low: number, high: number): number {
    return low * (high / low) ** this.next();
  }

  whole(low: number, high: number): number {
    return low + Math.floor((high - low + 1) * this.next());
  }

  chance(probability: number): boolean {
    return this.next() < probability;
  }

  pick<T>(list: readonly T[]): T {
    return list[Math.floor(this.next() * list.length)];
  }

  shuffled<T>(list: readonly T[]): T[] {
    const copy = [...list];
    for (let place = copy.length - 1; place > 0; place--) {
      const other = this.whole(0, place);
      [copy[place], copy[other]] = [copy[other], copy[place]];
    }
    return copy;
  }
}
