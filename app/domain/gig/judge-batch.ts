import { applyEdits, type EditConflict } from "#app/domain/gig/apply-edit.ts";
import { type Clash, clashes, standing, undoClashes } from "#app/domain/gig/conflict.ts";
import { actionFor, type Batch, type Edit, type LoggedBatch } from "#app/domain/gig/edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { can, type Role } from "#app/domain/permissions.ts";

/** Who sends a batch. */
export type Sender = { personId: string; displayName: string; role: Role; actName: string };

/** The gig a batch meets, and what was applied to it before. */
export type Ground = {
  gig: Gig;
  /** Every batch since the revision in question (the one it was made on, or the one it takes back), in order. */
  log: readonly LoggedBatch[];
  /** Batches by id: those sent before, and those that are to be taken back. */
  known: ReadonlyMap<string, LoggedBatch>;
};

/** What becomes of a batch: `failed` is what kept it from applying, beside or without a clash. */
export type Verdict =
  | { status: "applied"; gig: Gig; logged: LoggedBatch }
  | { status: "known"; revision: number }
  | { status: "conflict"; clashes: Clash[]; failed: EditConflict | null }
  | { status: "refused"; message: string };

/**
 * Decides about a batch as the server does: applied wholly or not at all, once however often it is sent. An undo or
 * redo applies the inverse that was logged, whatever was sent, and only over what stands as its maker left it.
 * @example judgeBatch({ gig, log: [], known: new Map() }, batch, wren).status // "applied"
 */
export function judgeBatch(ground: Ground, batch: Batch, sender: Sender): Verdict {
  const before = ground.known.get(batch.id);
  if (before) {
    if (before.personId === sender.personId) return { status: "known", revision: before.revision };
    return refuse("Somebody else has sent edits under this id. Make the change again.");
  }
  return batch.undoes === null
    ? judgeNew(ground, batch, sender)
    : judgeUndo(ground, batch, batch.undoes, sender);
}

function judgeNew(ground: Ground, batch: Batch, sender: Sender): Verdict {
  const refused = refusedByRole(sender, batch.edits);
  if (refused) return refused;
  const later = ground.log.filter((one) => one.revision > batch.on && one.client !== batch.client);
  return tryEdits(ground.gig, batch, batch.edits, clashes(batch.edits, later), sender);
}

function judgeUndo(ground: Ground, batch: Batch, targetId: string, sender: Sender): Verdict {
  const target = ground.known.get(targetId);
  if (!target) return refuse("What this takes back was never kept, so there is nothing to take back.");
  if (target.personId !== sender.personId) {
    return refuse(`${target.displayName} made this change. Only who made a change takes it back.`);
  }
  const refused = refusedByRole(sender, target.inverse);
  if (refused) return refused;
  const later = ground.log.filter((one) => one.revision > target.revision);
  if (!standing([target, ...later]).includes(target)) {
    return refuse("This was taken back already, in another window.");
  }
  return tryEdits(ground.gig, batch, target.inverse, undoClashes(target, later), sender);
}

function tryEdits(gig: Gig, batch: Batch, edits: Edit[], clashing: Clash[], sender: Sender): Verdict {
  const applied = applyEdits(gig, edits);
  if (!applied.ok) return { status: "conflict", clashes: clashing, failed: applied.conflict };
  if (clashing.length > 0) return { status: "conflict", clashes: clashing, failed: null };
  const revision = gig.revision + 1;
  const { id, client, label, undoes } = batch;
  const { personId, displayName } = sender;
  const { inverse } = applied;
  return {
    status: "applied",
    gig: { ...applied.gig, revision },
    logged: { id, client, label, undoes, edits, inverse, revision, personId, displayName },
  };
}

function refuse(message: string): Verdict {
  return { status: "refused", message };
}

function refusedByRole({ role, actName }: Sender, edits: readonly Edit[]): Verdict | null {
  if (edits.every((edit) => can(role, actionFor(edit)))) return null;
  const may = can(role, "prepare")
    ? "may choose guitars, tunings and capos and write tech notes, but not change songs, order or rules"
    : "may look at gigs, but not change them";
  return refuse(`Your role in ${actName} (${role}) ${may}. Ask an owner.`);
}
