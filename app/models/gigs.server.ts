import type { Knex } from "knex";
import { nanoid } from "nanoid";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { GigFields } from "#app/domain/gig/gig-form.ts";
import { copyGig, newGig } from "#app/domain/gig/new-gig.ts";
import { entriesOf, setsOf } from "#app/domain/gig/order.ts";
import {
  entriesColumn,
  type GigRow,
  gigFromRow,
  gigToRow,
  setsColumn,
  startsAtColumn,
} from "#app/models/gig-row.server.ts";
import { readJson } from "#app/models/stored-json.server.ts";

/** Whose gigs: every query is bound to the member's act, so another act's id finds nothing. */
type OfAct = { actId: string };

/** A gig as lists show it; sets in the order in which they are played, each with the number of its songs. */
export type GigSummary = Pick<Gig, "id" | "name" | "venue" | "startsAt" | "zone"> & {
  sets: { id: string; name: string; songs: number }[];
};

function gigsOf(db: Knex, member: OfAct) {
  return db("gigs").where({ act_id: member.actId });
}

/** The act's gigs, the next to come or the last past first by the start. */
export async function listGigs(db: Knex, member: OfAct): Promise<GigSummary[]> {
  const rows = await gigsOf(db, member)
    .whereNull("deleted_at")
    .orderBy("gigs.starts_at")
    .orderBy("id")
    .select<Omit<GigRow, "times" | "aim" | "wishes" | "rules">[]>(
      "id",
      "name",
      "venue",
      db.raw(startsAtColumn),
      "zone",
      "sets",
      "entries",
    );
  return rows.map((row) => {
    const sets = readJson(setsColumn, "gigs.sets", row.sets);
    const entries = readJson(entriesColumn, "gigs.entries", row.entries);
    return {
      id: row.id,
      name: row.name,
      venue: row.venue,
      startsAt: row.starts_at,
      zone: row.zone,
      sets: setsOf({ sets }).map((set) => ({
        id: set.id,
        name: set.name,
        songs: entriesOf({ entries }, set.id).length,
      })),
    };
  });
}

/** One gig of the act; null where the act has none of this id, or it was deleted. */
export async function findGig(db: Knex, member: OfAct, id: string): Promise<Gig | null> {
  const row = await gigById(db, member, id).first();
  return row ? gigFromRow(row) : null;
}

/** The same, locked until the transaction ends: who else asks for it waits. */
export async function lockGig(trx: Knex.Transaction, member: OfAct, id: string): Promise<Gig | null> {
  const row = await gigById(trx, member, id).forUpdate().first();
  return row ? gigFromRow(row) : null;
}

function gigById(db: Knex, member: OfAct, id: string) {
  return gigsOf(db, member)
    .where({ id })
    .whereNull("deleted_at")
    .select<GigRow[]>("gigs.*", db.raw(startsAtColumn));
}

/** Writes a locked gig as it stands after edits. */
export async function saveGig(trx: Knex.Transaction, member: OfAct, gig: Gig): Promise<void> {
  await gigsOf(trx, member).where({ id: gig.id }).update(gigToRow(gig));
}

/** Adds a gig without songs and answers its id. */
export async function createGig(
  db: Knex,
  member: OfAct,
  given: { fields: GigFields; sets: number; interval: number },
): Promise<string> {
  const { fields, sets, interval } = given;
  return insertGig(db, member, newGig(fields, { sets, interval, newId: () => nanoid(16) }));
}

/** Adds a whole gig, sets and songs with it, and answers its id. */
export async function insertGig(db: Knex, member: OfAct, gig: Gig): Promise<string> {
  await db("gigs").insert({ id: gig.id, act_id: member.actId, ...gigToRow(gig) });
  return gig.id;
}

/** A gig as the start of the next one; its id, or null where there is no such gig. */
export async function duplicateGig(
  db: Knex,
  member: OfAct,
  id: string,
  next: { name: string; startsAt: string },
): Promise<string | null> {
  const gig = await findGig(db, member, id);
  if (!gig) return null;
  return insertGig(db, member, copyGig(gig, { ...next, newId: () => nanoid(16) }));
}

/** Takes a gig off the list. False where there was none to take. */
export async function deleteGig(db: Knex, member: OfAct, id: string): Promise<boolean> {
  const deleted = await gigsOf(db, member)
    .where({ id })
    .whereNull("deleted_at")
    .update({ deleted_at: db.fn.now(3) });
  return deleted === 1;
}

/** Puts a deleted gig back. False where there was none to put back. */
export async function restoreGig(db: Knex, member: OfAct, id: string): Promise<boolean> {
  const restored = await gigsOf(db, member)
    .where({ id })
    .whereNotNull("deleted_at")
    .update({ deleted_at: null });
  return restored === 1;
}

/** The name of a gig of the act, also of a deleted one; null where the act has none of this id. */
export async function findGigName(
  db: Knex,
  member: OfAct,
  id: string,
): Promise<{ name: string; deleted: boolean } | null> {
  const row = await gigsOf(db, member)
    .where({ id })
    .first<{ name: string; deleted_at: Date | null } | undefined>("name", "deleted_at");
  return row ? { name: row.name, deleted: row.deleted_at !== null } : null;
}
