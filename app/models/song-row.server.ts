import { nanoid } from "nanoid";
import { z } from "zod";
import type { Energy, Priority, Song, SongNeck } from "#app/domain/repertoire/song.ts";
import type { SongFields } from "#app/domain/repertoire/song-form.ts";
import { readJson } from "#app/models/stored-json.server.ts";

/** A song as it stands in the database: the version tells a later save whether somebody else saved in between. */
export type StoredSong = Song & { version: number };

/** What is selected of the songs table, in the database's own names. */
export type SongRow = {
  id: string;
  title: string;
  credit: string;
  seconds: number;
  key: string;
  tempo: number | null;
  energy: Energy | null;
  priority: Priority;
  notes: string;
  first_line: string;
  cover: number | null;
  necks: unknown;
  version: number;
  deleted_at: Date | null;
};

export const songColumns = [
  "id",
  "title",
  "credit",
  "seconds",
  "key",
  "tempo",
  "energy",
  "priority",
  "notes",
  "first_line",
  "cover",
  "necks",
  "version",
  "deleted_at",
] as const satisfies (keyof SongRow)[];

const necksColumn = z.array(
  z.object({
    id: z.string(),
    open: z.array(z.int()),
    capos: z.array(z.object({ fret: z.int(), strings: z.array(z.int()) })),
    guitars: z.array(z.string()).nullable(),
    penalty: z.int(),
  }),
);

export function songFromRow(row: SongRow): StoredSong {
  return {
    id: row.id,
    title: row.title,
    credit: row.credit,
    seconds: row.seconds,
    key: row.key,
    tempo: row.tempo,
    energy: row.energy,
    priority: row.priority,
    notes: row.notes,
    firstLine: row.first_line,
    cover: row.cover,
    necks: readJson(necksColumn, "songs.necks", row.necks),
    deleted: row.deleted_at !== null,
    version: row.version,
  };
}

/**
 * The columns of what a person may write. A way to play the song keeps its id for as long as it is kept, since gigs
 * refer to it; one that is new, or says it is one that this song does not have, gets an id here.
 */
export function songToRow(fields: SongFields, present: readonly SongNeck[] = []) {
  const kept = new Set(present.map((neck) => neck.id));
  const necks: SongNeck[] = fields.necks.map((neck) => {
    const id = neck.id !== null && kept.delete(neck.id) ? neck.id : nanoid(16);
    return {
      id,
      open: neck.open,
      capos: neck.capos,
      guitars: neck.guitars,
      penalty: neck.penalty,
    };
  });
  return {
    title: fields.title,
    credit: fields.credit,
    seconds: fields.seconds,
    key: fields.key,
    tempo: fields.tempo,
    energy: fields.energy,
    priority: fields.priority,
    notes: fields.notes,
    first_line: fields.firstLine,
    cover: fields.cover,
    necks: JSON.stringify(necks),
  };
}
