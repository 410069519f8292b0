import type { LineReader } from "#app/domain/repertoire/find-tuning.ts";
import { folded } from "#app/domain/repertoire/library.ts";
import { type PastedSong, readSongLines, type SongLine } from "#app/domain/repertoire/read-song-lines.ts";
import { type SongFields, songLimits } from "#app/domain/repertoire/song-form.ts";

export const pasteLimits = { characters: 50_000, songs: 500 } as const;

/** Length that a song begins with where its line names none; common practice, no source. */
export const assumedSeconds = 210;

function refusal(song: PastedSong): string | null {
  if (song.title.length > songLimits.title)
    return `The title is longer than ${songLimits.title} characters. Shorten it.`;
  if (song.credit.length > songLimits.credit) {
    return `The credit is longer than ${songLimits.credit} characters. Shorten it.`;
  }
  if (song.capos.length > songLimits.caposPerWay)
    return `A neck carries at most ${songLimits.caposPerWay} capos here.`;
  if (song.seconds !== null && (song.seconds < 1 || song.seconds > songLimits.longestSeconds)) {
    return "A song is between 1 second and 3 hours long. Correct the length.";
  }
  return null;
}

/**
 * The lines of a pasted list as the library can keep them: as `readSongLines`, with the library's limits applied.
 * @example readPastedList("Low Meadow DADGBE 3:15", { usual: [40, 45, 50, 55, 59, 64], naming: "english" })
 * // [{ line: 1, raw: "Low Meadow DADGBE 3:15", song: { title: "Low Meadow", … } }]
 */
export function readPastedList(text: string, reader: LineReader): SongLine[] {
  let songs = 0;
  return readSongLines(text, reader).map((line): SongLine => {
    if (!line.song) return line;
    songs += 1;
    const problem =
      songs > pasteLimits.songs
        ? `More than ${pasteLimits.songs} songs at once. Keep those above first.`
        : refusal(line.song);
    return problem === null ? line : { line: line.line, raw: line.raw, song: null, problem };
  });
}

/**
 * A pasted song as the library keeps it. `seconds` is the length where its line named none.
 * @example pastedSongFields({ title: "Low Meadow", seconds: null, … }, 210).seconds // 210
 */
export function pastedSongFields(song: PastedSong, seconds: number): SongFields {
  return {
    title: song.title,
    credit: song.credit,
    seconds: song.seconds ?? seconds,
    key: song.key,
    tempo: song.tempo,
    energy: song.energy,
    priority: song.priority,
    notes: "",
    firstLine: "",
    cover: null,
    necks: [
      {
        id: null,
        open: song.open,
        capos: song.capos,
        guitars: null,
        penalty: 0,
      },
    ],
  };
}

/**
 * The text without the lines that were kept, so that what is left stays to be corrected.
 * @example withoutLines("A\nB\nC", new Set([1, 3])) // "B"
 */
export function withoutLines(text: string, kept: ReadonlySet<number>): string {
  return text
    .split(/\r\n|\r|\n/)
    .filter((raw, index) => !kept.has(index + 1) && raw.trim() !== "")
    .join("\n");
}

/**
 * The song of the library that has this title, whatever its capitals and accents.
 * @example sameTitle("low meadow", [{ id: "s1", title: "Low Meadow" }]) // { id: "s1", title: "Low Meadow" }
 */
export function sameTitle<S extends { title: string }>(title: string, songs: readonly S[]): S | undefined {
  const wanted = folded(title).trim();
  return songs.find((song) => folded(song.title).trim() === wanted);
}
