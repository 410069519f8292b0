import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import { freeingsOf } from "#app/domain/gig/freeings.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { setProblem } from "#app/domain/gig/set-problem.ts";
import { type Lift, nothingInstead } from "#app/domain/gig/why-not-less-lift.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** The set's problem after some edits of the gig. */
export function problemAfter(
  gig: Gig,
  plan: SetPlan,
  repertoire: Repertoire,
  edits: readonly Edit[],
): Problem | null {
  const applied = applyEdits(gig, edits);
  return applied.ok ? setProblem(applied.gig, plan.set.id, repertoire).problem : null;
}

/** Each song that is held at a place, and each rule between two songs. */
export function ruleLifts(
  gig: Gig,
  plan: SetPlan,
  repertoire: Repertoire,
  title: (id: string) => string,
): Lift[] {
  return freeingsOf(gig, plan, title).flatMap(({ name, edits }) => {
    const problem = problemAfter(gig, plan, repertoire, edits);
    return problem ? [{ name, problem, instead: nothingInstead }] : [];
  });
}
