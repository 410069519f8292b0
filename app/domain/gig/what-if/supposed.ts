import type { Edit } from "#app/domain/gig/edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { GigPlan, SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Answer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** A gig and what an act owns as a question supposes them. */
export type Supposed = {
  gig: Gig;
  repertoire: Repertoire;
  /** What makes the gig so; none where only what the act owns is supposed. */
  edits: Edit[];
  /** The sets to be planned anew. */
  setIds: string[];
};

/** What may change beside what is supposed: guitars and ways alone, or the order too. */
export type Freedom = "same-order" | "any-order";

/** One set to be planned by the search. Equal problems have equal keys. */
export type Job = { key: string; setId: string; freedom: Freedom; problem: Problem };

/** What the search knows of a problem so far. */
export type Known = { answer: Answer | null; bound: number; done: boolean };

/** A set's problem with as much freedom as is asked for. */
export function freed(problem: Problem, freedom: Freedom): Problem {
  return { ...problem, maxMoved: freedom === "same-order" ? 0 : null };
}

/** One problem as the search is asked for it. */
export function jobOf(set: Pick<SetPlan, "set" | "problem">, freedom: Freedom): Job {
  const problem = freed(set.problem, freedom);
  return { key: JSON.stringify(problem), setId: set.set.id, freedom, problem };
}

/**
 * The problems to be solved for some sets, the cheap ones first.
 * @param plan the gig as it is supposed, planned
 * @example jobsOf(planGig(supposed.gig, supposed.repertoire), ["set1"]).map((job) => job.freedom)
 *   // ["same-order", "any-order"]
 */
export function jobsOf(plan: GigPlan, setIds: readonly string[]): Job[] {
  const sets = plan.sets.filter((one) => setIds.includes(one.set.id) && one.problem.songs.length > 0);
  const kept = sets.map((set) => jobOf(set, "same-order"));
  const free = sets
    .filter((set) => set.problem.songs.length > 1)
    .map((set) => jobOf(set, "any-order"))
    .toSorted((a, b) => a.problem.songs.length - b.problem.songs.length);
  return [...kept, ...free];
}
