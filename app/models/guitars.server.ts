import type { Knex } from "knex";
import { nanoid } from "nanoid";
import { z } from "zod";
import { type BadgeShape, badgeShapes, type Guitar, instrumentKinds } from "#app/domain/repertoire/guitar.ts";
import type { GuitarFields } from "#app/domain/repertoire/guitar-form.ts";
import { readJson } from "#app/models/stored-json.server.ts";

export type StoredGuitar = Guitar & { version: number; deleted: boolean };

type OfAct = { actId: string };

type GuitarRow = {
  id: string;
  name: string;
  short_name: string;
  badge: string;
  kind: string;
  strings: number;
  usual: unknown;
  lowest: unknown;
  highest: unknown;
  keeps: number;
  left_handed: number;
  spare_for: string | null;
  channel: string;
  strung_on: string | null;
  notes: string;
  version: number;
  deleted_at: Date | null;
};

/** Why a guitar was not kept. The short name must be one of its own in the act: it is all that a badge says. */
export type AddGuitar = { outcome: "saved"; id: string } | { outcome: "short-name-taken"; by: string };

/** What became of a save; `conflict` as in `SaveSong`. */
export type KeepGuitar = AddGuitar | { outcome: "conflict"; current: StoredGuitar } | { outcome: "gone" };

const pitches = z.array(z.int().min(0).max(127)).min(4).max(12);
const badge = z.enum(badgeShapes);
const kind = z.enum(instrumentKinds);

function guitarFromRow(row: GuitarRow): StoredGuitar {
  return {
    id: row.id,
    name: row.name,
    shortName: row.short_name,
    badge: badge.parse(row.badge),
    kind: kind.parse(row.kind),
    strings: row.strings,
    usual: readJson(pitches, "guitars.usual", row.usual),
    lowest: readJson(pitches, "guitars.lowest", row.lowest),
    highest: readJson(pitches, "guitars.highest", row.highest),
    keeps: row.keeps === 1,
    leftHanded: row.left_handed === 1,
    spareFor: row.spare_for,
    channel: row.channel,
    strungOn: row.strung_on,
    notes: row.notes,
    version: row.version,
    deleted: row.deleted_at !== null,
  };
}

function guitarToRow(fields: GuitarFields) {
  return {
    name: fields.name,
    short_name: fields.shortName,
    badge: fields.badge satisfies BadgeShape,
    kind: fields.kind,
    strings: fields.strings,
    usual: JSON.stringify(fields.usual),
    lowest: JSON.stringify(fields.lowest),
    highest: JSON.stringify(fields.highest),
    keeps: fields.keeps,
    left_handed: fields.leftHanded,
    spare_for: fields.spareFor,
    channel: fields.channel,
    strung_on: fields.strungOn,
    notes: fields.notes,
  };
}

/** The day on which strings were fitted is asked for as text: a day has no zone to be moved by. */
function guitarsOf(db: Knex, member: OfAct) {
  return db("guitars")
    .where({ act_id: member.actId })
    .select<GuitarRow[]>("*", db.raw("date_format(strung_on, '%Y-%m-%d') as strung_on"));
}

/** The act's guitars, by name. */
export async function listGuitars(db: Knex, member: OfAct): Promise<StoredGuitar[]> {
  const rows = await guitarsOf(db, member).whereNull("deleted_at").orderBy("name").orderBy("id");
  return rows.map(guitarFromRow);
}

/** Every guitar the act has had: songs and sets may still name one that was deleted. */
export async function listGuitarsEver(db: Knex, member: OfAct): Promise<StoredGuitar[]> {
  const rows = await guitarsOf(db, member).orderBy("name").orderBy("id");
  return rows.map(guitarFromRow);
}

/** One guitar of the act, also where it was deleted (`deleted` tells); null where the act has none of this id. */
export async function findGuitar(db: Knex, member: OfAct, id: string): Promise<StoredGuitar | null> {
  const [row] = await guitarsOf(db, member).where({ id });
  return row ? guitarFromRow(row) : null;
}

/**
 * The name of the guitar that has this short name, or null. Locks the act's row first, so that of two people who
 * choose the same short name at once the second is told. Needs a transaction.
 */
async function holderOfShortName(
  trx: Knex.Transaction,
  member: OfAct,
  shortName: string,
  except: string | null,
): Promise<string | null> {
  await trx("acts").where({ id: member.actId }).forUpdate().first("id");
  const holder = await trx("guitars")
    .where({ act_id: member.actId, short_name: shortName })
    .whereNull("deleted_at")
    .whereNot({ id: except ?? "" })
    .first<{ name: string } | undefined>("name");
  return holder?.name ?? null;
}

export async function createGuitar(
  trx: Knex.Transaction,
  member: OfAct,
  fields: GuitarFields,
): Promise<AddGuitar> {
  const by = await holderOfShortName(trx, member, fields.shortName, null);
  if (by !== null) return { outcome: "short-name-taken", by };
  const id = nanoid(16);
  await trx("guitars").insert({
    id,
    act_id: member.actId,
    ...guitarToRow(fields),
  });
  return { outcome: "saved", id };
}

/** Saves a guitar over the version it was read at, unless somebody else was first; see `updateSong`. */
export async function updateGuitar(
  trx: Knex.Transaction,
  member: OfAct,
  id: string,
  version: number,
  fields: GuitarFields,
  restore = false,
): Promise<KeepGuitar> {
  const by = await holderOfShortName(trx, member, fields.shortName, id);
  if (by !== null) return { outcome: "short-name-taken", by };
  const written = await trx("guitars")
    .where({ id, act_id: member.actId, version })
    .modify((query) => (restore ? query : query.whereNull("deleted_at")))
    .update({ ...guitarToRow(fields), deleted_at: null, version: version + 1 });
  if (written === 1) return { outcome: "saved", id };
  const current = await findGuitar(trx, member, id);
  return current ? { outcome: "conflict", current } : { outcome: "gone" };
}

/** Takes a guitar off the list. Songs and sets that name it keep its id. False where there was none to take. */
export async function deleteGuitar(db: Knex, member: OfAct, id: string): Promise<boolean> {
  const deleted = await db("guitars")
    .where({ id, act_id: member.actId })
    .whereNull("deleted_at")
    .update({ deleted_at: db.fn.now(3), version: db.raw("version + 1") });
  return deleted === 1;
}

/** Puts a deleted guitar back, unless another has taken its short name since. */
export async function restoreGuitar(trx: Knex.Transaction, member: OfAct, id: string): Promise<KeepGuitar> {
  const guitar = await findGuitar(trx, member, id);
  if (!guitar?.deleted) return { outcome: "gone" };
  const by = await holderOfShortName(trx, member, guitar.shortName, id);
  if (by !== null) return { outcome: "short-name-taken", by };
  await trx("guitars")
    .where({ id, act_id: member.actId })
    .update({ deleted_at: null, version: trx.raw("version + 1") });
  return { outcome: "saved", id };
}
