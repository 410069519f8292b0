import { Piscina } from "piscina";
import { log } from "#app/services/log.server.ts";

type PoolOptions = {
  maxThreads: number;
  maxQueue: number;
  resourceLimits?: { maxOldGenerationSizeMb: number };
};

/** More jobs wait than a pool gets through while anybody waits. */
export class QueueFull extends Error {
  override name = "QueueFull";
}

/** Beside the server once built; from its source while developing and testing. */
function fileOf(name: string): { filename: string; workerData?: string } {
  const beside = (file: string) => new URL(file, import.meta.url).href;
  const fromSource = import.meta.url.endsWith(".ts");
  if (!fromSource) return { filename: beside(`./${name}.node.js`) };
  return { filename: beside("../workers/from-source.mjs"), workerData: name };
}

/** A pool of threads that run app/workers/`name`.node.ts, opened with its first job. */
export function workerPool<Job, Result>(name: string, options: () => PoolOptions) {
  let pool: Piscina<Job, Result> | null = null;

  function open(): Piscina<Job, Result> {
    const { maxQueue: _, ...threads } = options();
    const opened = new Piscina<Job, Result>({
      ...fileOf(name),
      minThreads: 0,
      idleTimeout: 30_000,
      ...threads,
    });
    // A thread that breaks while it has no job: the next job gets another.
    opened.on("error", (error) => log.error({ err: error, worker: name }, "a worker thread broke"));
    return opened;
  }

  return {
    /**
     * Runs a job. An aborted signal takes it out of the queue or ends its thread.
     * @throws QueueFull where too many wait already; the signal's reason where it was aborted
     */
    async run(job: Job, signal?: AbortSignal): Promise<Result> {
      pool ??= open();
      // Counted here: Piscina's own limit overlooks jobs that come with a signal.
      if (pool.queueSize >= options().maxQueue)
        throw new QueueFull("Too many are waiting. Try again in a few seconds.");
      try {
        return await pool.run(job, { signal });
      } catch (error) {
        signal?.throwIfAborted();
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
