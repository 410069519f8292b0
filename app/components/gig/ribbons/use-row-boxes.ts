import { type RefObject, useEffect, useLayoutEffect, useState } from "react";
import type { Row } from "#app/domain/gig/plan.ts";

/** Where each row stands below the top of its set, in CSS pixels, in the order of the set; and where the list ends. */
export type RowBoxes = { tops: number[]; heights: number[]; bottom: number };

/** Heights in CSS pixels on a laptop, as the rows are styled: for the server's drawing, before anything is measured. */
const usual = { heading: 36, row: 40, gap: 24, encore: 33, trouble: 20, below: 6, overlap: 1 } as const;

/**
 * Where rows will stand, reckoned from what they hold. The browser measures it again at once; without JavaScript it is
 * what the ribbons are drawn by.
 */
export function expectedBoxes(rows: readonly Row[], troubles: ReadonlyMap<string, string[]>): RowBoxes {
  const tops: number[] = [];
  const heights: number[] = [];
  let y: number = usual.heading;
  rows.forEach((row, index) => {
    if (index > 0 && rows[index - 1]!.section !== row.section) y += usual.encore;
    if (row.gap) y += usual.gap - usual.overlap;
    const lines = (troubles.get(row.entry.id)?.length ?? 0) + (row.wishes.length > 0 ? 1.2 : 0);
    const height = usual.row + (lines > 0 ? usual.trouble * lines + usual.below : 0);
    tops.push(y);
    heights.push(height);
    y += height;
  });
  return { tops, heights, bottom: y };
}

/** A row's place in its item and the item's in the column: not where a slide shows it for a moment. */
function measured(column: HTMLElement): RowBoxes {
  const rows = [...column.querySelectorAll<HTMLElement>("[data-entry]")]
    .map((row) => ({ top: (row.parentElement?.offsetTop ?? 0) + row.offsetTop, height: row.offsetHeight }))
    .sort((a, b) => a.top - b.top);
  const tops = rows.map((row) => row.top);
  const heights = rows.map((row) => row.height);
  return { tops, heights, bottom: (tops.at(-1) ?? 0) + (heights.at(-1) ?? 0) };
}

function same(a: RowBoxes, b: RowBoxes): boolean {
  return (
    a.tops.length === b.tops.length &&
    a.tops.every((top, index) => top === b.tops[index] && a.heights[index] === b.heights[index])
  );
}

/** Where the rows of a set stand now, so that what is drawn beside them stands exactly beside them. */
export function useRowBoxes(
  column: RefObject<HTMLElement | null>,
  rows: readonly Row[],
  troubles: ReadonlyMap<string, string[]>,
): RowBoxes {
  const [boxes, setBoxes] = useState(() => expectedBoxes(rows, troubles));
  useLayoutEffect(() => {
    if (rows.length === 0 || !column.current) return;
    const next = measured(column.current);
    setBoxes((now) => (same(now, next) ? now : next));
  }, [column, rows]);
  useEffect(() => {
    const element = column.current;
    if (!element) return;
    const observer = new ResizeObserver(() => {
      const next = measured(element);
      setBoxes((now) => (same(now, next) ? now : next));
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, [column]);
  return boxes.tops.length === rows.length ? boxes : expectedBoxes(rows, troubles);
}
