import type { Answer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { type Progress, search } from "#app/domain/planning/search.ts";

export function solve(
  problem: Problem,
  { effort, stop = () => false }: { effort?: number; stop?: () => boolean } = {},
): Answer {
  const run = search(problem, { effort });
  let last: Progress | null = null;
  for (;;) {
    const step = run.next();
    if (step.done) return step.value;
    last = step.value;
    if (stop() && last.answer) return { ...last.answer, bound: last.bound };
  }
}
