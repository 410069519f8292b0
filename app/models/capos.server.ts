import type { Knex } from "knex";
import { nanoid } from "nanoid";
import { z } from "zod";
import type { CapoFields } from "#app/domain/repertoire/capo-form.ts";
import type { ActCapo } from "#app/domain/repertoire/guitar.ts";
import { readJson } from "#app/models/stored-json.server.ts";

export type StoredCapo = ActCapo & { version: number; deleted: boolean };

export type SaveCapo =
  | { outcome: "saved" }
  | { outcome: "conflict"; current: StoredCapo }
  | { outcome: "gone" };

type OfAct = { actId: string };

type CapoRow = {
  id: string;
  name: string;
  strings: unknown;
  count: number;
  version: number;
  deleted_at: Date | null;
};

const stringsColumn = z.array(z.int().min(1).max(12)).nullable();

function capoFromRow(row: CapoRow): StoredCapo {
  return {
    id: row.id,
    name: row.name,
    strings: readJson(stringsColumn, "capos.strings", row.strings),
    count: row.count,
    version: row.version,
    deleted: row.deleted_at !== null,
  };
}

function capoToRow(fields: CapoFields) {
  const strings = fields.strings === null ? null : JSON.stringify(fields.strings);
  return { name: fields.name, strings, count: fields.count };
}

function caposOf(db: Knex, member: OfAct) {
  return db("capos")
    .where({ act_id: member.actId })
    .select<CapoRow[]>("id", "name", "strings", "count", "version", "deleted_at");
}

/** The kinds of capo the act owns: those over all strings first, then by name. */
export async function listCapos(db: Knex, member: OfAct): Promise<StoredCapo[]> {
  const rows = await caposOf(db, member)
    .whereNull("deleted_at")
    .orderByRaw("strings is not null")
    .orderBy("name")
    .orderBy("id");
  return rows.map(capoFromRow);
}

/** One kind of capo, also where it was deleted (`deleted` tells); null where the act has none of this id. */
export async function findCapo(db: Knex, member: OfAct, id: string): Promise<StoredCapo | null> {
  const [row] = await caposOf(db, member).where({ id });
  return row ? capoFromRow(row) : null;
}

export async function createCapo(db: Knex, member: OfAct, fields: CapoFields): Promise<string> {
  const id = nanoid(16);
  await db("capos").insert({ id, act_id: member.actId, ...capoToRow(fields) });
  return id;
}

/** Saves a capo over the version it was read at, unless somebody else was first; see `updateSong`. */
export async function updateCapo(
  db: Knex,
  member: OfAct,
  id: string,
  version: number,
  fields: CapoFields,
  restore = false,
): Promise<SaveCapo> {
  const written = await db("capos")
    .where({ id, act_id: member.actId, version })
    .modify((query) => (restore ? query : query.whereNull("deleted_at")))
    .update({ ...capoToRow(fields), deleted_at: null, version: version + 1 });
  if (written === 1) return { outcome: "saved" };
  const current = await findCapo(db, member, id);
  return current ? { outcome: "conflict", current } : { outcome: "gone" };
}

/** Takes a capo off the list. False where there was none to take. */
export async function deleteCapo(db: Knex, member: OfAct, id: string): Promise<boolean> {
  const deleted = await db("capos")
    .where({ id, act_id: member.actId })
    .whereNull("deleted_at")
    .update({ deleted_at: db.fn.now(3), version: db.raw("version + 1") });
  return deleted === 1;
}

/** Puts a deleted capo back. False where there was none to put back. */
export async function restoreCapo(db: Knex, member: OfAct, id: string): Promise<boolean> {
  const restored = await db("capos")
    .where({ id, act_id: member.actId })
    .whereNotNull("deleted_at")
    .update({ deleted_at: null, version: db.raw("version + 1") });
  return restored === 1;
}
