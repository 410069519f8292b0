import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import { undoClashes } from "#app/domain/gig/conflict.ts";
import type { Batch, Edit, LoggedBatch } from "#app/domain/gig/edit.ts";
import {
  type ConflictReport,
  conflictReport,
  findEntry,
  type RepertoireNames,
} from "#app/domain/gig/edit-words.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { undoStacks } from "#app/domain/gig/undo-stack.ts";

/** A batch the server does not have yet, or of which this window does not know that it has. */
export type Pending = {
  batch: Batch;
  /** What takes it back, as the gig stood when it was last applied here; empty where it no longer applies. */
  inverse: Edit[];
  /** The server said that it applied it; it leaves the queue when the log shows it. */
  kept: boolean;
};

/** A batch that was not applied, for the person to decide about. */
export type Trouble = {
  /** The id of the batch. */
  id: string;
  label: string;
  message: string;
  /** Field by field what stands against what; empty where it was refused. */
  conflicts: ConflictReport[];
  /** False where making it again cannot help: it was refused, or it would take back over somebody else's edit. */
  canKeepMine: boolean;
  batch: Batch;
};

/** What somebody did in another window, to be announced. */
export type OthersChange = { id: string; displayName: string; label: string; own: boolean };

/** Why nothing is sent: the session has ended, the gig was deleted, or the page must be loaded again. */
export type Closed = "sign-in" | "gone" | "stale";

/**
 * All that a window knows of a gig: as the server has it (`base`), the edits on their way, and the two together
 * (`gig`). Every step is a pure function of the state before, so that it can be tested without a browser.
 */
export type Queue = {
  personId: string;
  /** This window's id; batches carry it, so that a window's own edits do not clash with each other. */
  client: string;
  base: Gig;
  log: LoggedBatch[];
  pending: Pending[];
  /** Ids of the batches that were sent and not answered. */
  onWire: string[];
  troubles: Trouble[];
  /** Own batches that cannot be taken back any more; undo passes over them. */
  passed: string[];
  /** How often the server could not be reached since it last answered. */
  failures: number;
  closed: Closed | null;
  gig: Gig;
  others: OthersChange[];
};

/**
 * A window's view of a gig as the page was loaded with it.
 * @param log the last batches applied, in their order
 */
export function openQueue(given: {
  gig: Gig;
  log: readonly LoggedBatch[];
  personId: string;
  client: string;
}): Queue {
  const { gig, log, personId, client } = given;
  return {
    personId,
    client,
    base: gig,
    log: upTo(gig, log),
    pending: [],
    onWire: [],
    troubles: [],
    passed: [],
    failures: 0,
    closed: null,
    gig,
    others: [],
  };
}

/** The log as far as the gig has it: the two may have been read one after the other. */
export function upTo(gig: Gig, log: readonly LoggedBatch[]): LoggedBatch[] {
  return log.filter((batch) => batch.revision <= gig.revision);
}

/** Applies the edits under way on top of what the server has. Those that no longer apply are left to its answer. */
export function rebase(queue: Queue): Queue {
  let gig = queue.base;
  const pending = queue.pending.map((one) => {
    const applied = applyEdits(gig, one.batch.edits);
    if (!applied.ok) return { ...one, inverse: [] };
    gig = applied.gig;
    return { ...one, inverse: applied.inverse };
  });
  return { ...queue, pending, gig };
}

/**
 * Makes an edit: it shows at once and waits to be sent. One that changes nothing is dropped; one that cannot be is told.
 * @param id an id that no other batch has
 * @param on the revision that the person saw when they began; left out: what they see now
 */
export function makeEdit(
  queue: Queue,
  id: string,
  edits: readonly Edit[],
  label: string,
  on = queue.base.revision,
): Queue {
  return push(queue, {
    id,
    client: queue.client,
    on,
    label,
    undoes: null,
    edits: [...edits],
  });
}

function push(queue: Queue, batch: Batch): Queue {
  const applied = applyEdits(queue.gig, batch.edits);
  if (!applied.ok) {
    const { message } = applied.conflict;
    const trouble = { id: batch.id, label: batch.label, message, conflicts: [], canKeepMine: false, batch };
    return { ...queue, troubles: [...queue.troubles, trouble] };
  }
  if (applied.inverse.length === 0) return queue;
  return {
    ...queue,
    gig: applied.gig,
    pending: [...queue.pending, { batch, inverse: applied.inverse, kept: false }],
  };
}

/** The log with the edits under way at its end, as if they had arrived. */
function expectedLog(queue: Queue): LoggedBatch[] {
  const under = queue.pending.map(({ batch: { on: _, ...batch }, inverse }, index) => ({
    ...batch,
    inverse,
    revision: queue.base.revision + index + 1,
    personId: queue.personId,
    displayName: "You",
  }));
  return [...queue.log, ...under];
}

/** What undo and redo would act on now. */
export function historyOf(queue: Queue): { undo: LoggedBatch | null; redo: LoggedBatch | null } {
  const passed = new Set(queue.passed);
  return undoStacks(
    expectedLog(queue).filter((batch) => !passed.has(batch.id)),
    queue.personId,
  );
}

/**
 * Takes back the person's last edit, or brings back what they took back last. Where somebody else has changed the same
 * since, nothing is changed: that is told, and the next press goes further back.
 */
export function stepHistory(
  queue: Queue,
  id: string,
  direction: "undo" | "redo",
  names: RepertoireNames,
): Queue {
  const target = historyOf(queue)[direction];
  if (!target) return queue;
  const log = expectedLog(queue);
  const batch: Batch = {
    id,
    client: queue.client,
    on: queue.base.revision,
    label: target.label,
    undoes: target.id,
    edits: target.inverse,
  };
  const later = log.slice(log.findIndex((one) => one.id === target.id) + 1);
  const clashing = undoClashes(target, later);
  const passed = [...queue.passed, target.id];
  if (clashing.length > 0) {
    const spoken = { gig: queue.gig, log, names };
    const trouble: Trouble = {
      id,
      label: target.label,
      message: "Left as it is: somebody has changed it since.",
      conflicts: clashing.map((clash) => conflictReport(clash, spoken)),
      canKeepMine: false,
      batch,
    };
    return { ...queue, passed, troubles: [...queue.troubles, trouble] };
  }
  const next = push(queue, batch);
  return next.pending === queue.pending ? { ...next, passed } : next;
}

/** Makes an edit again that clashed, over what stands now. What it needs and was taken out is put back first. */
export function keepMine(queue: Queue, troubleId: string, id: string): Queue {
  const trouble = queue.troubles.find((one) => one.id === troubleId);
  if (!trouble?.canKeepMine) return queue;
  const { edits, label } = trouble.batch;
  return makeEdit(keepTheirs(queue, troubleId), id, [...putBack(queue, edits), ...edits], label);
}

/** Lets go of an edit that was not applied. */
export function keepTheirs(queue: Queue, troubleId: string): Queue {
  return { ...queue, troubles: queue.troubles.filter((one) => one.id !== troubleId) };
}

/** The edits that put back the songs and sets that `edits` need and that are gone, as far as the log knows them. */
function putBack(queue: Queue, edits: readonly Edit[]): Edit[] {
  const setIds = new Set(queue.gig.sets.map((set) => set.id));
  const entryIds = new Set(queue.gig.entries.map((entry) => entry.id));
  const back: Edit[] = [];
  const needSet = (setId: string) => {
    if (setIds.has(setId)) return;
    setIds.add(setId);
    const found = queue.log
      .flatMap((batch) => batch.inverse)
      .findLast((edit) => edit.kind === "set.add" && edit.set.id === setId);
    if (found) back.push(found);
  };
  const needEntry = (entryId: string) => {
    if (entryIds.has(entryId)) return;
    entryIds.add(entryId);
    const entry = findEntry(queue, entryId);
    if (!entry) return;
    needSet(entry.setId);
    back.push({ kind: "entry.add", entry });
  };
  for (const edit of edits) {
    if (edit.kind === "set.add") setIds.add(edit.set.id);
    if (edit.kind === "set.set") needSet(edit.setId);
    if (edit.kind === "entry.add") {
      needSet(edit.entry.setId);
      entryIds.add(edit.entry.id);
    }
    if (edit.kind === "entry.place" || edit.kind === "entry.set") needEntry(edit.entryId);
    if (edit.kind === "entry.place") needSet(edit.setId);
  }
  return back;
}
