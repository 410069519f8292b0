import type { Problem } from "#app/domain/planning/problem.ts";

/** What a performer gives up, least first: only the choice of guitars, then one to three songs' places, then the order. */
export const rungs = ["same-order", "move-one", "move-two", "move-three", "any-order"] as const;
export type Rung = (typeof rungs)[number];

const mayMove: Record<Rung, number | null> = {
  "same-order": 0,
  "move-one": 1,
  "move-two": 2,
  "move-three": 3,
  "any-order": null,
};

/** A set's problem as one rung asks it. */
export function rungProblem(problem: Problem, rung: Rung): Problem {
  return { ...problem, maxMoved: mayMove[rung] };
}
