import type { Answer } from "#app/domain/planning/answer.ts";
import type { KnownPlan } from "#app/domain/planning/known-plan.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { type PlanStep, planInSteps } from "#app/workers/plan-in-steps.ts";

/**
 * A problem with a key. A plan that is known begins it: `from`, or the answer to the problem of the key `after`, where this
 * worker has it.
 */
export type PlannerJob = { key: string; problem: Problem; from?: KnownPlan; after?: string };

/** What the page asks for: these problems instead of whatever was asked before. No problems: stop. */
export type PlannerAsk = { run: number; jobs: PlannerJob[]; effort: number };

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

/** Answers that are kept to begin others with. */
const keptAnswers = 60;

const scope = self as DedicatedWorkerGlobalScope;
const answers = new Map<string, KnownPlan>();
let current = 0;

scope.addEventListener("message", ({ data }: MessageEvent<PlannerAsk>) => {
  current = data.run;
  void work(data);
});

async function work({ run, jobs, effort }: PlannerAsk): Promise<void> {
  for (const job of jobs) {
    const step = await solveInBreaths(run, job, effort);
    if (step === null) return;
    keep(job.key, step);
    tell({ run, key: job.key, ...step });
  }
}

function keep(key: string, { answer }: PlanStep): void {
  if (!answer || answer.status === "infeasible") return;
  answers.set(key, { order: answer.order, plays: answer.plays });
  const [oldest] = answers.keys();
  if (answers.size > keptAnswers && oldest !== undefined) answers.delete(oldest);
}

/** The last step, telling the steps on the way; null where something else was asked meanwhile. */
async function solveInBreaths(run: number, job: PlannerJob, effort: number): Promise<PlanStep | null> {
  const from = job.from ?? answers.get(job.after ?? "");
  let breath = performance.now();
  for (const step of planInSteps(job.problem, { effort, ...(from ? { from } : {}) })) {
    if (step.done) return step;
    if (performance.now() - breath < breathMilliseconds) continue;
    tell({ run, key: job.key, ...step });
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
