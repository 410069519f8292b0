import { useMemo } from "react";
import { type PlannerAnswers, usePlannerAnswers } from "#app/components/gig/planner/use-planner-answers.ts";
import type { RungKnown } from "#app/domain/gig/ladder.ts";
import type { GigPlan } from "#app/domain/gig/plan.ts";
import { type Rung, rungProblem, rungs } from "#app/domain/gig/rungs.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** What is known so far of one set's rungs, cheapest first. */
export type SetSuggestions = { setId: string; rungs: RungKnown[] };

export type Suggestions = Pick<PlannerAnswers, "begun" | "failed"> & { sets: SetSuggestions[] };

/** How much the search may do for one rung: a few seconds for a set of 20 songs. */
const effort = 400_000;

type Job = { setId: string; rung: Rung; key: string; problem: Problem; after?: string };

/** Cheapest first: each rung of every set before the next rung of any. Each begins with the answer to the one before. */
function jobsOf(plan: GigPlan): Job[] {
  const sets = plan.sets.filter((set) => set.problem.songs.length > 1);
  const before = new Map<string, string>();
  return rungs.flatMap((rung) =>
    sets.map(({ set, problem: whole }): Job => {
      const problem = rungProblem(whole, rung);
      const key = JSON.stringify(problem);
      const after = before.get(set.id);
      before.set(set.id, key);
      return { setId: set.id, rung, key, problem, ...(after ? { after } : {}) };
    }),
  );
}

/** Orders and guitars that need less than the gig as it stands, worked out beside the page. */
export function useSuggestions(plan: GigPlan): Suggestions {
  const jobs = useMemo(() => jobsOf(plan), [plan]);
  const { known, begun, failed } = usePlannerAnswers(jobs, { effort });
  const sets = useMemo(() => suggestionsOf(jobs, known), [jobs, known]);
  return useMemo(() => ({ sets, begun, failed }), [sets, begun, failed]);
}

const unknown = { answer: null, bound: 0, done: false };

function suggestionsOf(jobs: readonly Job[], known: PlannerAnswers["known"]): SetSuggestions[] {
  const setIds = [...new Set(jobs.map((job) => job.setId))];
  return setIds.map((setId) => ({
    setId,
    rungs: jobs
      .filter((job) => job.setId === setId)
      .map(({ rung, key }) => ({ ...unknown, ...known.get(key), rung })),
  }));
}
