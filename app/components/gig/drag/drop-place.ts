import type { Section } from "#app/domain/gig/gig.ts";

/** What stands in the list, top to bottom: the head of a section, or an entry's row. Heights in CSS pixels. */
export type Box =
  | { kind: "head"; setId: string; section: Section; top: number; bottom: number }
  | { kind: "entry"; entryId: string; top: number; bottom: number };

/** Where an entry goes: its place among the others of the section, 0 first. */
export type Place = { setId: string; section: Section; index: number };

/** The other boxes where they would stand if the dragged row were lifted out. */
function without(boxes: readonly Box[], entryId: string): Box[] {
  const at = boxes.findIndex((box) => box.kind === "entry" && box.entryId === entryId);
  const active = boxes[at];
  const next = boxes[at + 1];
  if (!active) return [...boxes];
  const shift = next ? next.top - active.top : 0;
  return boxes.flatMap((box, index) => {
    if (index === at) return [];
    return index < at ? [box] : [{ ...box, top: box.top - shift, bottom: box.bottom - shift }];
  });
}

/** Centre of the dragged row if it stood after the first `slot` others. */
function slotCentre(others: readonly Box[], slot: number, height: number, gap: number): number {
  const above = others[slot - 1]!;
  return above.bottom + (above.kind === "head" ? 0 : gap) + height / 2;
}

function heightOf(boxes: readonly Box[], entryId: string): number {
  const active = boxes.find((box) => box.kind === "entry" && box.entryId === entryId);
  return active ? active.bottom - active.top : 0;
}

/**
 * The slot (1 is right below the first head) whose row centre lies nearest to `centre`. It looks only at the rows
 * that are not dragged, so showing the answer does not change the answer.
 * @example nearestSlot([head 0-30, entry a 30-70, entry b 90-130], "a", 115, 20) // 2: below b
 */
export function nearestSlot(boxes: readonly Box[], entryId: string, centre: number, gap: number): number {
  const others = without(boxes, entryId);
  const height = heightOf(boxes, entryId);
  let best = 1;
  for (let slot = 2; slot <= others.length; slot += 1) {
    const distance = Math.abs(slotCentre(others, slot, height, gap) - centre);
    if (distance < Math.abs(slotCentre(others, best, height, gap) - centre)) best = slot;
  }
  return best;
}

/** The slot in which the entry stands now. */
export function slotOf(boxes: readonly Box[], entryId: string): number {
  return boxes.findIndex((box) => box.kind === "entry" && box.entryId === entryId);
}

/** How many slots there are: one below each of the other boxes. */
export function slotCount(boxes: readonly Box[]): number {
  return boxes.length - 1;
}

/**
 * Set, section and place that a slot stands for.
 * @example placeOfSlot([head main, entry a, entry b, head encore], "a", 3) // in the encore, index 0
 */
export function placeOfSlot(boxes: readonly Box[], entryId: string, slot: number): Place {
  const above = without(boxes, entryId).slice(0, slot);
  const headAt = above.findLastIndex((box) => box.kind === "head");
  const head = above[headAt];
  if (head?.kind !== "head") throw new RangeError("A slot stands below the head of a section");
  return { setId: head.setId, section: head.section, index: above.length - headAt - 1 };
}
