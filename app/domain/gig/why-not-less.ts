import { type Lead, leadOf } from "#app/domain/gig/lead.ts";
import { savedWords } from "#app/domain/gig/saved-words.ts";
import { isFound } from "#app/domain/gig/suggest.ts";
import type { Lift } from "#app/domain/gig/why-not-less-lift.ts";
import type { Answer, FoundAnswer } from "#app/domain/planning/answer.ts";

/** One thing that holds the best answer up, and what there would be less without it. */
export type Holding = {
  /** "Harrow Weather held first" */
  name: string;
  /** "29 s less", "2 strings fewer": what leads first. */
  saves: string[];
  /** What would be done instead: "in EADGBE, no capo". */
  instead: string | null;
  /** Proven to be all that lifting this saves; else at least so much. */
  proven: boolean;
};

export type WhyNotLess = {
  /** What holds the answer up, the greatest saving first. */
  holding: Holding[];
  /** Names of things of which it is not known whether they do. */
  undecided: string[];
  tried: number;
};

/**
 * What of the things that were lifted, each by itself, holds an answer up.
 * @param best the best answer in any order, with everything in place
 * @param tried each thing with the answer that its lifting gave, in any order
 * @example whyNotLess("dead-air", best, [{ lift, answer }]).holding[0]?.saves // ["29 s less"]
 */
export function whyNotLess(
  lead: Lead,
  best: FoundAnswer,
  tried: readonly { lift: Lift; answer: Answer }[],
): WhyNotLess {
  const least = lead === "own" ? 1e-6 * Math.max(1, best.total) : 0.5;
  const holding: (Holding & { saved: number })[] = [];
  const undecided: string[] = [];
  for (const { lift, answer } of tried) {
    if (!isFound(answer)) continue;
    const saved = leadOf(lead, best) - leadOf(lead, answer);
    const proven = answer.status === "optimal";
    if (saved > least)
      holding.push({
        name: lift.name,
        saves:
          lead === "own"
            ? [`${Math.round(saved * 10) / 10} less by your weights`]
            : savedWords(lead, best, answer),
        instead: lift.instead(answer),
        proven,
        saved,
      });
    else if (!proven && answer.bound < best.total - 1e-6 * Math.max(1, best.total)) undecided.push(lift.name);
  }
  return {
    holding: holding.toSorted((a, b) => b.saved - a.saved).map(({ saved: _, ...rest }) => rest),
    undecided,
    tried: tried.length,
  };
}
