import { useEffect, useMemo, useRef, useState } from "react";
import type { Answer } from "#app/domain/planning/answer.ts";
import type { PlannerAsk, PlannerJob, PlannerTold } from "#app/workers/planner.browser.ts";

/** What is known of a problem so far: the best answer (null: none yet), what no plan undercuts, the effort spent. */
export type PlannerKnown = { answer: Answer | null; bound: number; effort: number; done: boolean };

export type PlannerAnswers = {
  known: ReadonlyMap<string, PlannerKnown>;
  /** The planner was asked: not on the server, nor without JavaScript. */
  begun: boolean;
  /** What went wrong with the planner itself, in words; null where nothing did. */
  failed: string | null;
};

/** Answers kept of problems that are asked no more, so that undo needs no new search. */
const keptAnswers = 60;

/** A planner in a worker of the browser, made when first asked. It lives as long as the component. */
function usePlanner(onTold: (told: PlannerTold) => void, onFail: () => void) {
  const worker = useRef<Worker | null>(null);
  const latest = useRef({ onTold, onFail });
  useEffect(() => {
    latest.current = { onTold, onFail };
  });
  useEffect(
    () => () => {
      worker.current?.terminate();
      worker.current = null;
    },
    [],
  );
  return useMemo(
    () => (ask: PlannerAsk) => {
      if (!worker.current) {
        if (ask.jobs.length === 0) return;
        const planner = new Worker(new URL("../../../workers/planner.browser.ts", import.meta.url), {
          type: "module",
        });
        planner.onmessage = ({ data }: MessageEvent<PlannerTold>) => latest.current.onTold(data);
        planner.onerror = () => latest.current.onFail();
        worker.current = planner;
      }
      worker.current.postMessage(ask);
    },
    [],
  );
}

/** What is known, with one more told; of what is asked no more only the latest is kept. */
function withTold(
  known: ReadonlyMap<string, PlannerKnown>,
  { key, ...told }: Omit<PlannerTold, "run">,
  asked: ReadonlySet<string>,
): Map<string, PlannerKnown> {
  const others = [...known].filter(([other]) => other !== key);
  const old = others.filter(([other]) => !asked.has(other));
  const dropped = new Set(old.slice(0, Math.max(0, old.length - keptAnswers)).map(([other]) => other));
  return new Map([...others.filter(([other]) => !dropped.has(other)), [key, told]]);
}

/**
 * Plans problems beside the page, one after another in the order given, in a worker of this component's own. What runs is
 * cancelled when the problems change or the component goes; answers are kept by key.
 *
 * @param jobs problems that are equal have equal keys; none: nothing is asked, what runs is cancelled
 * @param effort what each may cost, see `usualEffort`
 */
export function usePlannerAnswers(
  jobs: readonly PlannerJob[],
  { effort }: { effort: number },
): PlannerAnswers {
  const [known, setKnown] = useState<ReadonlyMap<string, PlannerKnown>>(new Map());
  const [begun, setBegun] = useState(false);
  const [failed, setFailed] = useState<string | null>(null);
  const run = useRef(0);
  const asked = useRef<ReadonlySet<string>>(new Set());
  const knownNow = useRef(known);
  useEffect(() => {
    knownNow.current = known;
  }, [known]);
  const ask = usePlanner(
    ({ run: from, ...told }) => {
      if (from === run.current) setKnown((before) => withTold(before, told, asked.current));
    },
    () => setFailed("The planner does not run in this browser. Load the page again."),
  );
  const keys = jobs.map((job) => job.key).join("\n");
  // biome-ignore lint/correctness/useExhaustiveDependencies: the search begins anew when the problems change, not their objects
  useEffect(() => {
    run.current += 1;
    asked.current = new Set(jobs.map((job) => job.key));
    const open = jobs.filter((job) => !knownNow.current.get(job.key)?.done);
    const sent = open.map(({ key, problem, from, after }) => ({ key, problem, from, after }));
    ask({ run: run.current, jobs: sent, effort });
    if (jobs.length > 0) setBegun(true);
  }, [keys, effort, ask]);
  return useMemo(() => ({ known, begun, failed }), [known, begun, failed]);
}
