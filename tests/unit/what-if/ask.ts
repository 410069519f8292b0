import type { Gig } from "#app/domain/gig/gig.ts";
import { type GigPlan, planGig } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { type Asked, askedOf, foundOutcome, type Outcome } from "#app/domain/gig/what-if/outcome.ts";
import {
  type Freedom,
  type Job,
  jobsOf,
  type Known,
  type Supposed,
} from "#app/domain/gig/what-if/supposed.ts";
import { solve } from "#app/domain/planning/solve.ts";

/** Solves problems as the page's worker does. */
export function solved(jobs: readonly Pick<Job, "key" | "problem">[]): Map<string, Known> {
  return new Map(
    jobs.map(({ key, problem }) => {
      const answer = solve(problem, { effort: 200_000 });
      return [key, { answer, bound: answer.status === "infeasible" ? 0 : answer.bound, done: true }];
    }),
  );
}

/** A question asked of a gig, and everything the search has to say to it. */
export function ask(
  gig: Gig,
  repertoire: Repertoire,
  suppose: (gig: Gig, plan: GigPlan, repertoire: Repertoire) => Supposed,
): { asked: Asked; answer: (freedom: Freedom) => Outcome } {
  const now = planGig(gig, repertoire);
  const asked = askedOf(gig, now, suppose(gig, now, repertoire), "english");
  const known = solved(jobsOf(asked.planned, asked.supposed.setIds));
  return {
    asked,
    answer: (freedom) => {
      const { outcome, refused } = foundOutcome(asked, freedom, known);
      if (!outcome) throw new Error(`There is no answer. ${refused.join(" ")}`);
      return outcome;
    },
  };
}
