import type { Answer, FoundAnswer } from "#app/domain/planning/answer.ts";
import { answerOf, type NumberedPlan } from "#app/domain/planning/answer-of.ts";
import { partitionBound } from "#app/domain/planning/bounds/partition-bound.ts";
import { modelOf } from "#app/domain/planning/model.ts";
import { compileRules } from "#app/domain/planning/order-rules.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { beam } from "#app/domain/planning/search/beam.ts";
import { BestFirst } from "#app/domain/planning/search/best-first.ts";
import { setSpace } from "#app/domain/planning/set-space.ts";
import { songsWithoutGuitar } from "#app/domain/planning/why-infeasible.ts";

/** The best answer so far (`null`: none yet), what no plan can undercut, and the effort spent. */
export type Progress = { answer: FoundAnswer | null; bound: number; effort: number };

/** Enough for a set of an evening: about a second. */
export const usualEffort = 200_000;

/** Sets that are always solved to the end, whatever effort is asked. */
const SMALL_SET = 9;
const UNLIMITED = 20_000_000;
const PORTION = 2_000;
const STATE_MEMORY = 200_000_000;

/** Searches for the plan with the least total and yields what it knows from time to time. The last word is returned. */
export function* search(
  problem: Problem,
  { effort: asked = usualEffort }: { effort?: number } = {},
): Generator<Progress, Answer> {
  const model = modelOf(problem);
  const compiled = compileRules(problem);
  const noGuitar = songsWithoutGuitar(model);
  const why = [...noGuitar, ...(compiled.ok ? [] : compiled.why)];
  if (why.length > 0 || !compiled.ok) return { status: "infeasible", why };
  const small = model.songs <= SMALL_SET || (problem.maxMoved === 0 && !model.tech);
  const effort = small ? Math.max(asked, UNLIMITED) : asked;

  const space = setSpace(model, compiled.rules, (layout) => partitionBound(model, compiled.rules, layout));
  const room = Math.floor(STATE_MEMORY / (60 + 6 * space.width));
  let best: NumberedPlan | null = null;
  let answer: FoundAnswer | null = null;
  const proof = new BestFirst(space, room);
  const first = beam(space, 30);
  if (first.way) {
    best = space.planOf(first.way.moves);
    answer = answerOf(problem, best, 0);
    proof.setLimit(answer.total);
  }
  let spent = first.expanded;
  while (!proof.exhausted && spent < effort) {
    proof.run(Math.min(PORTION, effort - spent));
    spent = first.expanded + proof.expanded;
    if (proof.found) {
      best = space.planOf(proof.found.moves);
      answer = answerOf(problem, best, proof.floor());
    }
    yield { answer, bound: proof.floor(), effort: spent };
  }
  if (best) return answerOf(problem, best, proof.floor());
  return { status: "infeasible", why: [{ code: "rules", songs: [], message: "No order keeps all rules." }] };
}
