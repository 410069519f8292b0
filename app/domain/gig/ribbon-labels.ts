/** A triangle with its number beside the step of a string: `x` is its left edge, `y` its middle. */
export type StepLabel = {
  string: number;
  direction: "up" | "down";
  semitones: number;
  x: number;
  y: number;
  entryId: string;
};

type Room = { y1: number; y2: number; width: number; labelWidth: number; labelHeight: number };

/**
 * Places for the labels of one gap so that none covers another: beside its own step where that is free, else in a
 * second or third line, else pushed along.
 */
export function placeLabels(
  labels: readonly Omit<StepLabel, "y">[],
  { y1, y2, width, labelWidth, labelHeight }: Room,
): StepLabel[] {
  const middle = (y1 + y2) / 2;
  const lines = Math.max(1, Math.floor((y2 - y1 + labelHeight * 0.6) / labelHeight));
  const free = Array.from({ length: lines }, () => Number.NEGATIVE_INFINITY);
  const inOrder = labels.toSorted((a, b) => a.x - b.x);
  const placed = inOrder.map((label) => {
    const line = free.findIndex((end) => end <= label.x);
    const chosen = line >= 0 ? line : free.indexOf(Math.min(...free));
    const x = Math.max(label.x, free[chosen]!);
    free[chosen] = x + labelWidth;
    return { label, line: chosen, x };
  });
  const used = Math.max(0, ...placed.map(({ line }) => line)) + 1;
  const over = Math.max(0, ...placed.map(({ x }) => x + labelWidth - width));
  return placed.map(({ label, line, x }) => ({
    ...label,
    x: Math.max(0, x - over),
    y: middle + (line - (used - 1) / 2) * labelHeight,
  }));
}
