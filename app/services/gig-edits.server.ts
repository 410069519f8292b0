import type { Knex } from "knex";
import type { Batch, LoggedBatch } from "#app/domain/gig/edit.ts";
import { type ConflictReport, conflictReport, goneReport, type Spoken } from "#app/domain/gig/edit-words.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { judgeBatch, type Verdict } from "#app/domain/gig/judge-batch.ts";
import { insertBatches, listBatchesById, listBatchesSince } from "#app/models/gig-batches.server.ts";
import { findGig, lockGig, saveGig } from "#app/models/gigs.server.ts";
import { transact } from "#app/services/db.server.ts";
import { actParts, unknownParts } from "#app/services/gig-parts.server.ts";
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
    const parts = actParts(trx, member);
    let current = gig;
    const applied: LoggedBatch[] = [];
    const results: BatchResult[] = [];
    for (const batch of batches) {
      const unknown = batch.undoes === null ? await unknownParts(current, batch.edits, parts) : null;
      const verdict: Verdict =
        unknown && !known.has(batch.id)
          ? { status: "refused", message: unknown }
          : judgeBatch({ gig: current, log, known }, batch, member);
      if (verdict.status === "applied") {
        current = verdict.gig;
        log.push(verdict.logged);
        known.set(batch.id, verdict.logged);
        applied.push(verdict.logged);
      }
      results.push(
        await resultOf(batch.id, verdict, async () => ({ gig: current, log, names: await parts.names() })),
      );
    }
    if (applied.length > 0) {
      await saveGig(trx, member, current);
      await insertBatches(trx, gigId, applied);
    }
    const news = await newsSince(trx, current, since);
    return { revision: current.revision, results, since: news.batches, more: news.more };
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

async function resultOf(id: string, verdict: Verdict, speak: () => Promise<Spoken>): Promise<BatchResult> {
  if (verdict.status === "applied") return { id, status: "applied", revision: verdict.logged.revision };
  if (verdict.status === "known") return { id, status: "applied", revision: verdict.revision };
  if (verdict.status === "refused") return { id, status: "refused", message: verdict.message };
  const spoken = await speak();
  const conflicts = verdict.clashes.map((clash) => conflictReport(clash, spoken));
  const { failed } = verdict;
  if (failed && !conflicts.some((one) => one.key === failed.key)) {
    conflicts.push(
      failed.code === "gone"
        ? goneReport(failed.key, spoken)
        : { key: failed.key, message: failed.message, by: "", mine: "", theirs: "" },
    );
  }
  return { id, status: "conflict", conflicts };
}
