import type { FoundAnswer, Gap } from "#app/domain/planning/answer.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import type { Option } from "#app/domain/planning/model.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** A total counts as proven when the bound comes this close to it, as a share of it. */
export const PROVEN_WITHIN = 1e-9;

/** Songs by number in the order they are played, and how each is played. */
export type NumberedPlan = { songs: number[]; options: Option[] };

/**
 * The answer that a plan makes, scored from the problem itself.
 *
 * @param bound proven lower bound on the total; what exceeds the total is rounding
 * @throws Error where the plan breaks the problem's own rules: a mistake in the search, never the user's
 */
export function answerOf(problem: Problem, plan: NumberedPlan, bound: number): FoundAnswer {
  const order = plan.songs.map((song) => problem.order[song]!);
  const plays = plan.options.map(({ guitar, choice }, i) => ({
    song: order[i]!,
    guitar: problem.guitars[guitar]!.id,
    neck: choice,
  }));
  const { total, totals, before, gaps, breaches, broken } = evaluate(problem, order, plays);
  if (breaches.length > 0) throw new Error(`The search broke a rule: ${breaches[0]!.message}`);
  const proven = bound >= total - PROVEN_WITHIN * Math.max(1, total);
  return {
    status: proven ? "optimal" : "feasible",
    total,
    bound: proven ? total : bound,
    totals,
    order,
    plays,
    before: before.map(({ guitar, open, capos }) => ({ guitar, open: [...open], capos: copyCapos(capos) })),
    gaps: gaps.map(({ into, swap, seconds, work }): Gap => ({ into, swap, seconds, work })),
    ...(broken ? { broken } : {}),
  };
}

const copyCapos = (capos: { fret: number; strings: number[] }[]) =>
  capos.map(({ fret, strings }) => ({ fret, strings: [...strings] }));
