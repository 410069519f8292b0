import type { Asked, Outcome } from "#app/domain/gig/what-if/outcome.ts";

export const outcomeNames: Record<Outcome["kind"], string> = {
  "as-it-is": "As planned",
  spare: "The spare",
  "same-order": "This order",
  "any-order": "Any order",
};

/** As long as the words of an undo may be. */
const longestLabel = 160;

/**
 * Words for undoing, cut where they would be too long.
 * @example undoWords("Drop", ["Slow Water", "Stonecrop"]) // "Drop Slow Water, Stonecrop"
 */
export function undoWords(verb: string, things: readonly string[]): string {
  const words = `${verb} ${things.join(", ")}`;
  return words.length <= longestLabel ? words : `${words.slice(0, longestLabel - 1)}…`;
}

/**
 * Minutes and seconds in words.
 * @example lengthWords(382) // "6 min 22 s"
 */
export function lengthWords(seconds: number): string {
  const whole = Math.round(seconds);
  const minutes = Math.floor(whole / 60);
  const parts = [minutes > 0 ? `${minutes} min` : "", whole % 60 > 0 ? `${whole % 60} s` : ""];
  return parts.filter(Boolean).join(" ") || "0 s";
}

/**
 * How much one figure differs from what it is now.
 * @example signedSeconds(90, 60) // "−30 s"
 */
export function signedSeconds(now: number, then: number): string {
  const change = Math.round(then) - Math.round(now);
  if (change === 0) return "±0 s";
  return change > 0 ? `+${change} s` : `−${-change} s`;
}

/** What the present plan is called beside answers: only some of its sets, or all. @example setsNow(asked) // "Set 2 now" */
export function setsNow({ now, supposed }: Asked): string {
  const sets = now.sets.filter((set) => supposed.setIds.includes(set.set.id));
  if (sets.length === now.sets.length) return "Now";
  return `${sets.map((set) => set.set.name).join(", ")} now`;
}
