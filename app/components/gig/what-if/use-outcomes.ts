import { useMemo } from "react";
import { usePlannerAnswers } from "#app/components/gig/planner/use-planner-answers.ts";
import { type Asked, asItIs, foundOutcome, type Outcome } from "#app/domain/gig/what-if/outcome.ts";
import { type Freedom, type Job, jobsOf, type Known } from "#app/domain/gig/what-if/supposed.ts";
import { usualEffort } from "#app/domain/planning/search.ts";

export const freedoms: readonly Freedom[] = ["same-order", "any-order"];

/** The answers to a question that are known so far, in the order in which they are shown. */
export type Outcomes = {
  outcomes: Outcome[];
  /** What re-planning alone does, without what is supposed; as far as it was asked and is known. */
  unsupposed: Outcome[];
  /** Why there is no order at all, in words. */
  refused: string[];
  /** More is being worked out. */
  working: boolean;
  /** What went wrong with the planner itself, in words; null where nothing did. */
  failed: string | null;
};

/** Each problem once: the first of those with the same key. */
export function eachOnce(jobs: readonly Job[]): Job[] {
  return [...new Map(jobs.toReversed().map((job) => [job.key, job])).values()].reverse();
}

export function outcomesOf(asked: Asked, known: ReadonlyMap<string, Known>): Outcome[] {
  return freedoms.flatMap((freedom) => foundOutcome(asked, freedom, known).outcome ?? []);
}

/**
 * Works out a question beside the page.
 * @param plain whether what is supposed, with all else as it is, is an answer of its own
 * @param unsupposed the same sets as they are, where re-planning alone is to be set against it
 */
export function useOutcomes(asked: Asked, plain: boolean, unsupposed?: Asked): Outcomes {
  const jobs = useMemo(() => {
    const other = unsupposed ? jobsOf(unsupposed.planned, unsupposed.supposed.setIds) : [];
    return eachOnce([...jobsOf(asked.planned, asked.supposed.setIds), ...other]);
  }, [asked, unsupposed]);
  const { known, begun, failed } = usePlannerAnswers(jobs, { effort: usualEffort });
  return useMemo(() => {
    const refused = freedoms.flatMap((freedom) => foundOutcome(asked, freedom, known).refused);
    return {
      outcomes: [...(plain ? [asItIs(asked)] : []), ...outcomesOf(asked, known)],
      unsupposed: unsupposed ? outcomesOf(unsupposed, known) : [],
      refused: [...new Set(refused)],
      working: begun && jobs.some((job) => !known.get(job.key)?.done),
      failed,
    };
  }, [asked, plain, unsupposed, jobs, known, begun, failed]);
}
