import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type Box,
  nearestSlot,
  placeOfSlot,
  slotCount,
  slotOf,
} from "#app/components/gig/drag/drop-place.ts";

const gap = 24;
const row = 40;

/** A list as the page draws it: heads directly above their first row, gap lines between rows. */
function stack(keys: string[], heights: Record<string, number> = {}): Box[] {
  let y = 0;
  let aboveIsRow = false;
  return keys.map((key) => {
    const head = /^(\w+)\/(\d)$/.exec(key);
    if (!head && aboveIsRow) y += gap;
    const top = y;
    y += heights[key] ?? (head ? 32 : row);
    aboveIsRow = !head;
    const edges = { top, bottom: y };
    return head
      ? { kind: "head", setId: head[1]!, section: head[2] === "1" ? 1 : 0, ...edges }
      : { kind: "entry", entryId: key, ...edges };
  });
}

/** The same list with the entry put into a slot among the others. */
function moved(keys: string[], entry: string, slot: number): string[] {
  const others = keys.filter((key) => key !== entry);
  return others.toSpliced(slot, 0, entry);
}

describe("where a dragged row would go", () => {
  const keys = ["s1/0", "a", "b", "c", "s1/1", "d", "s2/0", "e"];

  test("a row that has not moved stays where it is", () => {
    const boxes = stack(keys);
    for (const box of boxes) {
      if (box.kind !== "entry") continue;
      const centre = (box.top + box.bottom) / 2;
      expect(nearestSlot(boxes, box.entryId, centre, gap)).toBe(slotOf(boxes, box.entryId));
    }
  });

  test("a row moves past its neighbour half way to the neighbour's place", () => {
    const boxes = stack(keys);
    const a = boxes[1]!;
    const centre = (a.top + a.bottom) / 2;
    expect(nearestSlot(boxes, "a", centre + (row + gap) / 2 - 1, gap)).toBe(1);
    expect(nearestSlot(boxes, "a", centre + (row + gap) / 2 + 1, gap)).toBe(2);
  });

  test("no row goes above the first head or below the last place", () => {
    const boxes = stack(keys);
    expect(nearestSlot(boxes, "c", -500, gap)).toBe(1);
    expect(nearestSlot(boxes, "c", 5000, gap)).toBe(slotCount(boxes));
  });

  test("a slot is a set, a section and a place in it", () => {
    const boxes = stack(keys);
    expect(placeOfSlot(boxes, "a", 1)).toEqual({ setId: "s1", section: 0, index: 0 });
    expect(placeOfSlot(boxes, "a", 3)).toEqual({ setId: "s1", section: 0, index: 2 });
    expect(placeOfSlot(boxes, "a", 4)).toEqual({ setId: "s1", section: 1, index: 0 });
    expect(placeOfSlot(boxes, "a", 5)).toEqual({ setId: "s1", section: 1, index: 1 });
    expect(placeOfSlot(boxes, "a", 6)).toEqual({ setId: "s2", section: 0, index: 0 });
    expect(placeOfSlot(boxes, "a", 7)).toEqual({ setId: "s2", section: 0, index: 1 });
  });

  test("an empty section takes a row", () => {
    const boxes = stack(["s1/0", "a", "s2/0"]);
    expect(placeOfSlot(boxes, "a", 2)).toEqual({ setId: "s2", section: 0, index: 0 });
  });

  test("showing the answer does not change it, whatever the heights of the others", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 2, max: 12 }),
        fc.integer({ min: 0, max: 11 }),
        fc.array(fc.integer({ min: 40, max: 120 }), { minLength: 12, maxLength: 12 }),
        fc.integer({ min: -50, max: 1500 }),
        (count, pick, tall, centre) => {
          const names = Array.from({ length: count }, (_, index) => `e${index}`);
          const list = ["s1/0", ...names];
          const entry = names[pick % count]!;
          const heights = Object.fromEntries(
            names.map((name, index) => [name, name === entry ? row : tall[index]!]),
          );
          const slot = nearestSlot(stack(list, heights), entry, centre, gap);
          const shown = moved(list, entry, slot);
          expect(nearestSlot(stack(shown, heights), entry, centre, gap)).toBe(slot);
        },
      ),
      { numRuns: 500 },
    );
  });
});
