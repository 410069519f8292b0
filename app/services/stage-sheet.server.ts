import { createHash } from "node:crypto";
import type { Knex } from "knex";
import type { Paper } from "#app/documents/paper.ts";
import { stageSheetOf } from "#app/documents/stage-sheet/from-plan.ts";
import type { StageSheet } from "#app/documents/stage-sheet/sheet.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { localTime } from "#app/domain/gig/local-time.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { findGig } from "#app/models/gigs.server.ts";
import { loadRepertoire } from "#app/models/repertoire.server.ts";
import type { Member } from "#app/services/member.server.ts";
import { workerPool } from "#app/services/worker-pool.server.ts";
import type { SheetJob } from "#app/workers/sheet.node.ts";

const pool = workerPool<SheetJob, Uint8Array>("sheet", () => ({ maxThreads: 1, maxQueue: 60 }));

export function closeSheetPool(): Promise<void> {
  return pool.close();
}

export type ReadySheet = { gig: Gig; sheet: StageSheet; paper: Paper; version: string };

/** What a gig's stage sheet says now, and the digest that tells this sheet from an older one; null for no such gig. */
export async function gatherStageSheet(
  db: Knex,
  member: Member,
  gigId: string,
  { paper, naming }: { paper: Paper; naming: Naming },
): Promise<ReadySheet | null> {
  const gig = await findGig(db, member, gigId);
  if (!gig) return null;
  const sheet = stageSheetOf(gig, planGig(gig, await loadRepertoire(db, member), naming), naming);
  const digest = createHash("sha256").update(JSON.stringify({ sheet, paper })).digest("hex");
  return { gig, sheet, paper, version: digest.slice(0, 12) };
}

/** A gathered sheet as PDF bytes, rendered off the request's thread. */
export function renderSheet(
  { gig, sheet, paper, version }: ReadySheet,
  author: string,
  at: Date,
): Promise<Uint8Array> {
  const { date, time } = localTime(at.toISOString(), gig.zone);
  const options = { paper, version: `plan ${version.slice(0, 6)}`, printed: `${date} ${time}` };
  return pool.run({ sheet, options, author, at });
}
