import type { ActCapo, Guitar } from "#app/domain/repertoire/guitar.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

/** What an act plays and plays it on: all its songs (deleted ones too where they stand in a set), guitars and capos. */
export type Repertoire = { songs: Song[]; guitars: Guitar[]; capos: ActCapo[] };
