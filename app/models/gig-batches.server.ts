import type { Knex } from "knex";
import { z } from "zod";
import type { LoggedBatch } from "#app/domain/gig/edit.ts";
import { editSchema } from "#app/domain/gig/edit-schema.ts";
import { readJson } from "#app/models/stored-json.server.ts";

type BatchRow = {
  revision: number;
  id: string;
  client: string;
  person_id: string | null;
  display_name: string | null;
  undoes: string | null;
  label: string;
  edits: unknown;
  inverse: unknown;
};

const editsColumn = z.array(editSchema);

function batchFromRow(row: BatchRow): LoggedBatch {
  return {
    revision: row.revision,
    id: row.id,
    client: row.client,
    personId: row.person_id,
    displayName: row.display_name ?? "Somebody who has left",
    undoes: row.undoes,
    label: row.label,
    edits: readJson(editsColumn, "gig_batches.edits", row.edits),
    inverse: readJson(editsColumn, "gig_batches.inverse", row.inverse),
  };
}

/** The log of one gig. A gig's id comes from a finder that took the member, so it is the act's own. */
function batchesOf(db: Knex, gigId: string) {
  return db("gig_batches")
    .leftJoin("people", "people.id", "gig_batches.person_id")
    .where("gig_batches.gig_id", gigId)
    .select<BatchRow[]>("gig_batches.*", "people.display_name as display_name");
}

/** The batches applied after a revision, in their order; at most `most` where that is given. */
export async function listBatchesSince(
  db: Knex,
  gigId: string,
  revision: number,
  most?: number,
): Promise<LoggedBatch[]> {
  const query = batchesOf(db, gigId)
    .where("gig_batches.revision", ">", revision)
    .orderBy("gig_batches.revision");
  const rows = await (most === undefined ? query : query.limit(most));
  return rows.map(batchFromRow);
}

/** The last batches applied, in their order: what a page needs for undo and redo after a reload. */
export async function listLastBatches(db: Knex, gigId: string, most = 100): Promise<LoggedBatch[]> {
  const rows = await batchesOf(db, gigId).orderBy("gig_batches.revision", "desc").limit(most);
  return rows.reverse().map(batchFromRow);
}

/** Those of these batches that were applied to the gig. */
export async function listBatchesById(
  db: Knex,
  gigId: string,
  ids: readonly string[],
): Promise<LoggedBatch[]> {
  const rows = await batchesOf(db, gigId).whereIn("gig_batches.id", [...ids]);
  return rows.map(batchFromRow);
}

/** Writes batches that were applied into the log. */
export async function insertBatches(
  trx: Knex.Transaction,
  gigId: string,
  batches: readonly LoggedBatch[],
): Promise<void> {
  if (batches.length === 0) return;
  await trx("gig_batches").insert(
    batches.map((batch) => ({
      gig_id: gigId,
      revision: batch.revision,
      id: batch.id,
      client: batch.client,
      person_id: batch.personId,
      undoes: batch.undoes,
      label: batch.label,
      edits: JSON.stringify(batch.edits),
      inverse: JSON.stringify(batch.inverse),
    })),
  );
}
