import type { Answer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { type PlanStep, planInSteps } from "#app/workers/plan-in-steps.ts";

/** What the page asks for: these problems instead of whatever was asked before. No problems: stop. */
export type PlannerAsk = { run: number; jobs: { key: string; problem: Problem }[]; effort: number };

/** What is known of one problem so far; `done` where nothing better will come. */
export type PlannerTold = {
  run: number;
  key: string;
  answer: Answer | null;
  bound: number;
  effort: number;
  done: boolean;
};

/** How long the search goes on before it looks whether something else was asked meanwhile. */
const breathMilliseconds = 40;

const scope = self as DedicatedWorkerGlobalScope;
let current = 0;

scope.addEventListener("message", ({ data }: MessageEvent<PlannerAsk>) => {
  current = data.run;
  void work(data);
});

async function work({ run, jobs, effort }: PlannerAsk): Promise<void> {
  for (const { key, problem } of jobs) {
    const step = await solveInBreaths(run, key, problem, effort);
    if (step === null) return;
    tell({ run, key, ...step });
  }
}

/** The last step, telling the steps on the way; null where something else was asked meanwhile. */
async function solveInBreaths(
  run: number,
  key: string,
  problem: Problem,
  effort: number,
): Promise<PlanStep | null> {
  let breath = performance.now();
  for (const step of planInSteps(problem, { effort })) {
    if (step.done) return step;
    if (performance.now() - breath < breathMilliseconds) continue;
    tell({ run, key, ...step });
    await breathe();
    if (run !== current) return null;
    breath = performance.now();
  }
  return null;
}

function tell(told: PlannerTold): void {
  scope.postMessage(told);
}

/** Lets waiting messages in. */
function breathe(): Promise<void> {
  return new Promise((resolve) => {
    const { port1, port2 } = new MessageChannel();
    port1.onmessage = () => {
      port1.close();
      resolve();
    };
    port2.postMessage(null);
  });
}
