import type { Knex } from "knex";
import { type Applied, applyEdits } from "#app/domain/gig/apply-edit.ts";
import { clashes, standing, undoClashes } from "#app/domain/gig/conflict.ts";
import { actionFor, type Batch, type Edit, type LoggedBatch } from "#app/domain/gig/edit.ts";
import { type ConflictReport, conflictReport, goneReport } from "#app/domain/gig/edit-words.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { can } from "#app/domain/permissions.ts";
import { insertBatches, listBatchesById, listBatchesSince } from "#app/models/gig-batches.server.ts";
import { findGig, lockGig, saveGig } from "#app/models/gigs.server.ts";
import { transact } from "#app/services/db.server.ts";
import { type ActParts, actParts, unknownParts } from "#app/services/gig-parts.server.ts";
import type { Member } from "#app/services/member.server.ts";

/** What became of a batch. */
export type BatchResult =
  | { id: string; status: "applied"; revision: number }
  | { id: string; status: "conflict"; conflicts: ConflictReport[] }
  | { id: string; status: "refused"; message: string };

/** What happened to a gig since a revision. Where `more` is true, ask again from the last batch's revision. */
export type GigNews = { revision: number; batches: LoggedBatch[]; more: boolean };

export type EditsAnswer = { revision: number; results: BatchResult[]; since: LoggedBatch[]; more: boolean };

const mostNews = 200;

type Work = {
  gig: Gig;
  member: Member;
  /** Every batch since the oldest revision in question, in order; those applied now are added at the end. */
  log: LoggedBatch[];
  /** Batches known by id: those sent before, and those that an undo takes back. */
  known: Map<string, LoggedBatch>;
  parts: ActParts;
};

/**
 * Applies batches of edits to a gig in one transaction, each of them wholly or not at all, and answers what became of
 * each and what the window does not know yet. A batch that was applied before is answered as it was then.
 * @returns null where the act has no such gig
 */
export async function applyBatches(
  db: Knex,
  member: Member,
  gigId: string,
  { batches, since }: { batches: readonly Batch[]; since: number },
): Promise<EditsAnswer | null> {
  return transact(db, async (trx) => {
    const gig = await lockGig(trx, member, gigId);
    if (!gig) return null;
    const named = batches.flatMap((batch) => (batch.undoes === null ? [batch.id] : [batch.id, batch.undoes]));
    const known = new Map((await listBatchesById(trx, gigId, named)).map((batch) => [batch.id, batch]));
    const oldest = batches.map((batch) => known.get(batch.undoes ?? "")?.revision ?? batch.on);
    const log = await listBatchesSince(trx, gigId, Math.min(gig.revision, ...oldest));
    const work: Work = { gig, member, log, known, parts: actParts(trx, member) };
    const applied: LoggedBatch[] = [];
    const results: BatchResult[] = [];
    for (const batch of batches) {
      const { result, logged } = await applyBatch(work, batch);
      results.push(result);
      if (logged) applied.push(logged);
    }
    if (applied.length > 0) {
      await saveGig(trx, member, work.gig);
      await insertBatches(trx, gigId, applied);
    }
    const news = await newsSince(trx, work.gig, since);
    return { revision: work.gig.revision, results, since: news.batches, more: news.more };
  });
}

/** What happened to a gig since a revision; null where the act has no such gig. */
export async function gigNews(
  db: Knex,
  member: Member,
  gigId: string,
  since: number,
): Promise<GigNews | null> {
  const gig = await findGig(db, member, gigId);
  return gig && newsSince(db, gig, since);
}

async function newsSince(db: Knex, gig: Gig, since: number): Promise<GigNews> {
  const batches = await listBatchesSince(db, gig.id, since, mostNews);
  const revision = batches.at(-1)?.revision ?? gig.revision;
  return { revision, batches, more: revision < gig.revision };
}

type Outcome = { result: BatchResult; logged?: LoggedBatch };

async function applyBatch(work: Work, batch: Batch): Promise<Outcome> {
  const before = work.known.get(batch.id);
  if (before) {
    return before.personId === work.member.personId
      ? { result: { id: batch.id, status: "applied", revision: before.revision } }
      : refuse(batch, "Somebody else has sent edits under this id. Make the change again.");
  }
  return batch.undoes === null ? applyNew(work, batch) : takeBack(work, batch, batch.undoes);
}

async function applyNew(work: Work, batch: Batch): Promise<Outcome> {
  const refused = refusedByRole(work.member, batch, batch.edits);
  if (refused) return refused;
  const unknown = await unknownParts(work.gig, batch.edits, work.parts);
  if (unknown) return refuse(batch, unknown);
  const later = work.log.filter((one) => one.revision > batch.on && one.client !== batch.client);
  const clashing = clashes(batch.edits, later);
  const applied = applyEdits(work.gig, batch.edits);
  if (clashing.length > 0 || !applied.ok) return conflict(work, batch, clashing, applied);
  return keep(work, batch, batch.edits, applied);
}

/** Undo and redo apply the inverse that was stored, whatever was sent, and only over what stands as it was left. */
async function takeBack(work: Work, batch: Batch, targetId: string): Promise<Outcome> {
  const target = work.known.get(targetId);
  if (!target) return refuse(batch, "What this takes back was never kept, so there is nothing to take back.");
  if (target.personId !== work.member.personId) {
    return refuse(batch, `${target.displayName} made this change. Only who made a change takes it back.`);
  }
  const refused = refusedByRole(work.member, batch, target.inverse);
  if (refused) return refused;
  const later = work.log.filter((one) => one.revision > target.revision);
  if (!standing([target, ...later]).includes(target)) {
    return refuse(batch, "This was taken back already, in another window.");
  }
  const clashing = undoClashes(target.inverse, later);
  const applied = applyEdits(work.gig, target.inverse);
  if (clashing.length > 0 || !applied.ok) return conflict(work, batch, clashing, applied);
  return keep(work, batch, target.inverse, applied);
}

function keep(work: Work, batch: Batch, edits: Edit[], applied: Extract<Applied, { ok: true }>): Outcome {
  const revision = work.gig.revision + 1;
  const { personId, displayName } = work.member;
  const { id, client, label, undoes } = batch;
  const logged: LoggedBatch = {
    id,
    client,
    label,
    undoes,
    edits,
    revision,
    personId,
    displayName,
    inverse: applied.inverse,
  };
  work.gig = { ...applied.gig, revision };
  work.log.push(logged);
  work.known.set(id, logged);
  return { result: { id, status: "applied", revision }, logged };
}

function refuse(batch: Batch, message: string): Outcome {
  return { result: { id: batch.id, status: "refused", message } };
}

function refusedByRole(member: Member, batch: Batch, edits: readonly Edit[]): Outcome | null {
  if (edits.every((edit) => can(member.role, actionFor(edit)))) return null;
  const may = can(member.role, "prepare")
    ? "may choose guitars, tunings and capos and write tech notes, but not change songs, order or rules"
    : "may look at gigs, but not change them";
  return refuse(batch, `Your role in ${member.actName} (${member.role}) ${may}. Ask an owner.`);
}

async function conflict(
  work: Work,
  batch: Batch,
  clashing: ReturnType<typeof clashes>,
  applied: Applied,
): Promise<Outcome> {
  const spoken = { gig: work.gig, log: work.log, names: await work.parts.names() };
  const conflicts = clashing.map((clash) => conflictReport(clash, spoken));
  if (!applied.ok) {
    const { code, key, message } = applied.conflict;
    const gone = code === "gone" ? goneReport(key, spoken) : { key, message, by: "", mine: "", theirs: "" };
    if (!conflicts.some((one) => one.key === key)) conflicts.push(gone);
  }
  return { result: { id: batch.id, status: "conflict", conflicts } };
}
