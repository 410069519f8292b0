import type { Answer } from "#app/domain/planning/answer.ts";
import type { KnownPlan } from "#app/domain/planning/known-plan.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { search } from "#app/domain/planning/search.ts";

/** What is known of a problem after some of the effort; `done` where nothing better will come. */
export type PlanStep = { answer: Answer | null; bound: number; effort: number; done: boolean };

/**
 * Plans one problem, step by step, for the browser's worker and for the server's: whoever goes through all the steps has
 * the same answers as anybody else. Leave it at any step; its answer is valid and its bound true.
 *
 * @param effort how much to do, see `usualEffort`
 * @param from a plan that is known already, to begin with
 */
export function* planInSteps(
  problem: Problem,
  { effort, from = null }: { effort: number; from?: KnownPlan | null },
): Generator<PlanStep, void> {
  const steps = search(problem, { effort, from });
  let spent = 0;
  for (;;) {
    const step = steps.next();
    if (step.done) {
      const answer = step.value;
      const bound = answer.status === "infeasible" ? Number.POSITIVE_INFINITY : answer.bound;
      yield { answer, bound, effort: spent, done: true };
      return;
    }
    spent = step.value.effort;
    yield { ...step.value, done: false };
  }
}
