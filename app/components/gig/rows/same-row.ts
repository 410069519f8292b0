import type { Row } from "#app/domain/gig/plan.ts";

/** Whether two plain values hold the same. */
function sameValue(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true;
  if (typeof a !== "object" || typeof b !== "object" || a === null || b === null) return false;
  const keys = Object.keys(a);
  if (keys.length !== Object.keys(b).length) return false;
  return keys.every((key) => sameValue(a[key as keyof typeof a], b[key as keyof typeof b]));
}

/** Whether two rows hold the same entry, played in the same way. */
function sameSong(a: Row, b: Row): boolean {
  return a.entry === b.entry && a.song === b.song && a.guitar === b.guitar && a.neck === b.neck;
}

/**
 * Whether a row would be drawn the same. A plan is made anew at each move of a drag, so its rows are new objects, but
 * most of them say what they said before. When a song begins is not drawn in its row.
 */
export function sameRow(a: Row, b: Row): boolean {
  return (
    a === b ||
    (sameSong(a, b) &&
      a.number === b.number &&
      a.section === b.section &&
      a.left === b.left &&
      sameValue(a.retuned, b.retuned) &&
      sameValue(a.gap, b.gap) &&
      sameValue(a.warnings, b.warnings) &&
      sameWords(a.wishes, b.wishes) &&
      sameValue(a.rules, b.rules))
  );
}

/** Whether all of a row but its number would be drawn the same. */
export function sameBody(a: Row, b: Row): boolean {
  return (
    a === b ||
    (sameSong(a, b) &&
      (a.gap === null) === (b.gap === null) &&
      sameValue(a.retuned, b.retuned) &&
      sameWords(a.wishes, b.wishes) &&
      sameValue(a.rules, b.rules) &&
      (a.gap !== null || sameValue(a.warnings, b.warnings)))
  );
}

/** Whether the line of the gap that leads into a row would be drawn the same. */
export function sameGap(a: Row, b: Row): boolean {
  return a === b || (sameSong(a, b) && sameValue(a.gap, b.gap) && sameValue(a.warnings, b.warnings));
}

/** Whether two lists of sentences are the same. */
export function sameWords(a: readonly string[], b: readonly string[]): boolean {
  return a.length === b.length && a.every((words, index) => words === b[index]);
}
