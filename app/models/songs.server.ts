import type { Knex } from "knex";
import { nanoid } from "nanoid";
import type { SongFields } from "#app/domain/repertoire/song-form.ts";
import {
  type SongRow,
  type StoredSong,
  songColumns,
  songFromRow,
  songToRow,
} from "#app/models/song-row.server.ts";

/** Whose songs: every query is bound to the member's act, so another act's id finds nothing. */
type OfAct = { actId: string };

export type SaveSong =
  | { outcome: "saved" }
  /** Somebody else saved or deleted it since; `current` is how it stands now. */
  | { outcome: "conflict"; current: StoredSong }
  | { outcome: "gone" };

function songsOf(db: Knex, member: OfAct) {
  return db("songs")
    .where({ act_id: member.actId })
    .select<SongRow[]>([...songColumns]);
}

/** The songs of the library, by title. */
export async function listSongs(db: Knex, member: OfAct): Promise<StoredSong[]> {
  const rows = await songsOf(db, member).whereNull("deleted_at").orderBy("title").orderBy("id");
  return rows.map(songFromRow);
}

/** Every song of the act, deleted ones too: these may still stand in a set. */
export async function listSongsEver(db: Knex, member: OfAct): Promise<StoredSong[]> {
  const rows = await songsOf(db, member).orderBy("title").orderBy("id");
  return rows.map(songFromRow);
}

/** The named songs as far as they are this act's, deleted ones too. */
export async function listSongsById(db: Knex, member: OfAct, ids: readonly string[]): Promise<StoredSong[]> {
  const rows = await songsOf(db, member).whereIn("id", [...ids]);
  return rows.map(songFromRow);
}

/** One song of the act, also where it was deleted (`deleted` tells); null where the act has none of this id. */
export async function findSong(db: Knex, member: OfAct, id: string): Promise<StoredSong | null> {
  const [row] = await songsOf(db, member).where({ id });
  return row ? songFromRow(row) : null;
}

export async function createSong(db: Knex, member: OfAct, fields: SongFields): Promise<string> {
  const [id] = await createSongs(db, member, [fields]);
  return id!;
}

/** Adds several songs in one statement: all of them or none. Ids come back in the order given. */
export async function createSongs(db: Knex, member: OfAct, songs: readonly SongFields[]): Promise<string[]> {
  const rows = songs.map((fields) => ({
    id: nanoid(16),
    act_id: member.actId,
    ...songToRow(fields),
  }));
  if (rows.length > 0) await db("songs").insert(rows);
  return rows.map((row) => row.id);
}

/**
 * Saves a song over the version it was read at. Nothing is written where somebody else was first. A deleted song is
 * written only where `restore` says to put it back.
 */
export async function updateSong(
  db: Knex,
  member: OfAct,
  id: string,
  version: number,
  fields: SongFields,
  restore = false,
): Promise<SaveSong> {
  const before = await findSong(db, member, id);
  if (!before) return { outcome: "gone" };
  const written = await db("songs")
    .where({ id, act_id: member.actId, version })
    .modify((query) => (restore ? query : query.whereNull("deleted_at")))
    .update({
      ...songToRow(fields, before.necks),
      deleted_at: null,
      version: version + 1,
    });
  if (written === 1) return { outcome: "saved" };
  const current = await findSong(db, member, id);
  return current ? { outcome: "conflict", current } : { outcome: "gone" };
}

/** A copy of a song of the library, titled as such; null where there is no such song. */
export async function duplicateSong(db: Knex, member: OfAct, id: string): Promise<string | null> {
  const song = await findSong(db, member, id);
  if (!song || song.deleted) return null;
  return createSong(db, member, { ...song, title: copyTitle(song.title) });
}

const longestTitle = 120;
const copySuffix = " (copy)";

function copyTitle(title: string): string {
  return (
    [...title]
      .slice(0, longestTitle - copySuffix.length)
      .join("")
      .trimEnd() + copySuffix
  );
}

/** Takes a song out of the library. Sets in which it stands keep it. False where there was none to take. */
export async function deleteSong(db: Knex, member: OfAct, id: string): Promise<boolean> {
  const deleted = await db("songs")
    .where({ id, act_id: member.actId })
    .whereNull("deleted_at")
    .update({ deleted_at: db.fn.now(3), version: db.raw("version + 1") });
  return deleted === 1;
}

/** Puts a deleted song back into the library. False where there was none to put back. */
export async function restoreSong(db: Knex, member: OfAct, id: string): Promise<boolean> {
  const restored = await db("songs")
    .where({ id, act_id: member.actId })
    .whereNotNull("deleted_at")
    .update({ deleted_at: null, version: db.raw("version + 1") });
  return restored === 1;
}
