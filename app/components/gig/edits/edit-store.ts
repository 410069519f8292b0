import { z } from "zod";
import type { Queue, Trouble } from "#app/components/gig/edits/edit-queue.ts";
import { batchSchema } from "#app/domain/gig/edit-schema.ts";

/** What a window keeps of its queue, so that closing it loses nothing. */
export type StoredQueue = { batches: Queue["pending"][number]["batch"][]; troubles: Trouble[] };

const troubleSchema = z.object({
  id: z.string(),
  label: z.string(),
  message: z.string(),
  conflicts: z.array(
    z.object({ key: z.string(), message: z.string(), by: z.string(), mine: z.string(), theirs: z.string() }),
  ),
  canKeepMine: z.boolean(),
  batch: batchSchema,
}) satisfies z.ZodType<Trouble>;

const storedSchema = z.object({ batches: z.array(batchSchema), troubles: z.array(troubleSchema) });

/** The queues of one person for one gig in this browser, one for each window. */
export type EditStore = {
  /** Keeps a window's queue; false where the browser has no room for it. */
  write: (windowId: string, queue: StoredQueue) => boolean;
  read: (windowId: string) => StoredQueue | null;
  remove: (windowId: string) => void;
  windowIds: () => string[];
};

/** Queues in the browser's own storage, which all of its windows share. */
export function editStore(storage: Storage, gigId: string, personId: string): EditStore {
  const prefix = `stillpeg.edits.${gigId}.${personId}.`;
  return {
    write: (windowId, queue) => {
      const key = prefix + windowId;
      try {
        if (queue.batches.length + queue.troubles.length === 0) storage.removeItem(key);
        else storage.setItem(key, JSON.stringify(queue));
        return true;
      } catch (error) {
        if (error instanceof DOMException) return false;
        throw error;
      }
    },
    read: (windowId) => {
      const text = storage.getItem(prefix + windowId);
      if (text === null) return null;
      const read = storedSchema.safeParse(parsed(text));
      return read.success ? read.data : null;
    },
    remove: (windowId) => storage.removeItem(prefix + windowId),
    windowIds: () =>
      Array.from({ length: storage.length }, (_, index) => storage.key(index) ?? "")
        .filter((key) => key.startsWith(prefix))
        .map((key) => key.slice(prefix.length)),
  };
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    // Half written, or by something else: there is no queue in it.
    return null;
  }
}
