import { useEffect, useMemo, useRef, useState } from "react";
import type { GigPlan } from "#app/domain/gig/plan.ts";
import { type Rung, rungProblem } from "#app/domain/gig/suggest.ts";
import type { Answer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import type { PlannerAsk, PlannerTold } from "#app/workers/planner.browser.ts";

export const rungs = ["same-order", "any-order"] as const satisfies readonly Rung[];

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
/** How long the gig must have stood still before the search begins anew. */
const quietMilliseconds = 250;
/** Answers kept of problems that were worked out already, so that undo needs no new search. */
const keptAnswers = 40;

type Job = { setId: string; rung: Rung; key: string; problem: Problem };
type Known = Map<string, { answer: Answer; done: boolean }>;

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

/** The planner in a worker of the browser. It lives as long as the page and is told of each change of the gig. */
function usePlanner(onTold: (told: PlannerTold) => void, onFail: () => void) {
  const worker = useRef<Worker | null>(null);
  const latest = useRef({ onTold, onFail });
  useEffect(() => {
    latest.current = { onTold, onFail };
  });
  useEffect(() => {
    const planner = new Worker(new URL("../../../workers/planner.browser.ts", import.meta.url), {
      type: "module",
    });
    planner.onmessage = ({ data }: MessageEvent<PlannerTold>) => latest.current.onTold(data);
    planner.onerror = () => latest.current.onFail();
    worker.current = planner;
    return () => {
      planner.terminate();
      worker.current = null;
    };
  }, []);
  return worker;
}

/** Orders and guitars that need less dead air than the gig as it stands, worked out beside the page. */
export function useSuggestions(plan: GigPlan): Suggestions {
  const jobs = useMemo(() => jobsOf(plan), [plan]);
  const [known, setKnown] = useState<Known>(new Map());
  const [begun, setBegun] = useState(false);
  const [failed, setFailed] = useState<string | null>(null);
  const run = useRef(0);
  const knownNow = useRef(known);
  useEffect(() => {
    knownNow.current = known;
  }, [known]);
  const worker = usePlanner(
    ({ run: from, key, answer, done }) => {
      if (from !== run.current) return;
      setKnown((before) => {
        const others = [...before].filter(([other]) => other !== key).slice(-keptAnswers);
        return new Map([...others, [key, { answer, done }]]);
      });
    },
    () => setFailed("The suggestions could not be worked out in this browser. Load the page again."),
  );
  const asked = jobs.map((job) => job.key).join("\n");
  // biome-ignore lint/correctness/useExhaustiveDependencies: the search begins anew when the problems change, not their objects
  useEffect(() => {
    run.current += 1;
    setBegun(true);
    const stop: PlannerAsk = { run: run.current, jobs: [], effort };
    worker.current?.postMessage(stop);
    const timer = setTimeout(() => {
      const open = jobs.filter((job) => !knownNow.current.get(job.key)?.done);
      const ask: PlannerAsk = {
        run: run.current,
        jobs: open.map(({ key, problem }) => ({ key, problem })),
        effort,
      };
      worker.current?.postMessage(ask);
    }, quietMilliseconds);
    return () => clearTimeout(timer);
  }, [asked, worker]);
  const sets = useMemo(() => suggestionsOf(jobs, known), [jobs, known]);
  return useMemo(() => ({ sets, begun, failed }), [sets, begun, failed]);
}

function suggestionsOf(jobs: readonly Job[], known: Known): SetSuggestions[] {
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
