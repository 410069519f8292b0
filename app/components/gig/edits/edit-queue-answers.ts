import {
  type Pending,
  type Queue,
  rebase,
  type Trouble,
  upTo,
} from "#app/components/gig/edits/edit-queue.ts";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Batch, LoggedBatch } from "#app/domain/gig/edit.ts";
import type { ConflictReport } from "#app/domain/gig/edit-words.ts";
import type { Gig } from "#app/domain/gig/gig.ts";

/** What the server said became of a batch. */
export type BatchResult =
  | { id: string; status: "applied"; revision: number }
  | { id: string; status: "conflict"; conflicts: ConflictReport[] }
  | { id: string; status: "refused"; message: string };

export type EditsRequest = { batches: Batch[]; since: number };
export type EditsAnswer = { revision: number; results: BatchResult[]; since: LoggedBatch[]; more: boolean };
export type GigNews = { revision: number; batches: LoggedBatch[]; more: boolean };

const mostAtOnce = 50;
const mostCharactersAtOnce = 400_000;
const mostAnnounced = 5;
const longestLog = 400;

/** The next batches to send, in the order in which they were made; null while some are under way or none wait. */
export function takeBatches(queue: Queue): { queue: Queue; request: EditsRequest } | null {
  if (queue.onWire.length > 0 || queue.closed) return null;
  const waiting = queue.pending.filter((one) => !one.kept).map((one) => one.batch);
  let characters = 0;
  const fitting = waiting.slice(0, mostAtOnce).findIndex((batch) => {
    characters += JSON.stringify(batch).length;
    return characters > mostCharactersAtOnce;
  });
  const batches = waiting.slice(0, fitting === -1 ? mostAtOnce : Math.max(1, fitting));
  if (batches.length === 0) return null;
  const onWire = batches.map((batch) => batch.id);
  return { queue: { ...queue, onWire }, request: { batches, since: queue.base.revision } };
}

/** The server's answer to batches: what it applied leaves the queue, what it did not is for the person to decide. */
export function takeAnswer(queue: Queue, answer: EditsAnswer): Queue {
  const results = new Map(answer.results.map((result) => [result.id, result]));
  let next: Queue = { ...queue, onWire: [], failures: 0, closed: null };
  next = withNews(next, answer.since);
  for (const { batch } of queue.pending) {
    const result = results.get(batch.id);
    if (result?.status === "applied") next = markKept(next, batch.id, result.revision);
    if (result?.status === "conflict") {
      next = setAside(next, batch, conflictWords(batch, result.conflicts), result.conflicts);
    }
    if (result?.status === "refused") next = setAside(next, batch, result.message, []);
  }
  return rebase(next);
}

/** What happened to the gig in other windows. */
export function takeNews(queue: Queue, news: GigNews): Queue {
  const open = queue.failures === 0 && queue.closed === null;
  const next = withNews(open ? queue : { ...queue, failures: 0, closed: null }, news.batches);
  return next.base === queue.base ? next : rebase(next);
}

/** The server could not be reached: what was on the wire may have arrived or not, so it is sent again as it is. */
export function takeFailure(queue: Queue): Queue {
  return { ...queue, onWire: [], failures: queue.failures + 1 };
}

/** The session has ended, or the gig was deleted. What waits is kept. */
export function takeClosing(queue: Queue, closed: "sign-in" | "gone"): Queue {
  if (queue.closed === closed && queue.onWire.length === 0) return queue;
  return { ...queue, onWire: [], closed };
}

/**
 * The server refused a request as a whole: the batch it names, or all of them where it names none, will not be sent
 * again.
 */
export function takeRejection(queue: Queue, refusal: { message: string; index: number | null }): Queue {
  const refused =
    refusal.index === null ? queue.onWire : queue.onWire.slice(refusal.index, refusal.index + 1);
  let next: Queue = { ...queue, onWire: [], failures: 0 };
  for (const { batch } of queue.pending) {
    if (refused.includes(batch.id)) next = setAside(next, batch, refusal.message, []);
  }
  return rebase(next);
}

/** The page was loaded again: the gig and log as they are now, with what is under way on top. */
export function takePage(queue: Queue, gig: Gig, log: readonly LoggedBatch[]): Queue {
  if (gig.revision <= queue.base.revision) return queue;
  const known = upTo(gig, log);
  const arrived = new Set(known.map((batch) => batch.id));
  const pending = queue.pending.filter((one) => !arrived.has(one.batch.id));
  return rebase({ ...queue, base: gig, log: known, pending });
}

/** Edits that were kept in the browser: this window's from before a reload, or those of a window that is gone. */
export function takeStored(queue: Queue, batches: readonly Batch[], troubles: readonly Trouble[]): Queue {
  const known = new Set([...queue.log.map((one) => one.id), ...queue.pending.map((one) => one.batch.id)]);
  const told = new Set(queue.troubles.map((one) => one.id));
  const earlier: Pending[] = batches
    .filter((batch) => !known.has(batch.id))
    .map((batch) => ({ batch: { ...batch, client: queue.client }, inverse: [], kept: false }));
  return rebase({
    ...queue,
    pending: [...earlier, ...queue.pending],
    troubles: [...troubles.filter((one) => !told.has(one.id)), ...queue.troubles],
  });
}

/**
 * Batches of the log on top of the base. Where they do not go on from it (the page is older than the server's code, or
 * the log has a hole), the page has to be loaded again; what waits is kept.
 */
function withNews(queue: Queue, batches: readonly LoggedBatch[]): Queue {
  let { base } = queue;
  const arrived: LoggedBatch[] = [];
  for (const batch of batches) {
    if (batch.revision <= base.revision) continue;
    const applied = batch.revision === base.revision + 1 ? applyEdits(base, batch.edits) : null;
    if (!applied?.ok) return { ...queue, closed: "stale" };
    base = { ...applied.gig, revision: batch.revision };
    arrived.push(batch);
  }
  if (arrived.length === 0) return queue;
  const ids = new Set(arrived.map((batch) => batch.id));
  const others = arrived
    .filter(
      (batch) => batch.client !== queue.client && !queue.pending.some((one) => one.batch.id === batch.id),
    )
    .map(({ id, displayName, label, personId }) => ({
      id,
      displayName,
      label,
      own: personId === queue.personId,
    }));
  return {
    ...queue,
    base,
    log: [...queue.log, ...arrived].slice(-longestLog),
    pending: queue.pending.filter((one) => !ids.has(one.batch.id)),
    others: [...queue.others, ...others].slice(-mostAnnounced),
  };
}

/** Applied at a revision: gone from the queue where the base has it, else kept in view until the log shows it. */
function markKept(queue: Queue, id: string, revision: number): Queue {
  const pending =
    revision <= queue.base.revision
      ? queue.pending.filter((one) => one.batch.id !== id)
      : queue.pending.map((one) => (one.batch.id === id ? { ...one, kept: true } : one));
  return { ...queue, pending };
}

/**
 * Takes a batch that was not applied out of the queue and tells the person, unless they took it back meanwhile: then
 * both are dropped, and so is what takes back the taking back.
 */
function setAside(queue: Queue, batch: Batch, message: string, conflicts: ConflictReport[]): Queue {
  if (!queue.pending.some((one) => one.batch.id === batch.id)) return queue;
  const out = new Set([batch.id]);
  let standing = true;
  for (const one of queue.pending) {
    if (one.batch.undoes === null || !out.has(one.batch.undoes)) continue;
    out.add(one.batch.id);
    standing = !standing;
  }
  const pending = queue.pending.filter((one) => !out.has(one.batch.id));
  const passed = batch.undoes === null ? queue.passed : [...queue.passed, batch.undoes];
  if (!standing) return { ...queue, pending, passed };
  const { id, label, undoes } = batch;
  const canKeepMine = undoes === null && conflicts.length > 0;
  const trouble: Trouble = { id, label, message, conflicts, canKeepMine, batch };
  return { ...queue, pending, passed, troubles: [...withoutOutdone(queue.troubles, trouble), trouble] };
}

/** Of two own edits of the same fields that both clash, only the later is asked about. */
function withoutOutdone(troubles: readonly Trouble[], later: Trouble): Trouble[] {
  const keys = new Set(later.conflicts.map((conflict) => conflict.key));
  const outdone = (one: Trouble) =>
    one.conflicts.length > 0 &&
    one.batch.edits.length === one.conflicts.length &&
    one.conflicts.every((conflict) => keys.has(conflict.key));
  return troubles.filter((one) => !outdone(one));
}

function conflictWords(batch: Batch, conflicts: readonly ConflictReport[]): string {
  const words = conflicts.map((conflict) => conflict.message).join(" ");
  return batch.undoes === null ? words : `Left as it is. ${words}`;
}
