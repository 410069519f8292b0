import { textWidth } from "#app/documents/fonts.ts";
import type { Mark } from "./marks.ts";
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
const leading = 1.06;
/** Above and below a row's lines, in ems. */
const padding = 0.13;
/** A title may be set this much smaller before it wraps. */
const leastShrink = 0.82;
/** Between columns, in ems. */
const gutter = 0.45;

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
function fitText(
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

export type RowLayout = { height: number; marks: (top: number) => Mark[]; smallest: number };

/** One row at a size: the line of what hands do above, the song with its capos and tuning below. */
export function layoutRow(row: SheetRow, columns: Columns): RowLayout {
  const { size, titleLeft, capoLeft, capoRight, right } = columns;
  const line = leading * size;
  const title = fitText(row.title, capoLeft - gutter * size - titleLeft, size, 600, " ");
  const badgeWidth = row.guitar ? (textWidth(row.guitar.name, 600) + 0.9) * size : 0;
  const actionRight = row.capos.length > 1 ? capoLeft - gutter * size : right;
  const beside = titleLeft + (row.guitar ? badgeWidth + 0.35 * size : 0);
  const fitBeside = fitText(row.action, actionRight - beside, size, 600, ", ");
  const fitBelow = fitText(row.action, actionRight - titleLeft, size, 600, ", ");
  const below = row.guitar !== null && fitBeside.size < size * leastShrink;
  const actionLeft = below ? titleLeft : beside;
  const action = row.action === "" ? { lines: [], size } : below ? fitBelow : fitBeside;
  const firstAction = below ? 1 : 0;
  const above = Math.max(
    row.guitar || row.encore ? 1 : 0,
    action.lines.length > 0 ? firstAction + action.lines.length : 0,
    row.capos.length - 1,
  );
  const height = (above + title.lines.length) * line + 2 * padding * size;
  const letterScales = row.tuning.map((string) =>
    Math.min(1, (columns.cell - 0.2 * size) / (textWidth(string.letter, 600) * size)),
  );
  const smallest = Math.min(
    title.size,
    row.tuning.length > 0 ? size * Math.min(...letterScales) : size,
    action.lines.length > 0 ? action.size : size,
  );

  function marks(top: number): Mark[] {
    const baseline = (index: number) => top + padding * size + index * line + 0.5 * (line + 0.7 * size);
    const main = baseline(above);
    const found: Mark[] = [];
    const text = (
      role: "title" | "capo" | "action" | "number" | "tuning",
      content: string,
      x: number,
      y: number,
      width: number,
      fontSize: number,
      align: "left" | "right" | "center" = "left",
      inverted = false,
    ) =>
      found.push({
        kind: "text",
        role,
        text: content,
        x,
        y,
        width,
        size: fontSize,
        weight: role === "number" || role === "tuning" ? 700 : 600,
        align,
        inverted,
      });
    if (row.guitar) {
      found.push({
        kind: "badge",
        shape: row.guitar.shape,
        x: titleLeft,
        y: baseline(0) - 0.94 * size,
        width: badgeWidth,
        height: 1.16 * size,
      });
      text("action", row.guitar.name, titleLeft, baseline(0), badgeWidth, size, "center", true);
    }
    action.lines.forEach((content, index) => {
      text(
        "action",
        content,
        actionLeft,
        baseline(firstAction + index),
        actionRight - actionLeft,
        action.size,
      );
    });
    text(
      "number",
      String(row.number),
      columns.left,
      main,
      titleLeft - gutter * size - columns.left,
      size,
      "right",
    );
    title.lines.forEach((content, index) => {
      text(
        "title",
        content,
        titleLeft,
        main + index * line,
        capoLeft - gutter * size - titleLeft,
        title.size,
      );
    });
    row.capos.forEach((content, index) => {
      text(
        "capo",
        content,
        capoLeft,
        main - (row.capos.length - 1 - index) * line,
        capoRight - capoLeft,
        size,
        "right",
      );
    });
    row.tuning.forEach((string, index) => {
      const x = right - (row.tuning.length - index) * columns.cell;
      const turned = string.turned !== null;
      if (turned)
        found.push({
          kind: "cell",
          x: x + 0.03 * size,
          y: main - 0.9 * size,
          width: columns.cell - 0.06 * size,
          height: 1.1 * size,
        });
      const letterWidth = turned ? columns.cell - 0.16 * size : columns.cell;
      text(
        "tuning",
        string.letter,
        x,
        main,
        letterWidth,
        size * (letterScales[index] ?? 1),
        "center",
        turned,
      );
      if (string.turned)
        found.push({
          kind: "triangle",
          direction: string.turned,
          x: x + columns.cell - 0.32 * size,
          y: main - 0.72 * size,
          size: 0.24 * size,
          inverted: true,
        });
    });
    return found;
  }
  return { height, marks, smallest };
}
