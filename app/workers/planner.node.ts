import type { Answer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { solve } from "#app/domain/planning/solve.ts";

export type PlannerJob = { problem: Problem; effort: number; milliseconds: number };

/** Plans one problem in a thread of the server's. Time is the server's affair: past it, the best so far is the answer. */
export default function plan({ problem, effort, milliseconds }: PlannerJob): Answer {
  const end = performance.now() + milliseconds;
  return solve(problem, { effort, stop: () => performance.now() > end });
}
