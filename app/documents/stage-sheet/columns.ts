import { textWidth } from "#app/documents/fonts.ts";
import type { SheetRow } from "./sheet.ts";

/** Where the columns of a page stand, all in points, for type of one size. */
export type Columns = {
  size: number;
  left: number;
  right: number;
  titleLeft: number;
  capoLeft: number;
  capoRight: number;
  cell: number;
};

/** Line to line, in ems. */
export const leading = 1.06;
/** Above and below a row's lines, in ems. */
export const padding = 0.13;
/** A title may be set this much smaller before it wraps. */
export const leastShrink = 0.82;
/** Between columns, in ems. */
export const gutter = 0.45;

/** The columns that a set's rows need at a size, or null where no room is left for titles. */
export function columnsFor(rows: SheetRow[], size: number, left: number, right: number): Columns | null {
  const letters = rows.flatMap((row) => row.tuning.map((string) => textWidth(string.letter, 600)));
  const widestLetter = Math.max(0.6, ...letters);
  const strings = Math.max(0, ...rows.map((row) => row.tuning.length));
  const cell = Math.min(1.3, Math.max(1.14, widestLetter + 0.3)) * size;
  const capo = Math.max(0, ...rows.flatMap((row) => row.capos.map((line) => textWidth(line, 600)))) * size;
  const widestNumber = textWidth(String(rows.at(-1)?.number ?? 1), 700) * size;
  const titleLeft = left + Math.max(widestNumber, size) + gutter * size;
  const capoRight = right - strings * cell - (strings > 0 ? gutter * size : 0);
  const capoLeft = capoRight - capo;
  return capoLeft - gutter * size - titleLeft < 5 * size
    ? null
    : { size, left, right, titleLeft, capoLeft, capoRight, cell };
}

/** Breaks words into lines that fit; a single word wider than the width stands alone on its line. */
function wrap(words: string[], width: number, size: number, weight: 600 | 700, joint: string): string[] {
  const lines: string[] = [];
  for (const word of words) {
    const last = lines.at(-1);
    const longer = last === undefined ? word : `${last}${joint}${word}`;
    if (last !== undefined && textWidth(longer, weight) * size <= width) lines[lines.length - 1] = longer;
    else lines.push(word);
  }
  return lines;
}

/** A text in as many lines as it needs, no larger than `size`, each line inside `width`. */
export function fitText(
  text: string,
  width: number,
  size: number,
  weight: 600 | 700,
  joint: " " | ", ",
): { lines: string[]; size: number } {
  const whole = textWidth(text, weight);
  if (whole * size * leastShrink <= width)
    return { lines: [text], size: Math.min(size, width / Math.max(whole, 0.01)) };
  const lines = wrap(text.split(joint), width, size, weight, joint);
  const shown =
    joint === ", " ? lines.map((line, index) => (index < lines.length - 1 ? `${line},` : line)) : lines;
  const widest = Math.max(...shown.map((line) => textWidth(line, weight)));
  return { lines: shown, size: Math.min(size, width / widest) };
}
