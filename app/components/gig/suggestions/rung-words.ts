import type { Standing } from "#app/domain/gig/certainty.ts";
import { type Lead, leadOf, leastLead } from "#app/domain/gig/lead.ts";
import type { Rung } from "#app/domain/gig/rungs.ts";
import { leadFigure } from "#app/domain/gig/saved-words.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

export const rungTitles: Record<Rung, string> = {
  "same-order": "Same order, other guitars",
  "move-one": "Move one song",
  "move-two": "Move two",
  "move-three": "Move three",
  "any-order": "Any order",
};

/**
 * The rungs that gain nothing over what stands before them, in one line.
 * @example foldedWords(["move-three", "any-order"]) // "Move three, any order: nothing less."
 */
export function foldedWords(rungs: readonly Rung[]): string {
  const [first = "", ...others] = rungs.map((rung) => rungTitles[rung]);
  const names = [first, ...others.map((title) => title.replace(/^./, (letter) => letter.toLowerCase()))];
  return `${names.join(", ")}: nothing less.`;
}

/** How far a search has come, in what leads: what is found, and below what nothing is possible. */
export type Closing = { found: number; least: number; words: string };

/**
 * What is found and what is proven impossible, drawing near each other.
 * @example closingOf("dead-air", problem, best).words // "Found 79 s. Less than 61 s is impossible."
 */
export function closingOf(lead: Lead, problem: Problem, best: Standing): Closing {
  const found = leadOf(lead, best);
  const least = Math.min(found, leastLead(lead, problem, best.bound));
  const { value, unit } = leadFigure(lead, best);
  const floor = Math.floor(least + 1e-6);
  const than = lead === "dead-air" || lead === "own" ? "Less" : "Fewer";
  const unitOf = lead === "dead-air" ? " s" : "";
  const words =
    floor > 0
      ? `Found ${value} ${unit}. ${than} than ${floor}${unitOf} ${lead === "dead-air" || lead === "own" ? "is" : "are"} impossible.`
      : `Found ${value} ${unit}.`;
  return { found, least, words };
}
