import type { Knex } from "knex";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { RepertoireNames } from "#app/domain/gig/edit-words.ts";
import type { Entry, Gig } from "#app/domain/gig/gig.ts";
import { repertoireNames } from "#app/domain/gig/repertoire-names.ts";
import type { Song } from "#app/domain/repertoire/song.ts";
import { listGuitarsEver } from "#app/models/guitars.server.ts";
import { listSongsEver } from "#app/models/songs.server.ts";
import type { Member } from "#app/services/member.server.ts";

/** The act's songs and guitars, deleted ones too, read when the first edit asks for them: most move songs only. */
export type ActParts = {
  songs: () => Promise<ReadonlyMap<string, Song>>;
  guitarIds: () => Promise<ReadonlySet<string>>;
  names: () => Promise<RepertoireNames>;
};

export function actParts(db: Knex, member: Member): ActParts {
  const songs = once(() => listSongsEver(db, member));
  const guitars = once(() => listGuitarsEver(db, member));
  return {
    songs: async () => new Map((await songs()).map((song) => [song.id, song])),
    guitarIds: async () => new Set((await guitars()).map((guitar) => guitar.id)),
    names: async () => repertoireNames({ songs: await songs(), guitars: await guitars() }, member.naming),
  };
}

function once<Value>(read: () => Promise<Value>): () => Promise<Value> {
  let reading: Promise<Value> | undefined;
  return () => {
    reading ??= read();
    return reading;
  };
}

/** What edits name that this act does not have, as a message; null where it has all of it. */
export async function unknownParts(
  gig: Gig,
  edits: readonly Edit[],
  parts: ActParts,
): Promise<string | null> {
  const added = new Map<string, Pick<Entry, "songId">>();
  for (const edit of edits) {
    if (edit.kind === "entry.add") {
      added.set(edit.entry.id, edit.entry);
      const { songId, guitarId, neckId } = edit.entry;
      const unknown =
        (await unknownSong(songId, parts)) ??
        (await unknownGuitar(guitarId, parts)) ??
        (await unknownNeck(songId, neckId, parts));
      if (unknown) return unknown;
    }
    if (edit.kind !== "entry.set") continue;
    if (edit.field === "guitarId") {
      const unknown = await unknownGuitar(edit.value, parts);
      if (unknown) return unknown;
    }
    if (edit.field === "neckId") {
      const entry = added.get(edit.entryId) ?? gig.entries.find((one) => one.id === edit.entryId);
      const unknown = entry ? await unknownNeck(entry.songId, edit.value, parts) : null;
      if (unknown) return unknown;
    }
  }
  return null;
}

async function unknownSong(songId: string, parts: ActParts): Promise<string | null> {
  return (await parts.songs()).has(songId)
    ? null
    : "There is no such song in this act. Choose one from the repertoire.";
}

async function unknownGuitar(guitarId: string | null, parts: ActParts): Promise<string | null> {
  if (guitarId === null || (await parts.guitarIds()).has(guitarId)) return null;
  return "There is no such guitar in this act. Choose one of the act's guitars.";
}

async function unknownNeck(songId: string, neckId: string | null, parts: ActParts): Promise<string | null> {
  if (neckId === null) return null;
  const song = (await parts.songs()).get(songId);
  if (!song || song.necks.some((neck) => neck.id === neckId)) return null;
  return `${song.title} no longer has this tuning and capo. Choose another.`;
}
