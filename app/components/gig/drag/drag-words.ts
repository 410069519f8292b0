import type { Place } from "#app/components/gig/drag/drop-place.ts";
import { type Part, partName } from "#app/components/gig/sets/moves.ts";

/**
 * Where a row stands while it is moved, as a screen reader says it.
 * @example placeWords("Low Meadow", { setId: "s1", section: 0, index: 2 }, parts, titleOf)
 * // "Low Meadow: place 3 of 12 in Set 1, after Tin Roof Waltz"
 */
export function placeWords(
  title: string,
  place: Place,
  parts: readonly Part[],
  entryId: string,
  titleOf: (entryId: string) => string,
): string {
  const part = parts.find((one) => one.setId === place.setId && one.section === place.section);
  const others = part?.entryIds.filter((id) => id !== entryId) ?? [];
  const above = others[place.index - 1];
  const beside = above ? `after ${titleOf(above)}` : "first";
  const where = part ? partName(part) : "the gig";
  return `${title}: place ${place.index + 1} of ${others.length + 1} in ${where}, ${beside}`;
}

/** What a screen reader says about the handle before anything is moved. */
export const dragInstructions =
  "Press Space to pick the song up, the arrow keys to move it, Space to put it down, Escape to put it back.";
