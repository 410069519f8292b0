import { useMemo } from "react";
import { type PlannerAnswers, usePlannerAnswers } from "#app/components/gig/planner/use-planner-answers.ts";
import type { GigPlan } from "#app/domain/gig/plan.ts";
import { type Rung, rungProblem } from "#app/domain/gig/suggest.ts";
import type { Answer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

const rungs = ["same-order", "any-order"] as const satisfies readonly Rung[];

/** What is known so far of one rung of one set. */
export type RungState = { rung: Rung; answer: Answer | null; done: boolean };
export type SetSuggestions = { setId: string; rungs: RungState[] };

export type Suggestions = {
  sets: SetSuggestions[];
  /** The search has begun: not on the server, nor without JavaScript. */
  begun: boolean;
  /** What went wrong with the planner itself, in words; null where nothing did. */
  failed: string | null;
};

/** How much the search may do for one rung: a few seconds for a set of 20 songs. */
const effort = 400_000;

type Job = { setId: string; rung: Rung; key: string; problem: Problem };

function jobsOf(plan: GigPlan): Job[] {
  return rungs.flatMap((rung) =>
    plan.sets
      .filter((set) => set.problem.songs.length > 1)
      .map((set) => {
        const problem = rungProblem(set.problem, rung);
        return { setId: set.set.id, rung, key: JSON.stringify(problem), problem };
      }),
  );
}

/** Orders and guitars that need less dead air than the gig as it stands, worked out beside the page. */
export function useSuggestions(plan: GigPlan): Suggestions {
  const jobs = useMemo(() => jobsOf(plan), [plan]);
  const { known, begun, failed } = usePlannerAnswers(jobs, { effort });
  const sets = useMemo(() => suggestionsOf(jobs, known), [jobs, known]);
  return useMemo(() => ({ sets, begun, failed }), [sets, begun, failed]);
}

function suggestionsOf(jobs: readonly Job[], known: PlannerAnswers["known"]): SetSuggestions[] {
  const setIds = [...new Set(jobs.map((job) => job.setId))];
  return setIds.map((setId) => ({
    setId,
    rungs: jobs
      .filter((job) => job.setId === setId)
      .map(({ rung, key }) => ({
        rung,
        answer: known.get(key)?.answer ?? null,
        done: known.get(key)?.done ?? false,
      })),
  }));
}
