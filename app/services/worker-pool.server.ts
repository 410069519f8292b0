import { Piscina } from "piscina";

type PoolOptions = {
  maxThreads: number;
  maxQueue: number;
  resourceLimits?: { maxOldGenerationSizeMb: number };
};

/** More jobs wait than a pool gets through while anybody waits. */
export class QueueFull extends Error {
  override name = "QueueFull";
}

/**
 * A pool of threads that run app/workers/`name`.node.ts, opened with its first job. Run from its source while
 * developing and testing, from beside the server once built.
 */
export function workerPool<Job, Result>(name: string, options: () => PoolOptions) {
  let pool: Piscina<Job, Result> | null = null;

  function open(): Piscina<Job, Result> {
    const fromSource = import.meta.url.endsWith(".ts");
    return new Piscina({
      filename: new URL(fromSource ? `../workers/${name}.node.ts` : `./${name}.node.js`, import.meta.url)
        .href,
      execArgv: fromSource ? ["--import", "tsx"] : [],
      minThreads: 0,
      idleTimeout: 30_000,
      ...options(),
    });
  }

  return {
    /**
     * Runs a job. An aborted signal takes it out of the queue or ends its thread.
     * @throws QueueFull where too many wait already; the signal's reason where it was aborted
     */
    async run(job: Job, signal?: AbortSignal): Promise<Result> {
      pool ??= open();
      try {
        return await pool.run(job, { signal });
      } catch (error) {
        signal?.throwIfAborted();
        if (error instanceof Error && error.message === "Task queue is at limit") {
          throw new QueueFull("Too many are waiting. Try again in a few seconds.");
        }
        throw error;
      }
    },
    async close(): Promise<void> {
      const opened = pool;
      pool = null;
      await opened?.destroy();
    },
  };
}
