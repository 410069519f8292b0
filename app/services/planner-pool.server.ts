import { availableParallelism } from "node:os";
import { Piscina } from "piscina";
import type { Answer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { getEnv } from "#app/services/env.server.ts";
import type { PlannerJob } from "#app/workers/planner.node.ts";

/** A person waits for the answer: a plan that is still not done by then is returned as good as it is. */
const milliseconds = 20_000;
/** More than this many waiting would wait longer than anybody does. */
const mostWaiting = 12;

/** The planner has as much waiting as it can get through in time. */
export class QueueFull extends Error {
  override name = "QueueFull";

  constructor() {
    super("The planner is busy with other sets. Try again in a few seconds.");
  }
}

let pool: Piscina<PlannerJob, Answer> | null = null;

/** Run from its source while developing and testing, from beside the server once built. */
function openPool(): Piscina<PlannerJob, Answer> {
  const fromSource = import.meta.url.endsWith(".ts");
  return new Piscina({
    filename: new URL(fromSource ? "../workers/planner.node.ts" : "./planner.node.js", import.meta.url).href,
    execArgv: fromSource ? ["--import", "tsx"] : [],
    minThreads: 0,
    maxThreads: getEnv().PLANNER_THREADS ?? Math.max(1, availableParallelism() - 1),
    idleTimeout: 30_000,
    maxQueue: mostWaiting,
    resourceLimits: { maxOldGenerationSizeMb: 512 },
  });
}

/**
 * Plans off the main thread. An aborted signal takes the job out of the queue or ends its thread.
 * @throws QueueFull where too many wait already; the signal's reason where it was aborted
 */
export async function solveInPool(
  problem: Problem,
  { effort, signal }: { effort: number; signal?: AbortSignal },
): Promise<Answer> {
  pool ??= openPool();
  try {
    return await pool.run({ problem, effort, milliseconds }, { signal });
  } catch (error) {
    signal?.throwIfAborted();
    if (error instanceof Error && error.message === "Task queue is at limit") throw new QueueFull();
    throw error;
  }
}

export async function closePlannerPool(): Promise<void> {
  const open = pool;
  pool = null;
  await open?.destroy();
}
