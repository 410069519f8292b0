import { textWidth } from "#app/documents/fonts.ts";
import { type Columns, fitText, gutter, leading, leastShrink, padding } from "./columns.ts";
import type { Mark } from "./marks.ts";
import type { SheetRow } from "./sheet.ts";

/** Where the words of what hands do stand: from which line above the song, between which edges, at what size. */
type ActionPlace = {
  lines: string[];
  size: number;
  left: number;
  right: number;
  /** Line it begins on, 0 at the top of the row. */
  first: number;
  /** Lines above the song that it needs. */
  above: number;
};

/**
 * The action beside the guitar where it fits there; else below it; else in the full width above the lines of a partial
 * capo. The place that takes the fewest lines without shrinking the words wins.
 */
function placeAction(
  row: SheetRow,
  { size, titleLeft, capoLeft, right }: Columns,
  badgeWidth: number,
): ActionPlace {
  const beside = titleLeft + (row.guitar ? badgeWidth + 0.35 * size : 0);
  const capoExtra = Math.max(0, row.capos.length - 1);
  if (row.action === "") return { lines: [], size, left: beside, right, first: 0, above: 0 };
  const narrow = capoExtra > 0 ? capoLeft - gutter * size : right;
  const places = [
    { left: beside, right: narrow, first: 0, under: 0 },
    { left: beside, right, first: 0, under: capoExtra },
    { left: titleLeft, right: narrow, first: row.guitar ? 1 : 0, under: 0 },
    { left: titleLeft, right, first: row.guitar ? 1 : 0, under: capoExtra },
  ].map(({ left, right: edge, first, under }) => {
    const fitted = fitText(row.action, edge - left, size, 600, ", ");
    return { ...fitted, left, right: edge, first, above: first + fitted.lines.length + under };
  });
  const whole = places.filter((place) => place.size >= size * leastShrink);
  const able = whole.length > 0 ? whole : places;
  const cost = (place: ActionPlace) => place.above + 0.1 * place.lines.length;
  return able.reduce((best, place) => (cost(place) < cost(best) ? place : best));
}

export type RowLayout = { height: number; marks: (top: number) => Mark[]; smallest: number };

/** One row at a size: the line of what hands do above, the song with its capos and tuning below. */
export function layoutRow(row: SheetRow, columns: Columns): RowLayout {
  const { size, titleLeft, capoLeft, capoRight, right } = columns;
  const line = leading * size;
  const title = fitText(row.title, capoLeft - gutter * size - titleLeft, size, 600, " ");
  const badgeWidth = row.guitar ? (textWidth(row.guitar.name, 600) + 0.9) * size : 0;
  const action = placeAction(row, columns, badgeWidth);
  const above = Math.max(row.guitar || row.encore ? 1 : 0, action.above, row.capos.length - 1);
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
      role: Extract<Mark, { kind: "text" }>["role"],
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
        action.left,
        baseline(action.first + index),
        action.right - action.left,
        action.size,
      );
    });
    if (row.encore) {
      const room = titleLeft - gutter * size - columns.left;
      const small = Math.min(0.42 * size, room / textWidth("ENCORE", 600));
      text("small", "ENCORE", columns.left, baseline(0), room, small, "right");
    }
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
