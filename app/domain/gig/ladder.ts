import type { Standing } from "#app/domain/gig/certainty.ts";
import type { Rung } from "#app/domain/gig/rungs.ts";
import { isFound } from "#app/domain/gig/suggest.ts";
import type { Answer, FoundAnswer, InfeasibleAnswer } from "#app/domain/planning/answer.ts";
import type { Evaluation } from "#app/domain/planning/evaluate.ts";

/** What is known so far of one rung. */
export type RungKnown = { rung: Rung; answer: Answer | null; bound: number; done: boolean };

/**
 * A rung as it is shown. `gains`: less than every rung before it and than now. `folded`: rungs one after another that need
 * no less than what stands before them, which is `best`. `looking`: not done, and nothing gained yet. `refused`: no order
 * at all.
 */
export type LadderStep =
  | { kind: "gains"; rung: Rung; answer: FoundAnswer; done: boolean }
  | { kind: "folded"; rungs: Rung[]; best: Standing }
  | { kind: "looking"; rung: Rung; best: Standing | null }
  | { kind: "refused"; rung: Rung; answer: InfeasibleAnswer };

const within = 1e-9;

/** With a bound that may be better than the one it was found with. */
function standing<Known extends Standing>(answer: Known, bound: number): Known {
  const better = Math.max(answer.bound, bound);
  const proven = better >= answer.total - 1e-9 * Math.max(1, answer.total);
  return {
    ...answer,
    bound: proven ? answer.total : better,
    status: proven ? "optimal" : answer.status,
  };
}

/**
 * The rungs as they are shown, cheapest first. What a rung allows, every later one allows too: so a later rung's bound
 * holds for those before it, and an earlier rung's order stands until a later one is better.
 *
 * @param now the set as it stands; where it breaks a rule it is no answer, and the first order found gains
 * @param known in the order of the rungs
 */
export function ladderOf(
  now: Pick<Evaluation, "total" | "totals" | "breaches">,
  known: readonly RungKnown[],
): LadderStep[] {
  const floors = known.map((_, index) =>
    Math.max(0, ...known.slice(index).flatMap(({ bound }) => (Number.isFinite(bound) ? [bound] : []))),
  );
  let best: Standing | null =
    now.breaches.length > 0 ? null : { status: "feasible", total: now.total, totals: now.totals, bound: 0 };
  const steps = known.map(({ rung, answer, done }, index): LadderStep => {
    if (answer && !isFound(answer)) return { kind: "refused", rung, answer };
    const floor = floors[index]!;
    const gains = answer && (!best || answer.total < best.total - within * Math.max(1, best.total));
    if (gains) {
      const found = standing(answer, floor);
      best = found;
      return { kind: "gains", rung, answer: found, done: done || found.status === "optimal" };
    }
    // What was proven of it among fewer orders is not proven among more.
    const so = best && standing<Standing>({ ...best, status: "feasible", bound: 0 }, floor);
    return so && (done || so.status === "optimal")
      ? { kind: "folded", rungs: [rung], best: so }
      : { kind: "looking", rung, best: so };
  });
  return foldedTogether(steps);
}

/** Folded neighbours are one step: what is proven of the last holds for those before it. */
function foldedTogether(steps: readonly LadderStep[]): LadderStep[] {
  const shown: LadderStep[] = [];
  for (const step of steps) {
    const last = shown.at(-1);
    if (step.kind === "folded" && last?.kind === "folded")
      shown.splice(-1, 1, { ...step, rungs: [...last.rungs, ...step.rungs] });
    else shown.push(step);
  }
  return shown;
}
