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
 * second or third line, else pushed along. Where the gap has no room for all, more lines stand closer to its neighbours.
 */
export function placeLabels(
  labels: readonly Omit<StepLabel, "y">[],
  { y1, y2, width, labelWidth, labelHeight }: Room,
): StepLabel[] {
  const fitting = Math.floor((y2 - y1 + labelHeight * 0.6) / labelHeight);
  const inLine = Math.max(1, Math.floor(width / labelWidth));
  const count = Math.max(1, fitting, Math.ceil(labels.length / inLine));
  const lines: { label: Omit<StepLabel, "y">; x: number }[][] = Array.from({ length: count }, () => []);
  const endOf = (line: readonly { x: number }[]) => (line.at(-1)?.x ?? Number.NEGATIVE_INFINITY) + labelWidth;
  for (const label of labels.toSorted((a, b) => a.x - b.x)) {
    const open = lines.filter((line) => line.length < inLine);
    const shortest = open.reduce((best, line) => (endOf(line) < endOf(best) ? line : best), open[0]!);
    const line = open.find((one) => endOf(one) <= label.x) ?? shortest;
    line.push({ label, x: Math.max(label.x, endOf(line)) });
  }
  const used = lines.filter((line) => line.length > 0);
  return used.flatMap((line, index) => {
    let right = width;
    const placed = line.toReversed().map(({ label, x }) => {
      const left = Math.min(x, right - labelWidth);
      right = left;
      return { ...label, x: left, y: (y1 + y2) / 2 + (index - (used.length - 1) / 2) * labelHeight };
    });
    return placed.reverse();
  });
}
