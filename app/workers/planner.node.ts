import type { Answer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { planInSteps } from "#app/workers/plan-in-steps.ts";

export type PlannerJob = { problem: Problem; effort: number; milliseconds: number };

/**
 * An answer and why the search ended: it was `settled` (nothing is better, or nothing is possible), or the `effort` or the
 * `time` it was given was spent and more might find or prove more.
 */
export type PlannerAnswer = { answer: Answer; ended: "settled" | "effort" | "time" };

/** Plans one problem in a thread of the server's. Time is the server's affair: past it, the best so far is the answer. */
export default function plan({ problem, effort, milliseconds }: PlannerJob): PlannerAnswer {
  const end = performance.now() + milliseconds;
  for (const { answer, done } of planInSteps(problem, { effort })) {
    if (answer && done) return { answer, ended: answer.status === "feasible" ? "effort" : "settled" };
    if (answer && performance.now() > end) return { answer, ended: "time" };
  }
  throw new Error("A search ended without an answer.");
}
