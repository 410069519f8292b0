/** One line of a bench's table: what was measured, the figure in words, and its ratio to the table's yardstick. */
export type BenchRow = { what: string; figure: string; ratio: number };

export function median(values: number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  const upper = sorted[middle] ?? 0;
  return sorted.length % 2 === 1 ? upper : (upper + (sorted[middle - 1] ?? 0)) / 2;
}

/** The value that a share of all values does not exceed. @example quantile([1, 2, 3, 4], 0.5) // 2 */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.max(0, Math.ceil(sorted.length * share) - 1)] ?? 0;
}

export function milliseconds(value: number): string {
  return `${value < 10 ? value.toFixed(2) : value.toFixed(0)} ms`;
}

export function microseconds(value: number): string {
  return `${value < 10 ? value.toFixed(2) : value.toFixed(0)} µs`;
}

/** A table as text: what, figure, ratio. */
export function table(title: string, rows: BenchRow[]): string {
  const wide = Math.max(...rows.map((row) => row.what.length));
  const figures = Math.max(...rows.map((row) => row.figure.length));
  const lines = rows.map(
    (row) => `  ${row.what.padEnd(wide)}  ${row.figure.padStart(figures)}  × ${row.ratio.toFixed(2)}`,
  );
  return [title, ...lines].join("\n");
}
