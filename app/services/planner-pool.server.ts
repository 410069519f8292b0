import { availableParallelism } from "node:os";
import type { Answer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { getEnv } from "#app/services/env.server.ts";
import { workerPool } from "#app/services/worker-pool.server.ts";
import type { PlannerJob } from "#app/workers/planner.node.ts";

/** A person waits for the answer: a plan that is still not done by then is returned as good as it is. */
const milliseconds = 20_000;
/** More than this many waiting would wait longer than anybody does. */
const mostWaiting = 12;

const pool = workerPool<PlannerJob, Answer>("planner", () => ({
  maxThreads: getEnv().PLANNER_THREADS ?? Math.max(1, availableParallelism() - 1),
  maxQueue: mostWaiting,
  resourceLimits: { maxOldGenerationSizeMb: 512 },
}));

/**
 * Plans off the main thread. An aborted signal takes the job out of the queue or ends its thread.
 * @throws QueueFull where too many wait already; the signal's reason where it was aborted
 */
export function solveInPool(
  problem: Problem,
  { effort, signal }: { effort: number; signal?: AbortSignal },
): Promise<Answer> {
  return pool.run({ problem, effort, milliseconds }, signal);
}

export function closePlannerPool(): Promise<void> {
  return pool.close();
}
