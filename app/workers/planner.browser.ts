import type { Answer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { search } from "#app/domain/planning/search.ts";

/** What the page asks for: these problems instead of whatever was asked before. No problems: stop. */
export type PlannerAsk = { run: number; jobs: { key: string; problem: Problem }[]; effort: number };

/** What is known of one problem so far; `done` where nothing better will come. */
export type PlannerTold = { run: number; key: string; answer: Answer; done: boolean };

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
    const answer = await solveInBreaths(run, key, problem, effort);
    if (answer === null) return;
    tell({ run, key, answer, done: true });
  }
}

/** The answer, telling what is known on the way; null where something else was asked meanwhile. */
async function solveInBreaths(
  run: number,
  key: string,
  problem: Problem,
  effort: number,
): Promise<Answer | null> {
  const steps = search(problem, { effort });
  let breath = performance.now();
  let told = Number.POSITIVE_INFINITY;
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
    if (performance.now() - breath < breathMilliseconds) continue;
    const { answer, bound } = step.value;
    if (answer && answer.total < told) {
      told = answer.total;
      tell({ run, key, answer: { ...answer, bound }, done: false });
    }
    await breathe();
    if (run !== current) return null;
    breath = performance.now();
  }
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
