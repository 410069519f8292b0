import type { Answer } from "#app/domain/planning/answer.ts";
import type { KnownPlan } from "#app/domain/planning/known-plan.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { search, usualEffort } from "#app/domain/planning/search.ts";

/**
 * The plan with the least total that is found, and how low a total could be at best.
 *
 * Exact (`optimal`, proven) for up to 9 songs, and for sets without a tech whose order stays (`maxMoved` 0); beyond that
 * as far as `effort` goes. Counts of effort, not of time, decide, so that every machine gives the same answer.
 *
 * @param effort states to look at; see `usualEffort`
 * @param stop asked every few milliseconds; once it says so, the best answer so far is returned. While there is none
 *   yet, it goes on until there is.
 * @param from a plan that is known already, such as the answer to the same set of which fewer songs may move: the answer is
 *   no worse. One that does not hold for this problem is overlooked. The same problem, effort and plan give the same answer.
 * @throws nothing, for any problem that `parseProblem` lets through
 * @example solve(problem).status // "optimal"
 */
export function solve(
  problem: Problem,
  {
    effort = usualEffort,
    stop = () => false,
    from = null,
  }: { effort?: number; stop?: () => boolean; from?: KnownPlan | null } = {},
): Answer {
  const run = search(problem, { effort, from });
  for (;;) {
    const step = run.next();
    if (step.done) return step.value;
    if (step.value.answer && stop()) return step.value.answer;
  }
}
