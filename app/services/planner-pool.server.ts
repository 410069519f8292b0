import { availableParallelism } from "node:os";
import type { Problem } from "#app/domain/planning/problem.ts";
import { getEnv } from "#app/services/env.server.ts";
import { workerPool } from "#app/services/worker-pool.server.ts";
import type { PlannerAnswer, PlannerJob } from "#app/workers/planner.node.ts";

/** A person waits for the answer: a plan that is still not done by then is returned as good as it is. */
export const mostSeconds = 20;
/** More than this many waiting would wait longer than anybody does. */
const mostWaiting = 12;

const pool = workerPool<PlannerJob, PlannerAnswer>("planner", () => ({
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
): Promise<PlannerAnswer> {
  return pool.run({ problem, effort, milliseconds: mostSeconds * 1000 }, signal);
}

export function closePlannerPool(): Promise<void> {
  return pool.close();
}
