import { textWidth } from "#app/documents/fonts.ts";
import { readingDistance } from "#app/documents/legibility.ts";
import { margin, type Paper, paperSizes } from "#app/documents/paper.ts";
import { columnsFor } from "./columns.ts";
import type { Mark, SheetPage } from "./marks.ts";
import { layoutRow, type RowLayout } from "./row-layout.ts";
import type { SheetRow, SheetSet, StageSheet } from "./sheet.ts";

export type SheetOptions = {
  paper: Paper;
  /** What the footer names: the plan's version and when it was printed, in words. */
  version: string;
  printed: string;
};

/** Points. A set that would have to be set smaller than this takes another page. */
const smallestSize = 17;
const largestSize = 60;
/** Points of the heads, "at doors" and foot lines, which may be small. */
const headSize = 15;
const doorsSize = 10;
const footSize = 9;

type Frame = { width: number; height: number; top: number; bottom: number; doors: string[] };

function frameFor(set: SheetSet, paper: Paper): Frame {
  const { width, height } = paperSizes[paper];
  const doors: string[] = [];
  for (const part of set.doors.split(" | ")) {
    const last = doors.at(-1);
    const longer = last === undefined ? part : `${last} | ${part}`;
    if (last !== undefined && textWidth(longer, 500) * doorsSize <= width - 2 * margin)
      doors[doors.length - 1] = longer;
    else doors.push(part);
  }
  const top = margin + headSize * 1.1 + doors.length * doorsSize * 1.25 + 5;
  return { width, height, top, bottom: height - margin - footSize * 1.6, doors };
}

type Cut = { size: number; smallest: number; pages: { rows: SheetRow[]; layouts: RowLayout[] }[] };

/** Rows on pages at one size: never inside a song, at the encore or before a song that needs no work where one is near. */
function cut(rows: SheetRow[], size: number, frame: Frame): Cut | null {
  const columns = columnsFor(rows, size, margin, frame.width - margin);
  if (!columns) return null;
  const layouts = rows.map((row) => layoutRow(row, columns));
  const room = frame.bottom - frame.top;
  const pages: Cut["pages"] = [];
  let start = 0;
  while (start < rows.length) {
    let end = start;
    let used = 0;
    while (end < rows.length && used + (layouts[end]?.height ?? 0) <= room) {
      used += layouts[end]?.height ?? 0;
      end += 1;
    }
    if (end === start) return null;
    if (end < rows.length) end = quietBreak(rows, start, end);
    pages.push({ rows: rows.slice(start, end), layouts: layouts.slice(start, end) });
    start = end;
  }
  return { size, smallest: Math.min(...layouts.map((layout) => layout.smallest)), pages };
}

/** The best row to start the next page with, among the last few that fit: an encore, else one without work before it. */
function quietBreak(rows: SheetRow[], start: number, end: number): number {
  const candidates = [end, end - 1, end - 2, end - 3].filter((row) => row > start + 1);
  const quiet = (row: number) => rows[row]?.action === "" && rows[row]?.guitar === null;
  return candidates.find((row) => rows[row]?.encore) ?? candidates.find(quiet) ?? end;
}

/** The cut into the fewest pages, and of these the one whose smallest type is largest. */
function cutSet(rows: SheetRow[], frame: Frame): Cut {
  let best: Cut | null = null;
  for (let size = largestSize; size >= smallestSize; size -= 0.5) {
    const found = cut(rows, size, frame);
    if (!found) continue;
    const pages = found.pages.length - (best?.pages.length ?? Number.POSITIVE_INFINITY);
    if (pages < 0 || (pages === 0 && found.smallest > (best?.smallest ?? 0))) best = found;
  }
  if (!best) throw new Error("A song does not fit on a page of its own.");
  return best;
}

/** How far a page reads, in words: rounded down to 10 cm. */
function distanceWords(smallest: number): string {
  return (Math.floor(readingDistance(smallest) * 10 + 1e-9) / 10).toFixed(1);
}

/** Text of the head and foot lines. */
function small(
  text: string,
  x: number,
  y: number,
  width: number,
  size: number,
  align: "left" | "right" | "center",
  weight: 500 | 600 = 500,
): Mark {
  return { kind: "text", role: "small", text, x, y, width, size, weight, align, inverted: false };
}

function fitted(text: string, width: number, size: number, weight: 500 | 600): number {
  return Math.min(size, width / Math.max(0.01, textWidth(text, weight)));
}

function head(sheet: StageSheet, set: SheetSet, frame: Frame, again: boolean): Mark[] {
  const inner = frame.width - 2 * margin;
  const right = [sheet.date, again ? `${set.heading} continued`.trim() : set.heading]
    .filter(Boolean)
    .join("  ");
  const rightWidth = textWidth(right, 600) * headSize;
  const titleWidth = inner - rightWidth - headSize;
  const baseline = margin + headSize * 0.8;
  const marks: Mark[] = [
    small(
      sheet.title,
      margin,
      baseline,
      titleWidth,
      fitted(sheet.title, titleWidth, headSize, 600),
      "left",
      600,
    ),
    small(right, margin + inner - rightWidth - 2, baseline, rightWidth + 2, headSize, "right", 600),
  ];
  frame.doors.forEach((line, index) => {
    marks.push(
      small(
        line,
        margin,
        baseline + 4 + (index + 1) * doorsSize * 1.25,
        inner,
        fitted(line, inner, doorsSize, 500),
        "left",
      ),
    );
  });
  marks.push({ kind: "rule", x: margin, y: frame.top - 2, width: inner, thickness: 2 });
  return marks;
}

function foot(texts: [string, string, string], frame: Frame): Mark[] {
  const inner = frame.width - 2 * margin;
  const baseline = frame.height - margin;
  const third = inner / 3;
  const aligns = ["left", "center", "right"] as const;
  const size = Math.min(...texts.map((text) => fitted(text, third - 4, footSize, 500)));
  return texts.map((text, index) =>
    small(text, margin + third * index, baseline, third, size, aligns[index] ?? "left"),
  );
}

/** An empty set's page says so. */
function emptyPage(sheet: StageSheet, set: SheetSet, frame: Frame, options: SheetOptions): SheetPage {
  const message = "No songs in this set yet. Add some on the gig page.";
  return {
    smallest: 24,
    marks: [
      ...head(sheet, set, frame, false),
      {
        kind: "text",
        role: "title",
        text: message,
        x: margin,
        y: frame.top + 50,
        width: frame.width - 2 * margin,
        size: 24,
        weight: 600,
        align: "left",
        inverted: false,
      },
      ...foot(["", set.time, `${options.version}, printed ${options.printed}`], frame),
    ],
  };
}

/**
 * The pages of a stage sheet: each set starts one, its type as large as fits , the distance
 * from which the smallest of title, tuning, capo and action reads at its foot.
 */
export function layoutStageSheet(sheet: StageSheet, options: SheetOptions): SheetPage[] {
  const pages: SheetPage[] = [];
  const curfew = sheet.curfew ? `, ${sheet.curfew}` : "";
  for (const set of sheet.sets) {
    const frame = frameFor(set, options.paper);
    if (set.rows.length === 0) {
      pages.push(emptyPage(sheet, set, frame, options));
      continue;
    }
    const found = cutSet(set.rows, frame);
    found.pages.forEach((page, index) => {
      const smallest = Math.min(...page.layouts.map((layout) => layout.smallest));
      const used = page.layouts.reduce((sum, layout) => sum + layout.height, 0);
      const air = Math.min((frame.bottom - frame.top - used) / page.rows.length, found.size * 0.7);
      const marks = head(sheet, set, frame, index > 0);
      let top = frame.top;
      page.layouts.forEach((layout, place) => {
        marks.push(...layout.marks(top + air / 2));
        top += layout.height + air;
        const thickness = page.rows[place + 1]?.encore ? 3 : 0.7;
        marks.push({ kind: "rule", x: margin, y: top, width: frame.width - 2 * margin, thickness });
      });
      const distance = distanceWords(smallest);
      marks.push(
        ...foot(
          [
            `Reads at ${distance} m.`,
            `${set.time}${curfew}`,
            `${options.version}, printed ${options.printed}  ${index + 1} of ${found.pages.length}`,
          ],
          frame,
        ),
      );
      pages.push({ marks, smallest });
    });
  }
  return pages;
}
