import type { FoundAnswer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** A single thing that may hold a set's best answer up, and the set's problem without it. */
export type Lift = {
  /** "Harrow Weather held first" */
  name: string;
  problem: Problem;
  /** What an answer to that problem does that could not be done before: "string 6 down to C2"; null: nothing to tell. */
  instead: (answer: FoundAnswer) => string | null;
};

/** For what needs no more words than its name. */
export const nothingInstead = () => null;
