import { type Lead, leadOf, leastLead } from "#app/domain/gig/lead.ts";
import type { Rung } from "#app/domain/gig/rungs.ts";
import type { FoundAnswer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/**
 * Seconds of dead air that no valid plan goes below, from an answer's bound on the weighed total. Seconds of broken wishes
 * count as dead air here.
 */
export function leastDeadAir(problem: Problem, bound: number): number {
  return leastLead("dead-air", problem, bound);
}

/** How good the best order so far is, and what is proven about it. */
export type Standing = Pick<FoundAnswer, "status" | "total" | "totals" | "bound">;

/** Who cannot do better, by what is given up. */
const nobody: Record<Rung, string> = {
  "same-order": "in this order, no choice of guitars needs",
  "move-one": "with one song moved, nothing needs",
  "move-two": "with two songs moved, nothing needs",
  "move-three": "with three songs moved, nothing needs",
  "any-order": "no order needs",
};

const less: Record<Lead, string> = {
  "dead-air": "less dead air",
  strings: "fewer strings",
  capos: "fewer capo changes",
  guitars: "fewer guitar changes",
  own: "less by your weights",
};

/** The total that is proven where what leads is not so by itself. */
const together: Record<Lead, string> = {
  "dead-air": "less dead air and work together",
  strings: "less, strings counting most",
  capos: "less, capo changes counting most",
  guitars: "less, guitar changes counting most",
  own: less.own,
};

function provenWords(problem: Problem, answer: Standing, rung: Rung, lead: Lead): string {
  const wishes = (answer.totals.wishes ?? 0) > 0 || (problem.wishes ?? []).length > 0;
  if (lead === "dead-air" && wishes) return `Proven: ${nobody[rung]} less dead air and wishes together.`;
  const alone = leadOf(lead, answer) <= leastLead(lead, problem, answer.bound) + 1e-6;
  return `Proven: ${nobody[rung]} ${(alone ? less : together)[lead]}.`;
}

const units: Record<Exclude<Lead, "own">, [one: string, many: string]> = {
  "dead-air": ["s less", "s less"],
  strings: ["string fewer", "strings fewer"],
  capos: ["capo change fewer", "capo changes fewer"],
  guitars: ["guitar change fewer", "guitar changes fewer"],
};

const besides: Record<Exclude<Lead, "own">, string> = {
  "dead-air": "no less dead air is possible, fewer strings or changes may be",
  strings: "no fewer strings are possible, less dead air may be",
  capos: "no fewer capo changes are possible, less dead air may be",
  guitars: "no fewer guitar changes are possible, less dead air may be",
};

function openWords(problem: Problem, answer: Standing, lead: Lead): string {
  const wishes = lead === "dead-air" ? (answer.totals.wishes ?? 0) : 0;
  const open = leadOf(lead, answer) + wishes - leastLead(lead, problem, answer.bound);
  if (lead === "own") return `Not proven: at most ${rounded(open)} less by your weights is possible.`;
  const count = Math.ceil(open - 1e-6);
  if (count <= 0) return `Not proven: ${besides[lead]}.`;
  const [one, many] = units[lead];
  return `Not proven: at most ${count} ${count === 1 ? one : many} ${count === 1 || lead === "dead-air" ? "is" : "are"} possible.`;
}

/** To one decimal, upwards. */
function rounded(value: number): string {
  return String(Math.ceil(value * 10 - 1e-6) / 10);
}

/**
 * How sure a suggestion is: which total is proven to be the least, or how much less there may still be.
 * @example certaintyWords(problem, answer, "any-order", "strings") // "Proven: no order needs fewer strings."
 * @example certaintyWords(problem, answer, "any-order", "dead-air") // "Not proven: at most 14 s less is possible."
 */
export function certaintyWords(problem: Problem, answer: Standing, rung: Rung, lead: Lead): string {
  return answer.status === "optimal"
    ? provenWords(problem, answer, rung, lead)
    : openWords(problem, answer, lead);
}
