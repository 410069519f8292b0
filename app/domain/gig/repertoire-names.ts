import type { RepertoireNames } from "#app/domain/gig/edit-words.ts";
import { caposWords } from "#app/domain/music/capo.ts";
import { compactTuning } from "#app/domain/music/format-tuning.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

/**
 * What the ids of an act's songs, guitars and ways to play are called, for messages about a gig.
 * @example repertoireNames({ songs, guitars }, "english").neck("ropewalk", "n1") // "DADGBE, capo 2"
 */
export function repertoireNames(
  repertoire: { songs: readonly Song[]; guitars: readonly Pick<Guitar, "id" | "name">[] },
  naming: Naming,
): RepertoireNames {
  const songs = new Map(repertoire.songs.map((song) => [song.id, song]));
  const guitars = new Map(repertoire.guitars.map((guitar) => [guitar.id, guitar.name]));
  return {
    song: (id) => songs.get(id)?.title ?? "a song",
    guitar: (id) => guitars.get(id) ?? "a guitar that was deleted",
    neck: (songId, neckId) => {
      const neck = songs.get(songId)?.necks.find((one) => one.id === neckId);
      if (!neck) return "a tuning that was deleted";
      const tuning = compactTuning(neck.open, naming);
      return neck.capos.length > 0 ? `${tuning}, ${caposWords(neck.capos, neck.open.length)}` : tuning;
    },
  };
}
