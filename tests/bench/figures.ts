/** Quantiles and a plain table for benchmark output. */

export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  const place = share * (sorted.length - 1);
  const low = Math.floor(place);
  const high = Math.min(sorted.length - 1, low + 1);
  return sorted[low] + (place - low) * (sorted[high] - sorted[low]);
}

export function median(values: readonly number[]): number {
  return quantile(values, 0.5);
}

/** Prints rows under headings, in columns as wide as their longest entry. */
export function printTable(headings: readonly string[], rows: readonly (readonly (string | number)[])[]): void {
  const text = [headings, ...rows].map((row) => row.map(String));
  const widths = headings.map((_, column) => Math.max(...text.map((row) => row[column].length)));
  for (const row of text) console.log(`| ${row.map((entry, column) => entry.padStart(widths[column])).join(' | ')} |`);
}

/** Milliseconds of a call, the median of a few. */
export function timed(repeats: number, run: () => void): number {
  const times: number[] = [];
  for (let k = 0; k < repeats; k++) {
    const start = performance.now();
    run();
    times.push(performance.now() - start);
  }
  return median(times);
}
