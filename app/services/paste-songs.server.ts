import type { Knex } from "knex";
import type { Midi } from "#app/domain/music/pitch.ts";
import {
  pastedSongFields,
  readPastedList,
  sameTitle,
  withoutLines,
} from "#app/domain/repertoire/pasted-list.ts";
import { createSongs, listSongs } from "#app/models/songs.server.ts";
import type { Member } from "#app/services/member.server.ts";

export type Paste = {
  text: string;
  usual: Midi[];
  /** Length of a song whose line names none. */
  seconds: number;
  /** The lines to keep, counted from 1. */
  ticked: ReadonlySet<number>;
  /** True where a title that the library has means that song rather than a second one. */
  reuse: boolean;
};

export type KeptSong = { id: string; title: string };

/** Keeps the ticked lines of a pasted list that can be read; the rest of the text comes back. Needs a transaction. */
export async function keepPasted(
  trx: Knex.Transaction,
  member: Member,
  paste: Paste,
): Promise<{ kept: KeptSong[]; added: number; left: string }> {
  const reader = { usual: paste.usual, naming: member.naming };
  const lines = readPastedList(paste.text, reader).flatMap(({ line, song }) =>
    song && paste.ticked.has(line) ? [{ line, song }] : [],
  );
  const present = paste.reuse ? await listSongs(trx, member) : [];
  const fresh = lines.filter(({ song }) => !sameTitle(song.title, present));
  const ids = await createSongs(
    trx,
    member,
    fresh.map(({ song }) => pastedSongFields(song, paste.seconds)),
  );
  const kept = lines.map((line) => {
    const known = sameTitle(line.song.title, present);
    return {
      id: known?.id ?? ids[fresh.indexOf(line)]!,
      title: known?.title ?? line.song.title,
    };
  });
  return {
    kept,
    added: ids.length,
    left: withoutLines(paste.text, new Set(lines.map(({ line }) => line))),
  };
}
